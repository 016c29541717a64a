import type { Page } from 'playwright/test';
import { makePerson, makeSchool, makeSection, type TestSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';

async function newTeacher(page: Page, school: TestSchool) {
  const teacher = await makePerson(school, ['teacher'], { password: PASSWORD });
  await signIn(page, { ...teacher, schoolCode: null, password: PASSWORD });
  return teacher;
}

async function lookAtCsv(page: Page, text: string): Promise<void> {
  await page.getByText('CSV, with columns').click();
  await page.getByRole('textbox', { name: 'rows' }).fill(text);
  await page.getByRole('button', { name: 'look at the rows' }).click();
}

const row = (page: Page, name: string) => page.getByRole('row').filter({ hasText: name });

test('a new teacher makes a period, brings in the names, and a student signs in with the printed words', async ({
  page,
  browser,
}) => {
  const school = await makeSchool();
  await newTeacher(page, school);

  await test.step('an empty desk says the next step', async () => {
    await expect(page).toHaveURL(/\/periods$/);
    await expect(page.getByRole('heading', { name: 'Copy a starter practical' })).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('link', { name: 'make a period' }).click();
  });

  await test.step('a period needs a name and its number', async () => {
    await page.getByLabel('section').fill('Woods 2');
    await page.getByRole('button', { name: 'make the period' }).click();
    await expect(page.getByText('Type the period, such as 3.')).toBeVisible();
    await expect(page.getByLabel('section')).toHaveValue('Woods 2');
    await expectAccessible(page);
    await page.getByLabel('period').fill('3');
    await page.getByRole('button', { name: 'make the period' }).click();
    await expect(page.getByRole('heading', { name: 'Names for Woods 2' })).toBeVisible();
    await expectAccessible(page);
  });
  const roster = page.url().replace('/import', '');

  await test.step('pasted names get IDs that are made', async () => {
    await page.getByRole('textbox', { name: 'names' }).fill('Abara, Chidi\nRenata Aguilar');
    await page.getByRole('button', { name: 'look at the rows' }).click();
    await expect(page.getByText('2 students come in.')).toBeVisible();
    await expect(row(page, 'Aguilar, Renata')).toContainText('is made');
    await page.getByRole('button', { name: 'bring them in' }).click();
    await expect(page.getByText('2 students are new.')).toBeVisible();
    await page.getByRole('button', { name: 'more names' }).click();
  });

  const good = 'ID;family name;given name\n00417;Bergström;Maja\n00431;Boateng;Kwesi\n';

  await test.step('each problem of a CSV is named before anything is written', async () => {
    await lookAtCsv(page, `${good}=1+1;Castellanos;Noor\n00417;Dang;Minh-Anh\n`);
    await expect(page.getByText('2 students come in. 2 rows cannot be used.')).toBeVisible();
    await expect(row(page, 'Castellanos, Noor')).toContainText(
      'The ID begins with =: spreadsheets run such a text as a formula.',
    );
    await expect(row(page, 'Dang, Minh-Anh')).toContainText('The ID 00417 also stands in line 2.');
    await expect(row(page, 'Bergström, Maja')).toContainText('00417');
    await expect(page.getByRole('button', { name: /^bring them in ?, not yet/ })).toBeVisible();
    await expectAccessible(page);
  });

  await test.step('the text is corrected where it stands, and comes in with its zeros', async () => {
    await page.getByRole('button', { name: 'change the text' }).click();
    await expect(page.getByRole('textbox', { name: 'rows' })).toHaveValue(/=1\+1;Castellanos;Noor/);
    const corrected = `${good}00450;Castellanos;Noor\n00453;Dang;Minh-Anh\n`;
    await lookAtCsv(page, corrected);
    await page.getByRole('button', { name: 'bring them in' }).click();
    await expect(page.getByText('4 students are new.')).toBeVisible();
    await page.getByRole('button', { name: 'more names' }).click();
    await lookAtCsv(page, corrected);
    await expect(page.getByText('Nothing changes: 4 students are on the roster already.')).toBeVisible();
    await expect(page.getByRole('button', { name: 'bring them in' })).toHaveCount(0);
  });

  await test.step('the roster shows IDs as they were given', async () => {
    await page.getByRole('link', { name: 'the roster' }).click();
    await expect(page).toHaveURL(roster);
    await expect(row(page, 'Bergström, Maja')).toContainText('00417');
    await expect(row(page, 'Abara, Chidi')).toContainText('W0001');
    await expect(row(page, 'Abara, Chidi')).toContainText('no words yet');
    await expectAccessible(page);
  });

  const words = await test.step('slips are printed once', async () => {
    await page.getByRole('link', { name: 'make slips' }).click();
    await expect(page.getByText('A slip each for 6 students')).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('button', { name: 'make the slips' }).click();
    const slip = page.getByRole('listitem').filter({ hasText: 'Maja Bergström' });
    await expect(slip).toContainText(school.code);
    await expect(slip).toContainText('00417');
    await expect(slip).toContainText('/sign-in');
    await expectAccessible(page);
    await page.evaluate(() => {
      window.print = () => window.dispatchEvent(new Event('afterprint'));
    });
    await page.getByRole('button', { name: 'print 6 slips' }).click();
    await expect(page.getByText('Handed to the printer.')).toBeVisible();
    await page.emulateMedia({ media: 'print' });
    await expect(slip).toBeVisible();
    await expect(page.getByRole('heading', { name: 'Slips' })).toBeHidden();
    await expect(page.getByRole('button', { name: 'print again' })).toBeHidden();
    await page.emulateMedia({ media: 'screen' });
    const printed = await slip.getByTestId('words').textContent();
    await page.reload();
    await expect(page.getByText('Everybody here has words')).toBeVisible();
    return printed ?? '';
  });

  await test.step('the printed words let the student in, once', async () => {
    const phone = await browser.newContext({ viewport: { width: 390, height: 844 } });
    const own = await phone.newPage();
    await signIn(own, { email: null, schoolCode: school.code, localId: '00417', password: words });
    await expect(own).toHaveURL(/new-passphrase/);
    await own.goto('/my');
    await expect(own).toHaveURL(/new-passphrase/);
    await phone.close();
  });
});

test('a file that is no roster is refused at its field, and what was pasted stays', async ({ page }) => {
  const school = await makeSchool();
  const teacher = await newTeacher(page, school);
  const sectionId = await makeSection(school, { teacherIds: [teacher.personId] });
  await page.goto(`/periods/${sectionId}/import`);
  await page.getByRole('textbox', { name: 'names' }).fill('Eklund, Sten');
  const choose = async (name: string, buffer: Buffer) => {
    await page.getByLabel('or a CSV file').setInputFiles({ name, mimeType: 'text/csv', buffer });
    await page.getByRole('button', { name: 'look at the rows' }).click();
  };
  await choose('big.csv', Buffer.alloc(10_000_000, 'x'));
  await expect(page.getByText('This file has 10.0 MB')).toBeVisible();
  await choose('latin.csv', Buffer.from('ID;Surname;First name\n1;Bergstr\u{f6}m;Maja\n', 'latin1'));
  await expect(page.getByText('This file is not in UTF-8')).toBeVisible();
  await choose('packed.csv', Buffer.from([0x50, 0x4b, 3, 4, 0, 0]));
  await expect(page.getByText('This is a spreadsheet or another packed file, not CSV.')).toBeVisible();
  const rows = Array.from({ length: 501 }, (_, index) => `${index};Family${index};Given`).join('\n');
  await choose('long.csv', Buffer.from(`ID;Surname;First name\n${rows}`));
  await expect(page.getByText('There are 501 rows; a section takes 500 at most.')).toBeVisible();
  await expect(page.getByRole('textbox', { name: 'names' })).toHaveValue('Eklund, Sten');
  await expect(page.getByLabel('or a CSV file')).toHaveAttribute('aria-invalid', 'true');
  await expectAccessible(page);

  await choose('roster.csv', Buffer.from('\u{feff}00417;Bergström;Maja\n00431;Boateng;Kwesi\n'));
  await expect(page.getByText('Say which column holds what.')).toBeVisible();
  await expectAccessible(page);
  await page.getByLabel('column 2').selectOption('given name');
  await expect(
    page.getByText('Two columns hold the same. Set one of them to “not read”.', { exact: true }),
  ).toBeVisible();
  await page.getByLabel('column 3').selectOption('family name');
  await page.getByRole('button', { name: 'read it so' }).click();
  await expect(row(page, 'Maja, Bergström')).toContainText('00417');
});

test('where a row and the school say different things, the teacher chooses', async ({ page }) => {
  const school = await makeSchool();
  const teacher = await newTeacher(page, school);
  const student = await makePerson(school, ['student'], { familyName: 'Quispe', givenName: 'Wayra' });
  const sectionId = await makeSection(school, {
    teacherIds: [teacher.personId],
    studentIds: [student.personId],
  });
  await page.goto(`/periods/${sectionId}/import`);
  await lookAtCsv(page, `ID;Surname;First name\n${student.localId};Quispe;Wayra Luz\n`);
  await expect(page.getByText('One row needs your word.')).toBeVisible();
  await expect(
    page.getByRole('button', { name: /^bring them in ?, not yet: say what holds in one row/ }),
  ).toBeVisible();
  await expectAccessible(page);
  await page.getByLabel('the name becomes “Quispe, Wayra Luz”').check();
  await page.getByRole('button', { name: 'bring them in' }).click();
  await expect(page.getByText('One name was corrected.')).toBeVisible();
  await page.getByRole('link', { name: 'the roster' }).click();
  await expect(page.getByRole('link', { name: 'Quispe, Wayra Luz' })).toBeVisible();
});

test('a teacher gives new words at the bench, and takes a student out of the section and back', async ({
  page,
  browser,
}) => {
  const school = await makeSchool();
  const teacher = await newTeacher(page, school);
  const student = await makePerson(school, ['student'], {
    familyName: 'Quispe',
    givenName: 'Wayra',
    password: 'quarry biplane teapot gravel',
  });
  const sectionId = await makeSection(school, {
    teacherIds: [teacher.personId],
    studentIds: [student.personId],
  });
  await page.goto(`/periods/${sectionId}`);
  await page.getByRole('link', { name: 'Quispe, Wayra' }).click();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'make new words' }).click();
  const shown = page.getByRole('list', { name: 'the new words' }).getByRole('listitem');
  await expect(shown).toHaveCount(4);
  const words = (await shown.allInnerTexts()).join(' ');
  const phone = await browser.newContext();
  const own = await phone.newPage();
  await signIn(own, { email: null, schoolCode: school.code, localId: student.localId, password: words });
  await expect(own).toHaveURL(/new-passphrase/);
  await phone.close();

  await page.getByLabel('left on').fill('2025-01-01');
  await page.getByRole('button', { name: 'mark as left' }).click();
  await expect(page.getByText('This is before the day they joined')).toBeVisible();
  await expect(page.getByLabel('left on')).toHaveValue('2025-01-01');
  await page.reload();
  await page.getByRole('button', { name: 'mark as left' }).click();
  await expect(page.getByRole('button', { name: 'bring back' })).toBeVisible();
  await page.getByRole('link', { name: 'the roster' }).click();
  await expect(page.getByRole('heading', { name: 'Everybody has left' })).toBeVisible();
  await page.getByText('one has left').click();
  await page.getByRole('link', { name: 'Quispe, Wayra' }).click();
  await page.getByRole('button', { name: 'bring back' }).click();
  await expect(page.getByRole('button', { name: 'mark as left' })).toBeVisible();

  await page.getByRole('link', { name: 'the roster' }).click();
  await page.getByRole('button', { name: 'add one' }).click();
  await page.getByLabel('family name').fill('Rahimi');
  await page.getByLabel('given name').fill('Laleh');
  await page.getByLabel('ID').fill('@498');
  await page.getByRole('button', { name: 'add the student' }).click();
  await expect(page.getByText('The ID begins with @')).toBeVisible();
  await expect(page.getByLabel('family name')).toHaveValue('Rahimi');
  await expectAccessible(page);
  await page.getByLabel('ID').fill('00498');
  await page.getByRole('button', { name: 'add the student' }).click();
  await expect(page.getByText('Rahimi, Laleh is on the roster, ID 00498.')).toBeVisible();
  await page.getByRole('button', { name: 'close' }).click();
  await expect(row(page, 'Rahimi, Laleh')).toContainText('00498');
});
