import { readFile } from 'node:fs/promises';
import { parse } from 'csv-parse/sync';
import type { Locator, Page } from 'playwright/test';
import { hashSecret, makeSecret } from '@/lib/auth/secret-links';
import { scoreAttempt } from '@/lib/scoring';
import { attemptSchema, rubricSchema } from '@/lib/scoring/schemas';
import { ownerSql } from '@/tests/support/database';
import { expect, test } from './fixtures/test';

const CLASS = ['Abara, Chidi', 'Boateng, Kwesi', '=Sum, Zosia'];

async function makeSetupLink(): Promise<string> {
  const secret = makeSecret();
  const sql = ownerSql();
  await sql`insert into setup_tokens ${sql({
    secret_hash: hashSecret(secret),
    expires_at: new Date(Date.now() + 3_600_000),
  })}`;
  return `/set-up/${secret}`;
}

async function makeSchool(page: Page): Promise<void> {
  const tag = Date.now().toString(36);
  await page.goto(await makeSetupLink());
  await page.getByLabel('name', { exact: true }).fill(`Larch Lane School ${tag}`);
  await page.getByLabel('given name').fill('Odile');
  await page.getByLabel('family name').fill('Brun');
  await page.getByLabel('email').fill(`odile.${tag}@larchlane.example`);
  await page.getByLabel('password').fill('nine quiet planes in a row');
  await expect(page.getByLabel('I teach')).toBeChecked();
  await page.getByRole('button', { name: 'make the school' }).click();
  await expect(page).not.toHaveURL(/set-up/);
  await page.goto('/periods');
  await expect(page.getByRole('link', { name: 'make a period' })).toBeVisible();
}

async function makePeriod(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'make a period' }).click();
  await page.getByLabel('section').fill('Woods 1');
  await page.getByLabel('period').fill('4');
  await page.getByRole('button', { name: 'make the period' }).click();
  await page.getByRole('textbox', { name: 'names' }).fill(CLASS.join('\n'));
  await page.getByRole('button', { name: 'look at the rows' }).click();
  await page.getByRole('button', { name: 'bring them in' }).click();
  await expect(page.getByText('3 students are new.')).toBeVisible();
}

async function publishStarter(page: Page): Promise<void> {
  await page.goto('/practicals');
  await page.getByRole('button', { name: 'copy the starter Bench-hook kit' }).click();
  await page.getByRole('button', { name: 'publish version 1' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'publish version 1' }).click();
  await expect(page.getByRole('dialog', { name: 'Version 1 is published' })).toBeVisible();
}

async function openSitting(page: Page): Promise<void> {
  await page.goto('/sittings/new');
  await page.getByRole('button', { name: 'open the sitting' }).click();
  await expect(page.getByRole('heading', { name: 'Bench-hook kit' })).toBeVisible();
  await page.getByRole('link', { name: 'to the bench' }).click();
  await expect(page.locator('[data-cell]').first()).toBeVisible();
}

const cell = (page: Page, address: string): Locator => page.locator(`[data-cell="${address}"]`);
const key = (page: Page, word: string): Locator =>
  page.getByRole('button', { name: new RegExp(`^${word}( |$)`) });

/** Three students: one set good throughout, one with a base 1/16 short, one without a hook. */
async function markTheClass(page: Page): Promise<void> {
  const finish = async () => {
    await key(page, 'rest OK').click();
    await key(page, 'all good').click();
    await key(page, 'finish').click();
  };
  await expect(page.getByRole('heading', { name: 'Zosia =Sum' })).toBeVisible();
  await finish();
  await expect(page.getByRole('heading', { name: 'Chidi Abara' })).toBeVisible();
  await cell(page, 'base/1/length').click();
  await page
    .getByRole('toolbar')
    .getByRole('button', { name: /^8 15\/16,/ })
    .click();
  await finish();
  await expect(page.getByRole('heading', { name: 'Kwesi Boateng' })).toBeVisible();
  await cell(page, 'hook/1/width').click();
  await key(page, 'missing').click();
  await expect(page.getByText('What is missing?')).toBeVisible();
  await page.getByRole('button', { name: 'hook', exact: true }).last().click();
  await finish();
  const counted = (which: string) => page.getByTestId(which).textContent();
  await expect(page.getByText('all sent')).toBeVisible();
  await expect.poll(() => counted('sent')).toBe(await counted('kept'));
}

async function publishSitting(page: Page): Promise<void> {
  await page.goto('/sittings');
  await page.getByRole('link', { name: 'Bench-hook kit, period 4', exact: true }).click();
  await page.getByRole('link', { name: 'publish' }).click();
  await page.getByRole('button', { name: 'publish', exact: true }).click();
  await expect(page.getByText(/published/i).first()).toBeVisible();
}

async function exportGrades(page: Page): Promise<string> {
  await page.goto('/gradebook');
  await page.getByRole('button', { name: 'export CSV' }).click();
  const download = page.waitForEvent('download');
  await page.getByRole('link', { name: 'grades, a row a student' }).click();
  return readFile(await (await download).path(), 'utf8');
}

/** What the engine makes of everything the server has of the class, by family name. */
async function engineScores(url: string): Promise<Map<string, number | null>> {
  const sectionId = new URL(url).pathname.split('/').at(-1) ?? '';
  const rows = await ownerSql()`select p.family_name, h.recorded, v.rubric
    from score_sheets h join attempts a on a.id = h.attempt_id join people p on p.id = a.student_id
    join sittings s on s.id = a.sitting_id join rubric_versions v on v.id = s.rubric_version_id
    where h.side = 'bench' and s.section_id = ${sectionId}`;
  return new Map(
    rows.map((row) => [
      String(row.family_name),
      scoreAttempt(rubricSchema.parse(row.rubric), attemptSchema.parse(row.recorded)).score,
    ]),
  );
}

test('from the set-up link to the registrar: the CSV of a period reads back as the engine scores its readings', async ({
  page,
}) => {
  await test.step('a school and its first teacher', () => makeSchool(page));
  await test.step('a period with pasted names', () => makePeriod(page));
  await test.step('a starter practical, published', () => publishStarter(page));
  await test.step('a sitting, opened', () => openSitting(page));
  await test.step('three students at the bench', () => markTheClass(page));
  await test.step('the results go out', () => publishSitting(page));

  const csv = await test.step('the file of the period', () => exportGrades(page));
  const records: Record<string, string>[] = parse(csv, { columns: true });
  expect(csv).toContain('\r\n');
  expect(records.map((row) => row['family name']).sort()).toEqual(["'=Sum", 'Abara', 'Boateng']);

  const scores = await engineScores(page.url());
  expect(scores.size).toBe(3);
  for (const row of records) {
    const family = (row['family name'] ?? '').replace(/^'/, '');
    expect(Number(row.score) * 100, family).toBe(scores.get(family));
    expect(row.status).toBe('scored');
    expect(row['out of']).toBe('100');
    expect(row.period).toBe('4');
  }
  expect([...scores.values()].sort()).toEqual([10_000, 8000, 9800]);
  expect(await exportGrades(page), 'the same file, byte for byte').toBe(csv);
});
