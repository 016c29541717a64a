import { readFileSync } from 'node:fs';
import type { Page } from 'playwright/test';
import { ownerSql } from '@/tests/support/database';
import { makePractical } from '@/tests/support/factories';
import { makePerson, makeSchool, type TestPerson, type TestSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';
const EXAMPLE = readFileSync('tests/support/data/bench-hook.practical.json', 'utf8');

const enter = (page: Page, person: TestPerson) =>
  signIn(page, { ...person, schoolCode: null, password: PASSWORD });

async function makeTeacher(name: string): Promise<{ school: TestSchool; teacher: TestPerson }> {
  const school = await makeSchool(name);
  return { school, teacher: await makePerson(school, ['teacher'], { password: PASSWORD }) };
}

async function bringIn(page: Page, text: string, fileName = 'bench hook.json'): Promise<void> {
  await page.goto('/practicals/import');
  const buffer = Buffer.from(text);
  await page
    .getByLabel('file', { exact: true })
    .setInputFiles({ name: fileName, mimeType: 'application/json', buffer });
  await page.getByRole('button', { name: 'make the practical' }).click();
}

async function publish(page: Page, number: number): Promise<void> {
  await page.getByRole('button', { name: `publish version ${number}` }).click();
  await page
    .getByRole('dialog')
    .getByRole('button', { name: `publish version ${number}` })
    .click();
  await expect(page.getByText(`Version ${number} is published`).first()).toBeVisible();
  await page.keyboard.press('Escape');
}

/** The text of the file that a press on the link gives, and its name. */
async function download(page: Page, link: string): Promise<{ name: string; text: string }> {
  const [file] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: link }).click(),
  ]);
  return { name: file.suggestedFilename(), text: readFileSync(await file.path(), 'utf8') };
}

test('a practical goes out of one school as a file and comes into another as the same draft', async ({
  page,
  browser,
}) => {
  const { teacher } = await makeTeacher('Cedar Fork High School');
  await enter(page, teacher);
  await page.goto('/practicals/new');
  await page.getByRole('link', { name: 'from a file' }).click();
  await expect(page.getByRole('heading', { name: 'Practical from a file' })).toBeVisible();
  await expectAccessible(page);
  await bringIn(page, EXAMPLE);
  await expect(page.getByRole('heading', { name: 'Bench-hook kit' })).toBeVisible();
  await publish(page, 1);
  const practical = new URL(page.url()).pathname;
  await page.goto(`${practical}/versions`);
  await expectAccessible(page);
  const out = await download(page, 'take version 1 out as a file');
  expect(out).toEqual({ name: 'bench-hook-kit-version-1.practical.json', text: EXAMPLE });

  const other = await makeTeacher('Ardmore Academy');
  const context = await browser.newContext();
  const elsewhere = await context.newPage();
  await enter(elsewhere, other.teacher);
  await bringIn(elsewhere, out.text);
  await expect(elsewhere.getByRole('heading', { name: 'Bench-hook kit' })).toBeVisible();
  await expect(elsewhere.getByRole('button', { name: 'publish version 1' })).toBeVisible();
  await elsewhere.goto(`${new URL(elsewhere.url()).pathname}/versions`);
  expect((await download(elsewhere, 'take the draft out as a file')).text).toBe(EXAMPLE);
  await context.close();
});

test('a broken file tells every place that is wrong, makes nothing, and can be put right on the spot', async ({
  page,
}) => {
  const { school, teacher } = await makeTeacher('Cedar Fork High School');
  await enter(page, teacher);
  const broken = EXAMPLE.replace('"kerf": 31750000', '"kerf": 0')
    .replace('"within": 15875000,', '"within": 1,')
    .replace('"exceptions": {', '"exceptions": { "lid": { "worth": 1 },');
  await bringIn(page, broken);
  await expect(page.getByText('3 places in bench hook.json cannot be used.')).toBeVisible();
  const table = page.getByRole('table', { name: 'what cannot be used' });
  await expect(
    table.getByRole('row', { name: /^14, 13 kerf task\.kerf This is more than 0\./ }),
  ).toBeVisible();
  await expect(
    table.getByRole('row', {
      name: /all lines, price of thickness, over, band 2, within form\.defaults\.sizes\.thickness\.over\[1\]\.within Each band reaches further/,
    }),
  ).toBeVisible();
  await expect(
    table.getByRole('row', { name: /exception of lid .* The cut list has no line “lid”\./ }),
  ).toBeVisible();
  await expectAccessible(page);
  const made = () => ownerSql()`select 1 from practicals where school_id = ${school.id}`;
  expect(await made()).toHaveLength(0);

  const text = page.getByRole('textbox');
  await expect(text).toHaveValue(broken);
  await text.fill('{"trymark": "practical", "version": 7}');
  await page.getByRole('button', { name: 'make the practical' }).click();
  await expect(page.getByText('made by a newer Trymark', { exact: false })).toBeVisible();
  await text.fill(EXAMPLE);
  await page.getByRole('button', { name: 'make the practical' }).click();
  await expect(page.getByRole('heading', { name: 'Bench-hook kit' })).toBeVisible();
  expect(await made()).toHaveLength(1);
});

test('a version is read in full, taken back into the draft with a look at what gives way, and undone', async ({
  page,
}) => {
  const { teacher } = await makeTeacher('Cedar Fork High School');
  await enter(page, teacher);
  await bringIn(page, EXAMPLE);
  await publish(page, 1);
  const practical = new URL(page.url()).pathname;
  await page.goto(`${practical}?step=task`);
  await page.getByLabel('kerf').fill('3/32');
  await expect(page.getByText(/^kept \d\d:\d\d$/)).toBeVisible();
  await publish(page, 2);

  await page.goto(`${practical}/versions/2`);
  await expect(page.getByRole('heading', { name: 'Bench-hook kit, version 2' })).toBeVisible();
  await expect(page.getByRole('heading', { name: 'What changed since version 1' })).toBeVisible();
  await expect(page.getByRole('listitem').filter({ hasText: /^Kerf: now .*, was / })).toBeVisible();
  await expect(page.getByRole('row', { name: /^2 hook/ })).toContainText('12');
  await expect(page.getByRole('img', { name: /^hook: thickness/ })).toBeVisible();
  await expect(page.getByText('Each day late takes 5% off the score, 20% at most.')).toBeVisible();
  await expectAccessible(page);

  await page.goto(`${practical}/versions/1`);
  await page.getByRole('button', { name: 'take it back into my draft' }).click();
  const dialog = page.getByRole('dialog');
  await expect(dialog.getByRole('row', { name: 'kerf 3/32 1/8' })).toBeVisible();
  await expectAccessible(page);
  await dialog.getByRole('button', { name: 'take version 1 back' }).click();
  await expect(page.getByText('Your draft says what version 1 says.')).toBeVisible();
  await page.getByRole('button', { name: 'undo' }).click();
  await expect(page.getByText('Your draft is as it was.')).toBeVisible();
  await page.goto(`${practical}?step=task`);
  await expect(page.getByLabel('kerf')).toHaveValue('3/32');

  await page.goto(`${practical}/versions/1`);
  await page.getByRole('button', { name: 'copy into a new practical' }).click();
  await expect(page.getByRole('heading', { name: 'Bench-hook kit, copy' })).toBeVisible();
});

test('a head reads the same version, and it is nothing to a teacher who has nothing to do with it', async ({
  page,
  browser,
}) => {
  const { school, teacher } = await makeTeacher('Cedar Fork High School');
  const { practicalId, versionId } = await makePractical(school, teacher.personId);
  await enter(page, await makePerson(school, ['head'], { password: PASSWORD }));
  await page.goto(`/department/versions/${versionId}`);
  await expect(page.getByRole('heading', { name: 'Nine parts, version 1' })).toBeVisible();
  await expect(page.getByRole('table', { name: 'cut list' })).toBeVisible();
  await expectAccessible(page);

  const context = await browser.newContext();
  const other = await context.newPage();
  await enter(other, await makePerson(school, ['teacher'], { password: PASSWORD }));
  const answer = await other.goto(`/practicals/${practicalId}/versions/1`);
  expect(answer?.status()).toBe(404);
  expect((await other.request.get(`/api/practicals/${practicalId}/file?version=1`)).status()).toBe(404);
  await context.close();
});
