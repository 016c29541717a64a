import type { Page } from 'playwright/test';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { starterDraft } from '@/lib/practicals/starters';
import { ownerSql } from '@/tests/support/database';
import { makePerson, makeSchool, type TestPerson, type TestSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { Author } from './fixtures/author';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';

let school: TestSchool;
let teacher: TestPerson;
let author: Author;

test.beforeEach(async ({ page }) => {
  school = await makeSchool();
  teacher = await makePerson(school, ['teacher'], { password: PASSWORD });
  await signIn(page, { ...teacher, schoolCode: null, password: PASSWORD });
  author = new Author(page);
});

const BENCH_HOOK = [
  ['base', '1', '3/4', '4-1/2', '9'],
  ['hook', '1', '3/4', '1-1/4', '5'],
  ['fence', '1', '3/4', '1-1/4', '4-1/4'],
  ['guide', '2', '3/4', '3/4', '3'],
];

async function startEmpty(page: Page, title: string): Promise<void> {
  await page.goto('/practicals');
  await author.press(author.link('new practical'));
  await author.typeInto(page.getByLabel('title'), title);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { name: title })).toBeVisible();
}

/** What the database keeps of the newest version of the school. */
async function publishedOf({ id }: TestSchool) {
  const rows = await ownerSql()<{ number: number; task: unknown; rubric: { lines: unknown[] } }[]>`
    select number, task, rubric from rubric_versions where school_id = ${id} order by published_at`;
  return rows;
}

test('a teacher writes the bench-hook kit from nothing by keyboard, is refused at fields, and publishes it', async ({
  page,
}) => {
  await startEmpty(page, 'Bench-hook kit');
  await author.typeInto(page.getByLabel('wood'), 'poplar');
  for (const [field, size] of [
    ['thickness', '3/4'],
    ['width', '7'],
    ['length', '13'],
  ] as const) {
    await author.typeInto(page.getByLabel(field, { exact: true }), size);
  }

  await author.press(author.link(/cut list and prices/));
  await author.press(author.button('add a line'));
  for (const [index, row] of BENCH_HOOK.entries()) {
    await author.typeRow(index === 1 ? row.with(3, '1-1/') : row);
    if (index < BENCH_HOOK.length - 1) await page.keyboard.press('Enter');
  }
  await author.expectKept();
  await expect(page.getByText('A fraction needs a number above and one below the line.')).toBeVisible();
  await expectAccessible(page);

  await author.press(author.button(/^publish version 1/));
  const bad = page.getByLabel('width, hook', { exact: true });
  await expect(bad).toBeFocused();
  await expect(bad).toHaveValue('1-1/');
  await author.type('1-1/4');
  await expect(page.getByText('of 100. 1 of 45 is 2.22 of 100.')).toBeVisible();

  await author.press(author.button(/^publish version 1/));
  const dialog = page.getByRole('dialog');
  await expect(dialog).toContainText('A version never changes.');
  await expectAccessible(page);
  await author.press(dialog.getByRole('button', { name: 'publish version 1' }));
  await expect(page.getByRole('dialog', { name: 'Version 1 is published' })).toBeVisible();
  await expect(page.getByRole('link', { name: 'open a sitting' }).first()).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(author.button(/^publish version 2/)).toContainText('nothing has changed since version 1');

  const starter = parseDraft(starterDraft('bench-hook'));
  const sizes = starter.ok ? starter.rubric.lines.map(({ quantity, target }) => ({ quantity, target })) : [];
  const [version, ...more] = await publishedOf(school);
  expect(more).toEqual([]);
  expect(version).toMatchObject({ number: 1, task: { material: 'poplar' }, rubric: { lines: sizes } });
});

test('what is typed is there again after a reload, kept or not, good or bad', async ({ page }) => {
  await startEmpty(page, 'Box');
  await author.press(author.link(/cut list and prices/));
  await author.press(author.button('add a line'));
  await author.typeRow(['side', '2', '1/2', '3 1/']);
  await page.reload();
  await expect(page.getByLabel('part, line 1')).toHaveValue('side');
  await expect(page.getByLabel('width, side', { exact: true })).toHaveValue('3 1/');
  await author.expectKept();
  await page.goto('/practicals');
  await page.getByRole('link', { name: 'Box' }).click();
  await expect(page.getByLabel('width, side', { exact: true })).toHaveValue('3 1/');
});

test('a second tab is told that its draft is stale, and either of the two can be kept', async ({
  page,
  context,
}) => {
  await startEmpty(page, 'Box');
  const other = await context.newPage();
  await other.goto(page.url());
  await other.getByLabel('wood').fill('maple');
  await expect(other.getByText(/^kept \d\d:\d\d$/)).toBeVisible();

  await page.getByLabel('wood').fill('cherry');
  const dialog = page.getByRole('dialog', { name: 'Two drafts of this practical' });
  await expect(dialog.getByRole('row', { name: 'wood cherry maple' })).toBeVisible();
  await expectAccessible(page);
  await dialog.getByRole('button', { name: 'look first' }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByLabel('wood')).toBeFocused();
  await page.getByRole('button', { name: 'choose a draft' }).click();
  await dialog.getByRole('button', { name: 'keep what is typed here' }).click();
  await author.expectKept();

  await other.getByLabel('wood').fill('walnut');
  await other.getByRole('button', { name: 'take the one kept there' }).click();
  await expect(other.getByLabel('wood')).toHaveValue('cherry');
});

test('rows of a spreadsheet are pasted, bad ones are told where they stand, and a removed line comes back', async ({
  page,
}) => {
  await startEmpty(page, 'Pasted');
  await author.press(author.link(/cut list and prices/));
  await author.press(author.button('add a line'));
  const rows = ['base\t1\t3/4\t4 1/2\t9', 'hook\tone\t3/4\t1 1/4\t5', 'fence\t1\t3/4\twide\t4 1/4'].join(
    '\n',
  );
  await page.getByLabel('part, line 1').evaluate((cell, text) => {
    const data = new DataTransfer();
    data.setData('text/plain', text);
    cell.dispatchEvent(new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }));
  }, rows);
  await expect(page.getByLabel('part, line 3')).toHaveValue('fence');
  await expect(page.getByText('3 rows pasted')).toBeVisible();
  await expect(page.getByText('The number of pieces is a whole number from 1 to 200.')).toBeVisible();
  await expect(page.getByLabel('width, fence', { exact: true })).toHaveAttribute('aria-invalid', 'true');

  await author.press(page.getByRole('button', { name: /^line 3, fence/ }));
  await author.press(author.button('remove this line'));
  await expect(page.getByLabel('part, line 3')).toHaveCount(0);
  await author.press(author.button('undo'));
  await expect(page.getByLabel('part, line 3')).toHaveValue('fence');
});

test('a price that one line has for itself shows on the rule and in the examples at once', async ({
  page,
}) => {
  await page.goto('/practicals');
  await author.press(author.button('copy the starter Desk caddy'));
  await expect(page.getByRole('heading', { name: 'Desk caddy' })).toBeVisible();
  await author.press(page.getByRole('button', { name: 'price of length, end: as all lines' }));
  await author.press(author.button('price it by itself'));
  await author.press(author.button('undersize doubles'));
  const score = (label: RegExp) =>
    page.getByRole('table', { name: 'scores of example attempts' }).getByRole('row', { name: label });
  await expect(score(/^one end .* short/)).toContainText('97');
  await expect(score(/^both of end .* short/)).toContainText('87');
  await author.typeInto(page.getByLabel('under, length, band 2, points'), '3');
  await expect(score(/^one end .* short/)).toContainText('95');

  await page.getByRole('slider', { name: 'under, end, length, edge of band 3' }).focus();
  await page.keyboard.press('ArrowLeft');
  await expect(page.getByLabel('under, length, band 3, within')).toHaveValue('1/8');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('ArrowRight');
  await expect(page.getByLabel('under, length, band 3, within')).toHaveValue('3/32');

  await author.typeInto(page.getByLabel('missing, divider'), '6');
  await expect(page.getByText('A missing piece loses 6 points', { exact: false })).toBeVisible();
  await author.press(author.button('set it to the worth'));
  await expect(page.getByLabel('missing, divider')).toHaveValue('worth');
  await author.press(author.button('price as all lines'));
  await expect(score(/^one end .* short/)).toContainText('98');
  await expectAccessible(page);
});
