import { randomUUID } from 'node:crypto';
import type { Locator, Page } from 'playwright/test';
import { type Attempt, judgePrediction, scoreAttempt } from '@/lib/scoring';
import { deriveAttempt } from '@/lib/sync/derive';
import { ownerSql } from '@/tests/support/database';
import { readAll } from '@/tests/support/own-readings';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { defaultForm, defaultRubric, defaultTask, ticksOf } from '@/tests/support/rubrics';
import { expectAccessible } from './fixtures/accessibility';
import { takeSession } from './fixtures/bench';
import { expect, test } from './fixtures/test';

// The network goes in the middle of these journeys; what is another’s answers 404.
test.use({
  viewport: { width: 390, height: 844 },
  expectedErrors: /ERR_INTERNET_DISCONNECTED|status of 404/,
});

const ROWS: [string, number, string][] = [
  ['base', 1, '1/2 x 3 1/2 x 7'],
  ['end', 2, '1/2 x 3 1/2 x 4'],
];

let stage: RoundStage;

test.beforeEach(async ({ context }) => {
  stage = await stageRound({
    task: { ...defaultTask(ROWS), title: 'Three parts' },
    rubric: defaultRubric(ROWS),
  });
  await takeSession(context, stage, stage.students[0], 'student');
});

const heading = (page: Page, name: string | RegExp) => page.getByRole('heading', { name });
const key = (page: Page, name: string) =>
  page.getByRole('group', { name: 'keys' }).getByRole('button', { name, exact: true });

/** Presses the keys of the screen, then `keep`. */
async function enter(page: Page, keys: readonly string[]): Promise<void> {
  for (const each of [...keys, 'keep']) await key(page, each).click();
}

async function expectCounts(page: Page, kept: number, sent: number): Promise<void> {
  await expect(page.getByTestId('kept')).toHaveText(String(kept));
  await expect(page.getByTestId('sent')).toHaveText(String(sent));
}

/** What the server has of the student's own side, in the order it was recorded. */
function ownEvents() {
  return ownerSql()<{ cell: string; typed: string | null; value: { kind: string; receipt?: string } }[]>`
    select line_id || '/' || ordinal || '/' || what as cell, typed, value from reading_events
    where attempt_id = ${stage.attempts[0]} and side = 'own' order by sequence`;
}

test('a student finds the task, sees what each size costs, and ticks off pieces while cutting', async ({
  page,
}) => {
  await page.goto('/my');
  await expectAccessible(page);
  await page.getByRole('link', { name: 'look at the task' }).click();
  await expect(heading(page, 'Three parts')).toBeVisible();
  await expect(page.getByText('qualified instructor come first')).toBeVisible();
  await expect(page.getByText('1 of 27 is 3.7 of 100')).toBeVisible();
  await expectAccessible(page);

  await expect(heading(page, 'base, length')).toBeVisible();
  await page.getByRole('button', { name: /^end/ }).click();
  await page.getByRole('button', { name: /^width/ }).click();
  await expect(heading(page, 'end, width')).toBeVisible();
  await expect(
    page.getByRole('img', { name: /^end, width: target three and one half inches/ }).first(),
  ).toBeVisible();

  await page.getByLabel(/^end 2/).check();
  await expect(page.getByText('1 of 3 cut')).toBeVisible();
  await page.reload();
  await expect(page.getByText('1 of 3 cut')).toBeVisible();
  await expect(page.getByLabel(/^end 2/)).toBeChecked();
});

test('a student measures through a lost network, is refused what cannot be, locks, and gets receipt and prediction', async ({
  page,
  context,
}) => {
  await page.goto(`/my/${stage.sittingId}/measure`);
  const field = page.getByRole('textbox');
  await expect(page.getByRole('textbox', { name: 'base, thickness' })).toBeVisible();
  await enter(page, ['1/2']);
  await expect(page.getByRole('textbox', { name: 'base, width' })).toBeVisible();
  await expectCounts(page, 1, 1);
  await expectAccessible(page);

  await context.setOffline(true);
  await enter(page, ['3', '1/2']);
  await expectCounts(page, 2, 1);
  await expect(page.getByRole('textbox', { name: 'base, length' })).toBeVisible();
  await enter(page, ['4', '0']);
  await expect(
    page.getByText('40 in is longer than the whole blank (30 in). Is that along the grain?'),
  ).toBeVisible();
  await expect(field).toHaveValue('40');
  await expectCounts(page, 2, 1);
  await expectAccessible(page);

  await field.fill('6-15/16');
  await field.press('Enter');
  await expect(page.getByText('Kept: base, length: 6-15/16.')).toBeVisible();
  await expectCounts(page, 3, 1);
  await page.getByRole('button', { name: 'couldn’t read', exact: true }).click();
  await expect(page.getByRole('textbox', { name: 'end 1, width' })).toBeVisible();
  await enter(page, ['3', '1/2']);
  await expect(page.getByRole('textbox', { name: 'end 1, length' })).toBeVisible();

  // Far off is possible: it is asked about once, and kept as it is.
  await enter(page, ['3']);
  await expect(page.getByText('3 in is far from 4 in')).toBeVisible();
  await key(page, 'keep').click();
  await expect(page.getByRole('textbox', { name: 'end 2, thickness' })).toBeVisible();
  await page.getByRole('button', { name: 'piece is missing' }).click();
  await expect(page.getByText('Every size is recorded.')).toBeVisible();

  // A second thought before the lock.
  await page.getByRole('button', { name: 'end 1, length: recorded' }).click();
  await enter(page, ['4']);
  await expect(page.getByText('Every size is recorded.')).toBeVisible();
  await expect(page.getByText(/predicted score/i)).toHaveCount(0);

  await page.getByRole('button', { name: 'lock my readings' }).click();
  const dialog = page.getByRole('alertdialog');
  await expect(dialog).toContainText('you cannot change anything');
  await expect(dialog).toContainText('One size is marked “couldn’t read”.');
  await expectAccessible(page);
  await dialog.getByRole('button', { name: 'lock them' }).click();

  const receipt = page.getByRole('status', { name: 'receipt' });
  await expect(receipt).toHaveText(/^[2-9A-HJ-NP-Z]{4}-[2-9A-HJ-NP-Z]{4}$/);
  // 1 for the base 1/16 short, 9 for the missing end, of 27.
  await expect(page.getByTestId('predicted')).toHaveText('63');
  await expect(page.getByRole('row', { name: /^base, length/ })).toContainText('3.7');
  await expect(page.getByText('the receipt holds already')).toBeVisible();
  await expect(page.getByText('This device worked it out')).toBeVisible();
  await expectCounts(page, 9, 1);
  await expectAccessible(page);

  await context.setOffline(false);
  await expectCounts(page, 9, 9);
  await expect(page.getByText('This device worked it out')).toBeHidden();
  await expect(page.getByTestId('predicted')).toHaveText('63');
  const events = await ownEvents();
  expect(events.map(({ cell }) => cell)).toEqual([
    'base/1/thickness',
    'base/1/width',
    'base/1/length',
    'end/1/thickness',
    'end/1/width',
    'end/1/length',
    'end/2/piece',
    'end/1/length',
    '/0/@lock',
  ]);
  expect(events[2]?.typed).toBe('6-15/16');
  expect(events.at(-1)?.value.receipt).toBe(await receipt.textContent());

  await page.reload();
  await expect(receipt).toHaveText(events.at(-1)?.value.receipt ?? '');
  await page.goto('/my');
  await expect(heading(page, 'Locked, the bench is next')).toBeVisible();
});

test('a locked score is predicted by the prices that the result will have, without a word of why', async ({
  page,
}) => {
  const { school, sittingId, sectionId, students, teacher } = stage;
  await ownerSql()`
    insert into accommodations
      (school_id, id, student_id, department_id, term_id, sitting_id, modification, made_by)
    select school_id, ${randomUUID()}, ${students[0].personId}, department_id, term_id, ${sittingId},
      ${ownerSql().json({ format: 1, widen: { num: 9, den: 4 }, excused: [], checks: [] })}, ${teacher.personId}
    from sections where school_id = ${school.id} and id = ${sectionId}`;
  await page.goto(`/my/${sittingId}/measure`);
  const pieces = {
    base: ['1/2', '3-1/2', '6-15/16'],
    'end 1': ['1/2', '3-1/2', '4'],
    'end 2': ['1/2', '3-1/2', '4'],
  };
  for (const [piece, sizes] of Object.entries(pieces)) {
    for (const [at, axis] of ['thickness', 'width', 'length'].entries()) {
      const field = page.getByRole('textbox', { name: `${piece}, ${axis}` });
      await field.fill(sizes[at] ?? '');
      await field.press('Enter');
    }
  }
  await expect(page.getByText('Every size is recorded.')).toBeVisible();
  await page.getByRole('button', { name: 'lock my readings' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'lock them' }).click();
  // 1/16 short: 96 by the sitting's bands, nothing lost by those that price this student.
  await expect(page.getByTestId('predicted')).toHaveText('100');
  await expect(page.getByText('This device worked it out')).toBeHidden();
  await expect(page.getByRole('table', { name: 'Where your prediction loses' })).toContainText('kept of 27');
  expect(await page.content()).not.toMatch(/modif|accommod|excus/i);
});

test('what is left before a lock is listed, and one tap away', async ({ page }) => {
  await page.goto(`/my/${stage.sittingId}/measure`);
  await expect(page.getByRole('button', { name: /^lock/ })).toHaveAttribute('aria-disabled', 'true');
  await page.getByRole('button', { name: '9 left' }).click();
  const list = page.getByRole('dialog', { name: '9 left' });
  await expectAccessible(page);
  await list.getByRole('button', { name: 'end 2, width' }).click();
  await expect(page.getByRole('textbox', { name: 'end 2, width' })).toBeFocused();
});

/** Publishes the first student's result as the station does: the engine's score with the judged prediction. */
async function publish(bench: Record<string, number>, own: Record<string, number>): Promise<void> {
  const sql = ownerSql();
  const { school, sittingId, practical, teacher, attempts } = stage;
  const { rubric } = practical;
  const attemptOf = (off: Record<string, number>): Attempt => ({
    ...deriveAttempt(readAll(rubric, off), 'own').attempt,
    work: Object.fromEntries(rubric.workChecks.map(({ id }) => [id, 0])),
  });
  const [marked, predicted] = [attemptOf(bench), attemptOf(own)];
  const judgement = judgePrediction(rubric, predicted, marked, defaultForm().policies.prediction);
  const sheet = scoreAttempt(rubric, { ...marked, bonus: judgement.bonus });
  const ownSheet = scoreAttempt(rubric, predicted);
  const publicationId = randomUUID();
  const json = (value: object) => sql.json(JSON.parse(JSON.stringify(value)));
  await sql`insert into publications ${sql({
    school_id: school.id,
    id: publicationId,
    sitting_id: sittingId,
    number: 1,
    rubric_version_id: practical.versionId,
    published_by: teacher.personId,
  })}`;
  await sql`
    insert into results (school_id, publication_id, attempt_id, status, score_points, total_points, bonus_points,
      predicted_points, measured_at, sheet, own_sheet, judgement)
    values (${school.id}, ${publicationId}, ${attempts[0]}, 'scored', ${sheet.score}, ${sheet.total}, ${judgement.bonus},
      ${ownSheet.provisional}, now(), ${json(sheet)}, ${json(ownSheet)}, ${json(judgement)})`;
  await sql`update sittings set state = 'published' where id = ${sittingId}`;
}

async function cellsOf(row: Locator): Promise<string[]> {
  return (await row.getByRole('cell').allInnerTexts()).map((text) => text.replace(/\s+/g, ' ').trim());
}

test('after publication each lost point is explained, with the prediction beside it', async ({ page }) => {
  const thirtySecond = ticksOf('1/32');
  const ends = { 'end 1 length': -3 * thirtySecond, 'end 2 length': -2 * thirtySecond };
  await publish(
    { ...ends, 'base 1 length': -4 * thirtySecond },
    { ...ends, 'base 1 length': -2 * thirtySecond },
  );
  await page.goto('/my');
  await page.getByRole('link', { name: 'see your result' }).click();

  // 6 of 27 lost, 77.78 of 100; 8 of 9 sizes agree, too few for points on top.
  await expect(page.getByTestId('score')).toHaveText('78');
  await expect(page.getByText('8 of 9 sizes agree within')).toBeVisible();
  await expect(page.getByText('9 of 10 have to agree, so nothing comes on top.')).toBeVisible();
  await expect(page.getByRole('img', { name: 'bench 77.78, yours 85.19, of 100' })).toBeVisible();
  await expect(heading(page, 'Where 6 of 27 points went')).toBeVisible();
  await expect(page.getByText('Three of three lengths are short')).toBeVisible();
  await expect(page.getByRole('button', { name: 'base, length' })).toHaveAttribute('aria-pressed', 'true');

  const table = page.getByRole('table', { name: 'Every lost point' });
  const first = await cellsOf(table.getByRole('row', { name: /^base, length/ }));
  expect(first.slice(-2)).toEqual(['3', '11.11']);
  const sums = await cellsOf(table.getByRole('row', { name: /^lost/ }));
  expect(sums).toEqual(['6', '22.22']);
  expect(await cellsOf(table.getByRole('row', { name: /^score/ }))).toEqual(['', '78']);
  await expectAccessible(page);

  await page.getByRole('link', { name: 'own readings' }).click();
  await expect(heading(page, 'Own readings are closed')).toBeVisible();
});

test('somebody without a practical is told what comes next', async ({ page, context }) => {
  const other = await stageRound();
  await ownerSql()`delete from attempts where student_id = ${other.students[1].personId}`;
  await takeSession(context, other, other.students[1], 'student');
  await page.goto('/my');
  await expect(heading(page, 'Nothing has been given to you yet')).toBeVisible();
  await expectAccessible(page);
  const answer = await page.goto(`/my/${stage.sittingId}`);
  expect(answer?.status()).toBe(404);
});
