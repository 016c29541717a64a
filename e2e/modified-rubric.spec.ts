import type { Browser, Page } from 'playwright/test';
import type { Actor } from '@/lib/auth/actor';
import type { Role } from '@/lib/auth/roles';
import { PROTOCOL_VERSION } from '@/lib/sync/protocol';
import { type Misses, readingsOf } from '@/tests/support/readings';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { makeActor } from '@/tests/support/school';
import { expectAccessible } from './fixtures/accessibility';
import { takeSession } from './fixtures/bench';
import { expect, test } from './fixtures/test';

const SHORT: Misses = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/width': '2 1/16' };
const REASON = 'Reads a rule through a magnifier.';
const TRACES = /modif|accommod|magnifier/i;

let stage: RoundStage;

test.beforeEach(async ({ context }) => {
  stage = await stageRound();
  await takeSession(context, stage, stage.teacher, 'teacher');
});

/** Sends the readings of the first student as a tablet does, from a page of the product. */
async function record(page: Page): Promise<void> {
  const events = readingsOf(stage.teacher, stage.attempts[0], stage.practical.rubric, SHORT);
  const status = await page.evaluate(
    async ({ url, body }) => {
      const headers = { 'content-type': 'application/json' };
      return (await fetch(url, { method: 'POST', headers, body: JSON.stringify(body) })).status;
    },
    {
      url: `/api/sittings/${stage.sittingId}/events`,
      body: { protocol: PROTOCOL_VERSION, deviceId: stage.teacher.personId, events },
    },
  );
  expect(status).toBe(200);
}

/** What the bench says of the first student's cells, and of every key of the rule at a size that is short. */
async function benchOf(page: Page): Promise<{ said: string[]; html: string }> {
  await page.goto(`/round/${stage.sittingId}`);
  const short = page.locator('[data-cell="base/1/length"]');
  await expect(short).toBeVisible({ timeout: 30_000 });
  await expect(page.getByRole('heading', { name: 'Ana Abbott' })).toBeVisible();
  await short.click();
  const keys = page.getByRole('toolbar').getByRole('button');
  await expect(keys.first()).toBeVisible();
  const said = await page
    .locator('[data-cell], [role=toolbar] button')
    .evaluateAll((all) => all.map((key) => key.getAttribute('aria-label') ?? key.textContent ?? ''));
  return { said, html: await page.content() };
}

async function pageOf(browser: Browser, actor: Actor, role: Role): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  await takeSession(context, stage, actor, role);
  return context.newPage();
}

test('a teacher modifies the rubric for one student: the score follows, the bench, the aide and students see nothing of it', async ({
  page,
  browser,
}) => {
  await page.goto('/periods');
  await record(page);
  const before = await benchOf(page);

  await test.step('the period leads to its modified rubrics', async () => {
    await page.goto(`/periods/${stage.sectionId}`);
    await page.getByRole('link', { name: 'modified rubrics' }).click();
    await expect(page.getByText('Nobody’s rubric is modified')).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('link', { name: 'modify a rubric' }).click();
  });

  await test.step('what it does is drawn and reckoned as it is typed', async () => {
    await page.getByLabel('student').selectOption({ label: 'Abbott, Ana' });
    const scores = page.getByRole('table', { name: 'scores of Ana Abbott' });
    await expect(scores.getByRole('row', { name: 'Nine parts 95 95' })).toBeVisible();
    await page.getByLabel('times as wide').fill('wide');
    await expect(page.getByText('This cannot be read as a factor.', { exact: false })).toBeVisible();
    await page.getByLabel('times as wide').fill('2 1/4');
    await expect(scores.getByRole('row', { name: 'Nine parts 95 99' })).toBeVisible();
    await expect(
      page.getByRole('img', { name: /the sitting.*modified/i }).filter({ visible: true }),
    ).toBeVisible();
    await page.getByLabel('divider, the whole line').check();
    await expect(page.getByLabel('width of divider')).toBeDisabled();
    await page.getByLabel('divider, the whole line').uncheck();
    await expectAccessible(page);
  });

  await test.step('without a reason it is refused, and nothing typed is lost', async () => {
    await page.getByRole('button', { name: 'modify the rubric' }).click();
    await expect(page.getByText('Type the reason.')).toBeVisible();
    await expect(page.getByLabel('times as wide')).toHaveValue('2 1/4');
    await expect(page.getByLabel('student')).toHaveValue(stage.students[0].personId);
    await page.getByLabel('why it is modified').fill(REASON);
    await page.getByRole('button', { name: 'modify the rubric' }).click();
    await expect(page).toHaveURL(new RegExp(`/periods/${stage.sectionId}/modified$`));
    const row = page.getByRole('row').filter({ hasText: 'Abbott, Ana' });
    await expect(row).toContainText('bands 2.25 times as wide');
    await expect(page.getByText(REASON)).toBeHidden();
    await expectAccessible(page);
  });

  await test.step('the gradebook has the other score', async () => {
    await page.goto(`/gradebook/${stage.sectionId}`);
    await expect(
      page.getByRole('button', { name: /^Abbott, Ana, Nine parts, 99, still being recorded/ }),
    ).toBeVisible();
  });

  await test.step('the bench shows the sitting’s bands, as before', async () => {
    const after = await benchOf(page);
    expect(before.said).toContain('base, length: one sixteenth of an inch under, loses 1');
    expect(after.said).toEqual(before.said);
    expect(after.html).not.toMatch(TRACES);
  });

  await test.step('an aide and the student see nothing of it', async () => {
    for (const [actor, role, path] of [
      [stage.aide, 'aide', `/round/${stage.sittingId}`],
      [stage.students[0], 'student', `/my/${stage.sittingId}`],
    ] as const) {
      const theirs = await pageOf(browser, actor, role);
      await theirs.goto(path);
      await expect(theirs.locator('main, [data-cell]').first()).toBeVisible({ timeout: 30_000 });
      expect(await theirs.content()).not.toMatch(TRACES);
      for (const closed of [`/periods/${stage.sectionId}/modified`, '/department/modified']) {
        await theirs.goto(closed);
        await expect(theirs.getByRole('heading', { level: 1 })).toBeVisible();
        await expect(theirs.getByRole('heading', { name: 'Modified rubrics' })).toBeHidden();
        expect(await theirs.content()).not.toMatch(/times as wide|2\.25|magnifier|Abbott, Ana/);
      }
      await theirs.context().close();
    }
  });

  await test.step('ended, the student is priced like everybody', async () => {
    await page.goto(`/periods/${stage.sectionId}/modified`);
    await page.getByRole('button', { name: 'end for Ana Abbott' }).click();
    await page.getByRole('button', { name: 'end it' }).click();
    await expect(page.getByRole('heading', { name: 'Ended' })).toBeVisible();
    await expect(page.getByText('ended by Dayo Okonjo', { exact: false })).toBeVisible();
    await page.goto(`/gradebook/${stage.sectionId}`);
    await expect(page.getByRole('button', { name: /^Abbott, Ana, Nine parts, 95, still/ })).toBeVisible();
  });
});

test('one for the term is changed by its teacher; the head reads it and, by a press that is logged, the reason', async ({
  page,
  context,
}) => {
  await page.goto(`/periods/${stage.sectionId}/modified/new?student=${stage.students[1].personId}`);
  await page.getByLabel('for', { exact: true }).selectOption('');
  await expect(
    page.getByText('Nothing is recorded of Ben Brandt this term yet.').filter({ visible: true }),
  ).toBeVisible();
  await page.getByRole('group', { name: 'square' }).getByText('excused').click();
  await page.getByLabel('length of every line').check();
  await page.getByLabel('why it is modified').fill(REASON);
  await page.getByRole('button', { name: 'modify the rubric' }).click();
  await page.getByRole('link', { name: 'change Ben Brandt' }).click();
  await expect(page.getByLabel('length of every line')).toBeChecked();
  await expect(page.getByLabel('why it is modified')).toHaveValue('');
  await page.getByRole('group', { name: 'square' }).getByText('other price').click();
  await page.getByLabel('out of square loses').fill('0.5');
  await page.getByLabel('why it is modified').fill(`${REASON} Agreed anew.`);
  await expectAccessible(page);
  await page.getByRole('button', { name: 'keep the change' }).click();
  const standing = page.getByRole('table', { name: 'modified rubrics that stand' });
  await expect(standing.getByRole('row').filter({ hasText: 'Brandt, Ben' })).toContainText(
    'square loses 0.5',
  );
  await expect(page.getByRole('table', { name: 'modified rubrics that have ended' })).toContainText(
    'square excused',
  );

  const head = await makeActor(stage.school, 'head', { givenName: 'Imre', familyName: 'Vass' });
  await context.clearCookies();
  await takeSession(context, stage, head, 'head');
  await page.goto('/department');
  await page.getByRole('link', { name: 'modified rubrics' }).click();
  const rows = page.getByRole('table', { name: 'modified rubrics of Woods 2, period 3' }).getByRole('row');
  await expect(rows.filter({ hasText: 'square loses 0.5' })).toContainText('the term, this term');
  await expect(page.getByRole('button', { name: /^(end|change)/ })).toBeHidden();
  await expect(page.getByText(REASON, { exact: false })).toBeHidden();
  await page.getByRole('button', { name: 'reason for Ben Brandt' }).first().click();
  await expect(page.getByText('Reading it is logged', { exact: false })).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'read the reason' }).click();
  await expect(page.getByText(`${REASON} Agreed anew.`)).toBeVisible();
  await page.getByRole('button', { name: 'close' }).click();
  await page.setViewportSize({ width: 390, height: 844 });
  await expectAccessible(page);
  expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBe(0);

  const admin = await makeActor(stage.school, 'admin', { givenName: 'Nomsa', familyName: 'Adeyemi' });
  await context.clearCookies();
  await takeSession(context, stage, admin, 'admin');
  await page.goto('/school/log');
  const log = page.getByRole('row').filter({ hasText: 'read the reason of a modified rubric' });
  await expect(log).toContainText('Imre Vass');
  await expect(log).not.toContainText('Ben Brandt');
  await expect(page.getByText('a modified rubric changed')).toBeVisible();
  await expect(page.getByText(REASON, { exact: false })).toBeHidden();
});
