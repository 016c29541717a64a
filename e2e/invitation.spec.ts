import { makePerson, makeSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';

test('an admin invites another; the link survives being looked at, sets the password once, and lets in', async ({
  page,
  browser,
  mailbox,
}) => {
  const school = await makeSchool();
  const admin = await makePerson(school, ['admin'], { password: PASSWORD });
  const email = `maja.${Date.now().toString(36)}@cedarfork.example`;
  await signIn(page, { ...admin, schoolCode: null, password: PASSWORD });
  await page.getByRole('link', { name: 'invite a teacher' }).click();
  await expect(page.getByRole('heading', { name: 'Invite' })).toBeVisible();
  await expectAccessible(page);
  await page.getByLabel('given name').fill('Maja');
  await page.getByLabel('family name').fill('Bergström');
  await page.getByLabel('email').fill('maja at cedarfork');
  await page.getByRole('button', { name: 'send the invitation' }).click();
  await expect(page.getByText('This is not an email address.')).toBeVisible();
  await expect(page.getByLabel('family name')).toHaveValue('Bergström');
  await page.getByLabel('email').fill(email);
  await page.getByLabel('teacher').uncheck();
  await page.getByLabel('admin').check();
  await page.getByRole('button', { name: 'send the invitation' }).click();
  await expect(page.getByText('The invitation is on its way.')).toBeVisible();
  await expectAccessible(page);

  const guest = await (await browser.newContext()).newPage();
  const link = mailbox.linkIn(await mailbox.newestTo(email));
  await guest.goto(link);
  await guest.reload();
  await expect(guest.getByText('You sign in with')).toContainText(email);
  await expectAccessible(guest);
  await guest.getByLabel('new password').fill('short');
  await guest.getByRole('button', { name: 'keep it and go in' }).click();
  await expect(guest.getByText('Use 15 characters or more')).toBeVisible();
  await guest.getByLabel('new password').fill('seven otters at the lathe');
  await guest.getByRole('button', { name: 'keep it and go in' }).click();
  await expect(guest).toHaveURL(/\/school$/);
  await guest.context().clearCookies();
  await guest.goto(link);
  await expect(guest.getByText('This link has been used or replaced')).toBeVisible();
  await guest.context().close();

  await page.getByRole('link', { name: 'log', exact: true }).click();
  await expect(page.getByRole('cell', { name: 'accepted the invitation' })).toBeVisible();
  await expectAccessible(page);
});

test('a forgotten password is reset by a mailed link; the page says the same of an unknown address', async ({
  page,
  mailbox,
}) => {
  const school = await makeSchool();
  const admin = await makePerson(school, ['admin'], { password: PASSWORD });
  for (const address of ['nobody@cedarfork.example', admin.email ?? '']) {
    await page.goto('/sign-in');
    await page.getByRole('link', { name: 'forgotten password' }).click();
    await expect(page.getByRole('heading', { name: 'Forgotten password' })).toBeVisible();
    await page.getByLabel('email').fill(address);
    await page.getByRole('button', { name: 'send me a link' }).click();
    await expect(page.getByText('If there is an account with that email')).toBeVisible();
  }
  await expectAccessible(page);
  const link = mailbox.linkIn(await mailbox.newestTo(admin.email ?? ''));
  await page.goto(link);
  await expectAccessible(page);
  await page.getByLabel('new password').fill('seven otters at the lathe');
  await page.getByRole('button', { name: 'keep it and go in' }).click();
  await expect(page).toHaveURL(/\/school/);
  expect(await mailbox.mailsTo('nobody@cedarfork.example')).toEqual([]);
});

test('an admin marks somebody as left, whose session ends, and brings them back', async ({
  page,
  browser,
}) => {
  const school = await makeSchool();
  const admin = await makePerson(school, ['admin'], { password: PASSWORD });
  const other = await makePerson(school, ['admin'], { familyName: 'Okonjo', password: PASSWORD });
  const account = { ...other, schoolCode: null, password: PASSWORD };
  const theirs = await (await browser.newContext()).newPage();
  await signIn(theirs, account);
  await signIn(page, { ...admin, schoolCode: null, password: PASSWORD });
  await page.getByRole('link', { name: 'people', exact: true }).click();
  await page.getByRole('link', { name: /^Okonjo/ }).click();
  await page.getByRole('button', { name: 'mark as left' }).click();
  await expect(page.getByRole('button', { name: 'bring back' })).toBeVisible();
  await theirs.goto('/school');
  await expect(theirs).toHaveURL(/\/sign-in/);
  await page.getByRole('button', { name: 'bring back' }).click();
  await expect(page.getByRole('button', { name: 'mark as left' })).toBeVisible();
  await signIn(theirs, account);
  await expect(theirs).toHaveURL(/\/school/);
  await theirs.context().close();
});

test('an admin gives a student first words, which are shown once and let the student in', async ({
  page,
  browser,
}) => {
  const school = await makeSchool();
  const admin = await makePerson(school, ['admin'], { password: PASSWORD });
  const student = await makePerson(school, ['student'], { familyName: 'Quispe' });
  await signIn(page, { ...admin, schoolCode: null, password: PASSWORD });
  await page.goto('/school/people?shown=students');
  await page.getByRole('link', { name: /^Quispe/ }).click();
  await page.getByRole('button', { name: 'give first words' }).click();
  const shown = page.getByRole('list', { name: 'the new words' });
  await expect(shown.getByRole('listitem')).toHaveCount(4);
  const words = (await shown.getByRole('listitem').allTextContents()).join(' ');
  await expectAccessible(page);
  await page.reload();
  await expect(shown).toHaveCount(0);
  const theirs = await (await browser.newContext()).newPage();
  await signIn(theirs, { ...student, schoolCode: school.code, password: words });
  await expect(theirs.getByRole('heading', { name: 'Your own words' })).toBeVisible();
  await theirs.context().close();
});

test('an admin adds a term and a department, and is told what is taken', async ({ page }) => {
  const school = await makeSchool();
  const admin = await makePerson(school, ['admin'], { password: PASSWORD });
  await signIn(page, { ...admin, schoolCode: null, password: PASSWORD });
  await page.goto('/school/terms');
  await page.getByRole('textbox', { name: 'name' }).fill('This term');
  await page.getByLabel('first day').fill('2027-01-11');
  await page.getByLabel('last day').fill('2027-06-04');
  await page.getByRole('button', { name: 'add the term' }).click();
  await expect(page.getByText('There is a term of this name already.')).toBeVisible();
  await expect(page.getByLabel('first day')).toHaveValue('2027-01-11');
  await page.getByRole('textbox', { name: 'name' }).fill('Spring 2027');
  await page.getByRole('button', { name: 'add the term' }).click();
  await expect(page.getByRole('row', { name: /Spring 2027/ })).toContainText('11 January 2027');
  await expectAccessible(page);
  await page.goto('/school/departments');
  await page.getByRole('textbox', { name: 'name' }).fill('Metal');
  await page.getByRole('button', { name: 'add the department' }).click();
  await expect(page.getByRole('row', { name: /Metal/ })).toBeVisible();
  await expectAccessible(page);
});
