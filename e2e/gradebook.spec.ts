import { readFile } from 'node:fs/promises';
import { parse } from 'csv-parse/sync';
import type { Page } from 'playwright/test';
import { scoreAttempt } from '@/lib/scoring';
import { deriveAttempt } from '@/lib/sync/derive';
import { PROTOCOL_VERSION } from '@/lib/sync/protocol';
import { type Misses, readingsOf } from '@/tests/support/readings';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { makeActor } from '@/tests/support/school';
import { expectAccessible } from './fixtures/accessibility';
import { takeSession } from './fixtures/bench';
import { expect, test } from './fixtures/test';

const SHORT: Misses = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/width': '2 1/16' };

let stage: RoundStage;

test.beforeEach(async ({ context }) => {
  stage = await stageRound();
  await takeSession(context, stage, stage.teacher, 'teacher');
});

/** Sends the readings of an attempt as a tablet does, from a page of the product. */
async function record(page: Page, attempt: 0 | 1, misses: Misses = {}): Promise<void> {
  const events = readingsOf(stage.teacher, stage.attempts[attempt], stage.practical.rubric, misses);
  const outcomes = await page.evaluate(
    async ({ url, body }) => {
      const headers = { 'content-type': 'application/json' };
      const response = await fetch(url, { method: 'POST', headers, body: JSON.stringify(body) });
      const { answers }: { answers: { outcome: string }[] } = await response.json();
      return answers.map(({ outcome }) => outcome);
    },
    {
      url: `/api/sittings/${stage.sittingId}/events`,
      body: { protocol: PROTOCOL_VERSION, deviceId: stage.teacher.personId, events },
    },
  );
  expect(new Set(outcomes)).toEqual(new Set(['kept']));
}

function engineScore(misses: Misses): number | null {
  const events = readingsOf(stage.teacher, stage.attempts[0], stage.practical.rubric, misses);
  return scoreAttempt(stage.practical.rubric, deriveAttempt(events, 'bench').attempt).score;
}

async function download(page: Page, press: () => Promise<void>): Promise<{ name: string; text: string }> {
  const begun = page.waitForEvent('download');
  await press();
  const file = await begun;
  return { name: file.suggestedFilename(), text: await readFile(await file.path(), 'utf8') };
}

const studentRow = (page: Page, name: string) => page.getByRole('row').filter({ hasText: name });

test('a sitting is read, decided, published and sent, and the file reads back as the engine’s scores', async ({
  page,
}) => {
  await test.step('the list of sittings leads to the one that is open', async () => {
    await page.goto('/sittings');
    await record(page, 0, SHORT);
    await page.reload();
    await expect(page.getByRole('img', { name: '1 of 2 read, 0 begun, 1 to come, 0 away' })).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('link', { name: /^Nine parts/ }).click();
    await expect(studentRow(page, 'Abbott, Ana')).toContainText('read');
    await expect(studentRow(page, 'Brandt, Ben')).toContainText('not read');
    await expectAccessible(page);
  });

  await test.step('nobody goes out as not read without the teacher’s word', async () => {
    await page.getByRole('link', { name: 'publish' }).click();
    await expect(page.getByRole('row').filter({ hasText: 'nothing recorded' })).toContainText('Ben Brandt');
    await expectAccessible(page);
    await page.getByRole('button', { name: 'publish' }).click();
    await expect(page.getByText(/Ben Brandt: not read to the end/)).toBeVisible();
    await page.getByRole('link', { name: 'back to the sitting' }).click();
  });

  await test.step('the desk notes who was absent', async () => {
    await page.getByRole('button', { name: 'change Ben Brandt' }).click();
    const dialog = page.getByRole('dialog', { name: 'Ben Brandt' });
    await expectAccessible(page);
    await dialog.getByText('absent', { exact: true }).click();
    await dialog.getByLabel('days late').fill('soon');
    await dialog.getByRole('button', { name: 'keep' }).click();
    await expect(dialog.getByText('Type a whole number of days.')).toBeVisible();
    await dialog.getByLabel('days late').fill('0');
    await dialog.getByText('absent', { exact: true }).click();
    await dialog.getByRole('button', { name: 'keep' }).click();
    await expect(dialog).toBeHidden();
    await expect(studentRow(page, 'Brandt, Ben')).toContainText('absent');
  });

  await test.step('one press publishes', async () => {
    await page.getByRole('link', { name: 'publish' }).click();
    await page.getByRole('button', { name: 'publish' }).click();
    await expect(page).toHaveURL(new RegExp(`/gradebook/${stage.sectionId}$`));
    await expect(page.getByRole('button', { name: 'Abbott, Ana, Nine parts, 95, published' })).toBeVisible();
    await expect(page.getByRole('button', { name: 'Brandt, Ben, Nine parts, absent' })).toBeVisible();
    await expect(studentRow(page, 'Abbott, Ana')).toContainText('95.0');
    await expectAccessible(page);
  });

  await test.step('the file reads back, and comes again byte for byte', async () => {
    await page.getByRole('button', { name: 'export CSV' }).click();
    const dialog = page.getByRole('dialog', { name: 'Export' });
    await expectAccessible(page);
    const file = await download(page, () => dialog.getByRole('link', { name: /^grades/ }).click());
    expect(file.name).toBe('period-3-woods-2-grades.csv');
    const rows: Record<string, string>[] = parse(file.text, { columns: true });
    expect(rows.map((row) => [row['family name'], row.status, row.score])).toEqual([
      ['Abbott', 'scored', String((engineScore(SHORT) ?? 0) / 100)],
      ['Brandt', 'absent', ''],
    ]);
    const again = await download(page, () =>
      dialog.getByRole('link', { name: `send ${file.name} again` }).click(),
    );
    expect(again).toEqual(file);
    const sizes = await download(page, () => dialog.getByRole('link', { name: /^sizes/ }).click());
    expect(parse(sizes.text, { columns: true })).toHaveLength(27);
  });

  await test.step('nothing new, nothing to publish', async () => {
    await page.goto(`/sittings/${stage.sittingId}/publish`);
    await expect(page.getByText('Nothing has changed since the last publication')).toBeVisible();
    await expect(page.getByRole('button', { name: /^publish/ })).toBeHidden();
  });
});

test('a cell is explained by rows that add up, beside the table or over it', async ({ page }) => {
  await page.goto('/sittings');
  await record(page, 0, SHORT);
  await record(page, 1);

  await test.step('beside it on a wide screen', async () => {
    await page.setViewportSize({ width: 1440, height: 900 });
    await page.goto(`/gradebook/${stage.sectionId}`);
    await page.getByRole('button', { name: /^Abbott, Ana, Nine parts, 95, still being recorded/ }).click();
    const table = page.getByRole('table', { name: 'where the points went' });
    const shares = await Promise.all(
      ['base length', 'end 1 length', 'divider 2 width'].map((size) =>
        table.getByRole('row').filter({ hasText: size }).getByRole('cell').last().textContent(),
      ),
    );
    expect(shares.reduce((sum, share) => sum + Number(share), 0)).toBeCloseTo(4.94, 10);
    await expect(table.getByRole('row').filter({ hasText: 'lost' })).toContainText('4.94');
    await expect(table.getByRole('row').filter({ hasText: 'kept' })).toContainText('95.06');
    await expect(table.getByRole('row').filter({ hasText: 'to the nearest point' })).toContainText('95');
    await expectAccessible(page);
  });

  await test.step('over it on a phone, and no page is wider than the phone', async () => {
    await page.setViewportSize({ width: 390, height: 844 });
    await page.reload();
    await page.getByRole('button', { name: /^Abbott, Ana/ }).click();
    await expect(page.getByRole('dialog', { name: 'Ana Abbott' }).getByRole('table')).toBeVisible();
    await expectAccessible(page);
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBe(0);
  });
});

test('rows are found by text, by word and by sorting, and walked by arrow keys', async ({ page }) => {
  await page.goto('/sittings');
  await record(page, 0, SHORT);
  await page.setViewportSize({ width: 1440, height: 900 });
  await page.goto(`/gradebook/${stage.sectionId}`);
  const names = page.getByRole('rowheader');
  await expect(names).toHaveText(['Abbott, Ana', 'Brandt, Ben']);
  await page.getByRole('button', { name: 'student', exact: true }).click();
  await page.getByRole('button', { name: 'student', exact: true }).click();
  await expect(names).toHaveText(['Brandt, Ben', 'Abbott, Ana']);
  await page.getByRole('button', { name: /^Nine parts/ }).click();
  await expect(names).toHaveText(['Abbott, Ana', 'Brandt, Ben']);
  await page.getByRole('button', { name: /^Abbott, Ana/ }).focus();
  await page.keyboard.press('ArrowDown');
  await expect(page.getByRole('button', { name: /^Brandt, Ben/ })).toBeFocused();
  await page.getByLabel('find a student').fill('bran');
  await expect(names).toHaveText(['Brandt, Ben']);
  await page.getByLabel('find a student').fill('');
  await page.getByRole('combobox').selectOption('not read');
  await expect(names).toHaveText(['Brandt, Ben']);
  await page.getByLabel('find a student').fill('nobody');
  await expect(page.getByText('Nobody here by that name')).toBeVisible();
});

test('the gradebook follows a round by itself', async ({ page }) => {
  await page.goto(`/gradebook/${stage.sectionId}`);
  await expect(page.getByRole('button', { name: 'Abbott, Ana, Nine parts, not read' })).toBeVisible();
  await record(page, 0, SHORT);
  await expect(
    page.getByRole('button', { name: /^Abbott, Ana, Nine parts, 95, still being recorded/ }),
  ).toBeVisible();
});

test('a head reads the department’s gradebook and changes and sends nothing', async ({ browser }) => {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  const head = await makeActor(stage.school, 'head', { givenName: 'Imre', familyName: 'Vass' });
  await takeSession(context, stage, head, 'head');
  const page = await context.newPage();
  await page.goto('/gradebook');
  await page.getByRole('link', { name: 'Woods 2, period 3' }).click();
  await page.getByRole('button', { name: 'Abbott, Ana, Nine parts, not read' }).click();
  await expect(page.getByText('Not read: there is no number yet.')).toBeVisible();
  await expect(page.getByRole('button', { name: 'export CSV' })).toBeHidden();
  await expect(page.getByRole('link', { name: 'at the bench' })).toBeHidden();
  await expectAccessible(page);
  await context.close();
});

test('a practical is given to a period, once', async ({ page }) => {
  await page.goto('/sittings/new');
  await expect(
    page.getByText('This period has every published practical of its department already.'),
  ).toBeVisible();
  await page.getByRole('button', { name: 'open the sitting' }).click();
  await expect(page.getByText('Choose a practical.')).toBeVisible();
  await expectAccessible(page);
});
