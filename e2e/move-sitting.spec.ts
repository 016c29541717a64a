import type { Browser, Locator, Page } from 'playwright/test';
import type { Actor } from '@/lib/auth/actor';
import { type Rubric, scoreAttempt } from '@/lib/scoring';
import { rubricSchema } from '@/lib/scoring/schemas';
import { deriveAttempt } from '@/lib/sync/derive';
import { PROTOCOL_VERSION, type ReadingEvent } from '@/lib/sync/protocol';
import { ownerSql } from '@/tests/support/database';
import { enroll, makeAttempt } from '@/tests/support/factories';
import { type Misses, readingsOf } from '@/tests/support/readings';
import { eventOf, type RoundStage, stageRound } from '@/tests/support/round-stage';
import { makeActor } from '@/tests/support/school';
import { expectAccessible } from './fixtures/accessibility';
import { takeSession } from './fixtures/bench';
import { expect, test } from './fixtures/test';

interface Marked {
  student: Actor;
  attemptId: string;
  events: ReadingEvent[];
}

let stage: RoundStage;
/** Ana lacks a piece, Ben is short, Cai is long: one gains, one drops, one stays. */
let ana: Marked;
let ben: Marked;
let cai: Marked;

test.beforeEach(async ({ context, page }) => {
  stage = await stageRound();
  const third = await makeActor(stage.school, 'student', { givenName: 'Cai', familyName: 'Castell' });
  await enroll(stage.school, stage.sectionId, third.personId);
  const thirdAttempt = await makeAttempt(stage.school, stage.sittingId, third.personId);
  await takeSession(context, stage, stage.teacher, 'teacher');
  await page.goto('/sittings');
  ana = await mark(page, stage.students[0], stage.attempts[0], {}, 'divider/4');
  ben = await mark(page, stage.students[1], stage.attempts[1], { 'base/1/length': '6 15/16' });
  cai = await mark(page, third, thirdAttempt, { 'end/1/width': '3 9/16' });
});

/** Sends a student's readings as a tablet does, with one piece missing where one is named. */
async function mark(
  page: Page,
  student: Actor,
  attemptId: string,
  misses: Misses,
  missing = '',
): Promise<Marked> {
  const [lineId = '', ordinal] = missing.split('/');
  const gone = (cell: ReadingEvent['cell']) => cell.lineId === lineId && cell.ordinal === Number(ordinal);
  const read = readingsOf(stage.teacher, attemptId, stage.practical.rubric, misses);
  const events = missing
    ? [
        ...read.filter(({ cell }) => !gone(cell)),
        eventOf(stage.teacher, attemptId, {
          cell: { lineId, ordinal: Number(ordinal), what: 'piece' },
          value: { kind: 'state', state: 'missing' },
          typed: null,
          unit: null,
          instrument: null,
        }),
      ]
    : read;
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
  return { student, attemptId, events };
}

/** Makes missing pieces cheaper and short lengths dearer in the editor, and publishes that as version 2. */
async function correctRubric(page: Page): Promise<Rubric> {
  await page.goto(`/practicals/${stage.practical.practicalId}`);
  await page.getByLabel('points for a missing piece, all lines').fill('4');
  await page.getByRole('button', { name: /^price of length, all lines/ }).click();
  await page.getByRole('button', { name: 'undersize doubles' }).click();
  await page.getByRole('button', { name: /^publish version 2/ }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'publish version 2' }).click();
  await expect(page.getByRole('dialog', { name: 'Version 2 is published' })).toBeVisible();
  const [row] = await ownerSql()`
    select rubric from rubric_versions where practical_id = ${stage.practical.practicalId} and number = 2`;
  return rubricSchema.parse(row?.rubric);
}

/** The score of what was written, by the engine alone, as it stands on screen. */
function scoreOf({ events }: Marked, rubric: Rubric): number {
  const { score } = scoreAttempt(rubric, deriveAttempt(events, 'bench').attempt);
  if (score === null) throw new Error('The test wrote an attempt that is not read to the end.');
  return score / 100;
}

async function publish(page: Page, name: string | RegExp): Promise<void> {
  await page.goto(`/sittings/${stage.sittingId}/publish`);
  await page.getByRole('button', { name }).click();
  await expect(page).toHaveURL(/\/gradebook\//);
}

const rowOf = (page: Page, name: string): Locator =>
  page.getByRole('table', { name: 'who moves, in figures' }).getByRole('row').filter({ hasText: name });

const signed = (change: number) => (change > 0 ? `+${change}` : `−${Math.abs(change)}`);

async function look(page: Page): Promise<void> {
  await page.goto(`/sittings/${stage.sittingId}`);
  await page.getByRole('link', { name: 'another version' }).click();
  await expect(page.getByRole('img', { name: /^Who moves from version 1 to 2/ }).first()).toBeVisible();
}

async function move(page: Page, choice: 'as it is' | 'nobody drops'): Promise<void> {
  await page.getByRole('radio', { name: choice }).check();
  await page.getByRole('button', { name: 'move to version 2' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'move to version 2' }).click();
  await expect(page).toHaveURL(new RegExp(`/sittings/${stage.sittingId}$`));
}

async function studentPage(browser: Browser, { student }: Marked): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 390, height: 844 } });
  await takeSession(context, stage, student, 'student');
  return context.newPage();
}

test('a rubric is corrected after publishing: who moves is seen first, nobody drops, and only who gains is told', async ({
  page,
  browser,
}) => {
  await publish(page, 'publish');
  const version1 = stage.practical.rubric;
  const version2 = await correctRubric(page);
  const [gain, drop, stay] = [ana, ben, cai].map((marked) => ({
    before: scoreOf(marked, version1),
    after: scoreOf(marked, version2),
  }));
  if (!gain || !drop || !stay) throw new Error('three students were marked');
  expect(gain.after).toBeGreaterThan(gain.before);
  expect(drop.after).toBeLessThan(drop.before);
  expect(stay.after).toBe(stay.before);

  await test.step('the preview says what the engine says', async () => {
    await look(page);
    await expect(page.getByText('1 gains, 1 drops, 1 stays')).toBeVisible();
    const mean = (gain.after - gain.before + drop.after - drop.before) / 3;
    const hundredths = Math.floor(mean * 100 + 0.5) / 100;
    await expect(page.getByText(`mean ${signed(hundredths)} of 100`)).toBeVisible();
    const cells = (name: string) => rowOf(page, name).getByRole('cell');
    await expect(cells('Abbott, Ana')).toHaveText([
      String(gain.before),
      String(gain.after),
      signed(gain.after - gain.before),
      String(gain.after),
    ]);
    await expect(cells('Brandt, Ben')).toHaveText([
      String(drop.before),
      String(drop.after),
      signed(drop.after - drop.before),
      String(drop.before),
    ]);
    await expect(cells('Castell, Cai')).toHaveText([
      String(stay.before),
      String(stay.after),
      'stays',
      String(stay.after),
    ]);
    await expect(page.getByRole('rowheader').first()).toHaveText('Brandt, Ben');
    await expectAccessible(page);
  });

  await test.step('held harmless, by one press that says first what happens', async () => {
    await page.getByRole('radio', { name: 'nobody drops' }).check();
    await expect(page.getByText('1 student keeps what version 1 gave.')).toBeVisible();
    await page.getByRole('button', { name: 'move to version 2' }).click();
    const dialog = page.getByRole('alertdialog');
    await expect(dialog).toContainText('Nobody drops: 1 score is held and 1 gains.');
    await expect(dialog).toContainText('only those whose score changes: 1 of 3');
    await expectAccessible(page);
    await dialog.getByRole('button', { name: 'move to version 2' }).click();
    await expect(page).toHaveURL(new RegExp(`/sittings/${stage.sittingId}$`));
    await expect(page.getByText('Moved from version 1 to 2, nobody drops.')).toBeVisible();
    await expect(page.getByText('version 2, moved from 1, nobody drops').first()).toBeVisible();
    await expectAccessible(page);
  });

  await test.step('nobody is told before the next publication', async () => {
    const own = await studentPage(browser, ana);
    await own.goto(`/my/${stage.sittingId}/result`);
    await expect(own.getByText('corrected')).toBeHidden();
    await expect(own.getByText('Your score changed')).toBeHidden();
    await own.context().close();
  });

  await test.step('the publication says that the version changed, and whom it changes', async () => {
    await page.goto(`/sittings/${stage.sittingId}/publish`);
    await expect(page.getByText('The version changed since publication 1: from 1 to 2')).toBeVisible();
    await expect(page.getByText('By itself that changes 1 score')).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('button', { name: /^publish, number 2/ }).click();
    await expect(page).toHaveURL(/\/gradebook\//);
  });

  await test.step('the gradebook’s explanation has a row for what is held', async () => {
    await page.setViewportSize({ width: 1440, height: 900 });
    await page.getByRole('button', { name: /^Brandt, Ben/ }).click();
    const table = page.getByRole('table', { name: 'where the points went' });
    const held = table.getByRole('row').filter({ hasText: 'version 1' });
    await expect(held).toContainText(`+${drop.before - drop.after}`);
    await expect(table.getByRole('row').filter({ hasText: 'to the nearest' })).toContainText(
      String(drop.before),
    );
    await expectAccessible(page);
  });

  await test.step('who gained is told, with the score before', async () => {
    const own = await studentPage(browser, ana);
    await own.goto('/my');
    await expect(own.getByText('Your result changed.')).toBeVisible();
    await expectAccessible(own);
    await own.goto(`/my/${stage.sittingId}/result`);
    await expect(own.getByText(`Your score changed from ${gain.before} to ${gain.after}`)).toBeVisible();
    await expectAccessible(own);
    await own.context().close();
  });

  await test.step('who was held or stays is told nothing, and the held one can read why', async () => {
    for (const marked of [ben, cai]) {
      const own = await studentPage(browser, marked);
      await own.goto('/my');
      await expect(own.getByRole('link', { name: 'see your result' })).toBeVisible();
      await expect(own.getByText('Your result changed')).toBeHidden();
      await own.goto(`/my/${stage.sittingId}/result`);
      await expect(own.getByText(/of 100/).first()).toBeVisible();
      await expect(own.getByText('changed from')).toBeHidden();
      await expect(own.getByText('corrected')).toBeHidden();
      if (marked === ben) await expect(own.getByText(/version 1/).first()).toBeVisible();
      await expectAccessible(own);
      await own.context().close();
    }
  });

  await test.step('what is out cannot be undone any more', async () => {
    await page.goto(`/sittings/${stage.sittingId}`);
    await expect(page.getByText('version 2, moved from 1, nobody drops').first()).toBeVisible();
    await expect(page.getByRole('button', { name: 'undo the move' })).toBeHidden();
    await page.goto(`/sittings/${stage.sittingId}/move`);
    await expect(page.getByText('version 1 to 2, nobody drops')).toBeVisible();
    await expect(page.getByRole('button', { name: 'undo the move' })).toBeHidden();
  });
});

test('a move is undone before publication, and every score is what it was', async ({ page }) => {
  await publish(page, 'publish');
  const version2 = await correctRubric(page);
  await look(page);
  await move(page, 'as it is');
  const cell = (name: string) => page.getByRole('button', { name: new RegExp(`^${name}, Nine parts`) });
  await page.goto(`/sittings/${stage.sittingId}`);
  await page.getByRole('button', { name: 'undo the move' }).click();
  const dialog = page.getByRole('alertdialog', { name: 'Back to version 1?' });
  await expectAccessible(page);
  await dialog.getByRole('button', { name: 'back to version 1' }).click();
  await expect(page.getByText('Moved from version 1 to 2')).toBeHidden();
  await expect(page.getByRole('button', { name: 'undo the move' })).toBeHidden();

  await page.goto(`/sittings/${stage.sittingId}/move`);
  await expect(page.getByText(/^undone by Dayo Okonjo/)).toBeVisible();
  await expect(rowOf(page, 'Brandt, Ben').getByRole('cell').first()).toHaveText(
    String(scoreOf(ben, stage.practical.rubric)),
  );
  await expect(rowOf(page, 'Brandt, Ben').getByRole('cell').nth(1)).toHaveText(
    String(scoreOf(ben, version2)),
  );

  await page.goto(`/sittings/${stage.sittingId}/publish`);
  await expect(page.getByText('Nothing has changed since the last publication')).toBeVisible();
  await page.goto(`/gradebook/${stage.sectionId}`);
  await expect(cell('Brandt, Ben')).toHaveAccessibleName(
    new RegExp(`, ${scoreOf(ben, stage.practical.rubric)}, published`),
  );
});

test('a reading that comes meanwhile makes the preview anew, with the choice kept', async ({
  page,
  context,
}) => {
  const version2 = await correctRubric(page);
  await look(page);
  await page.getByRole('radio', { name: 'as it is' }).check();
  const other = await context.newPage();
  await other.goto('/sittings');
  const read = cai.events.find(({ cell }) => cell.lineId === 'base' && cell.what === 'length');
  const again = eventOf(stage.teacher, cai.attemptId, { supersedes: read ? [read.id] : [] });
  await other.evaluate(
    async ({ url, body }) => {
      const headers = { 'content-type': 'application/json' };
      await fetch(url, { method: 'POST', headers, body: JSON.stringify(body) });
    },
    {
      url: `/api/sittings/${stage.sittingId}/events`,
      body: { protocol: PROTOCOL_VERSION, deviceId: stage.teacher.personId, events: [again] },
    },
  );
  await page.getByRole('button', { name: 'move to version 2' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'move to version 2' }).click();
  await expect(page.getByText('Something changed since you looked.')).toBeVisible();
  await expect(page.getByRole('radio', { name: 'as it is' })).toBeChecked();
  const changed = { ...cai, events: [...cai.events, again] };
  await expect(rowOf(page, 'Castell, Cai').getByRole('cell').nth(1)).toHaveText(
    String(scoreOf(changed, version2)),
  );
  await expectAccessible(page);
  await page.getByRole('button', { name: 'move to version 2' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'move to version 2' }).click();
  await expect(page).toHaveURL(new RegExp(`/sittings/${stage.sittingId}$`));
});

test('one version alone, a wrong address and somebody else’s sitting lead on and lose nothing', async ({
  page,
  browser,
}) => {
  await page.goto(`/sittings/${stage.sittingId}/move`);
  await expect(page.getByRole('heading', { name: 'Version 1 is the only one' })).toBeVisible();
  await expectAccessible(page);
  await page.goto(`/sittings/${stage.sittingId}/move?version=not-a-version`);
  await expect(page.getByText('This address names no version to move to.')).toBeVisible();
  await expectAccessible(page);
  const stranger = await makeActor(stage.school, 'teacher');
  const context = await browser.newContext();
  await takeSession(context, stage, stranger, 'teacher');
  const answer = await context.request.get(`/sittings/${stage.sittingId}/move`);
  expect(answer.status()).toBe(404);
  await context.close();
});

test.describe('when the way to the server fails', () => {
  test.use({ expectedErrors: /Failed to load resource|net::ERR/ });

  test('a preview that does not come is told, and one that is cancelled can be made again', async ({
    page,
    context,
  }) => {
    await correctRubric(page);
    const stream = `**/api/sittings/${stage.sittingId}/move?**`;

    await test.step('the network is gone', async () => {
      await page.route(stream, (route) => route.abort());
      await page.goto(`/sittings/${stage.sittingId}/move`);
      await expect(page.getByText('The network went away before the preview was whole.')).toBeVisible();
      await expectAccessible(page);
      await page.unroute(stream);
    });

    await test.step('it breaks off half way', async () => {
      await page.route(stream, (route) =>
        route.fulfill({ contentType: 'application/x-ndjson', body: '{"kind":"progress","done":1,"of":3}\n' }),
      );
      await page.getByRole('button', { name: 'look again' }).click();
      await expect(page.getByText('The preview broke off before it was whole.')).toBeVisible();
      await page.unroute(stream);
    });

    await test.step('it takes long, and is cancelled', async () => {
      let letGo = () => {};
      const held = new Promise<void>((resolve) => {
        letGo = resolve;
      });
      await page.route(stream, async (route) => {
        await held;
        await route.abort();
      });
      await page.getByRole('button', { name: 'look again' }).click();
      await expect(page.getByRole('progressbar')).toBeVisible();
      await expectAccessible(page);
      await page.getByRole('button', { name: 'cancel' }).click();
      await expect(page.getByText('You stopped the preview. Nothing was changed.')).toBeVisible();
      await page.unrouteAll({ behavior: 'ignoreErrors' });
      letGo();
      await page.getByRole('button', { name: 'look again' }).click();
      await expect(page.getByRole('table', { name: 'who moves, in figures' })).toBeVisible();
    });

    await test.step('the session ends before the press', async () => {
      await page.getByRole('radio', { name: 'as it is' }).check();
      await context.clearCookies();
      await page.getByRole('button', { name: 'move to version 2' }).click();
      await page.getByRole('alertdialog').getByRole('button', { name: 'move to version 2' }).click();
      await expect(page.getByText('Nothing was moved. Sign in, and come back to this page.')).toBeVisible();
      await expectAccessible(page);
    });
  });
});
