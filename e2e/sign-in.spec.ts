import { makePerson, makeSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';
const WORDS = 'quarry biplane teapot gravel';

test('staff sign in, change their password, sign out, and the old password no longer works', async ({
  page,
}) => {
  const school = await makeSchool();
  const admin = await makePerson(school, ['admin'], { password: PASSWORD });
  await page.goto('/sign-in');
  await expectAccessible(page);
  await signIn(page, { ...admin, schoolCode: null, password: PASSWORD });
  await expect(page.getByRole('heading', { name: school.name })).toBeVisible();

  await page.goto('/account');
  await expectAccessible(page);
  await page.getByLabel('password you use now').fill(PASSWORD);
  await page.getByLabel('new password').fill('seven otters at the lathe');
  await page.getByRole('button', { name: 'change the password' }).click();
  await expect(page.getByText('Your password is changed.')).toBeVisible();

  await page.getByRole('main').getByRole('button', { name: 'sign out' }).click();
  await expect(page).toHaveURL(/\/sign-in/);
  await expect(page.getByText(school.name)).toBeVisible();
  await page.goto('/school');
  await expect(page).toHaveURL(/\/sign-in/);
  await page.getByLabel('email').fill(admin.email ?? '');
  await page.locator('input[name="password"]').fill(PASSWORD);
  await page.getByRole('button', { name: 'sign in' }).click();
  await expect(page.getByText('This email and password do not belong together.')).toBeVisible();
  await expect(page.getByLabel('email')).toHaveValue(admin.email ?? '');
});

test('each sign-in gets a session of its own, and the cookie is kept from scripts', async ({
  page,
  context,
}) => {
  const school = await makeSchool();
  const admin = await makePerson(school, ['admin'], { password: PASSWORD });
  const account = { ...admin, schoolCode: null, password: PASSWORD };
  const cookie = async () => (await context.cookies()).find(({ name }) => name === '__Host-trymark');
  await signIn(page, account);
  const first = await cookie();
  expect(first).toMatchObject({ httpOnly: true, secure: true, sameSite: 'Lax', path: '/' });
  await page
    .getByRole('button', { name: /menu|Rut/ })
    .first()
    .click();
  await page.getByRole('button', { name: 'sign out' }).click();
  await expect(page).toHaveURL(/\/sign-in/);
  await signIn(page, account);
  expect((await cookie())?.value).not.toBe(first?.value);
});

test('a student comes in with the words of the slip, keeps new ones, and signs in with those', async ({
  page,
}) => {
  await page.setViewportSize({ width: 390, height: 844 });
  const school = await makeSchool();
  const student = await makePerson(school, ['student'], {
    givenName: 'Wayra',
    password: WORDS,
    mustChange: true,
  });
  await page.goto(`/sign-in?school=${school.code}`);
  await expect(page.getByLabel('school code')).toHaveValue(school.code);
  await expectAccessible(page);
  await page.getByLabel('your ID').fill(student.localId ?? '');
  await page.getByLabel('passphrase').fill('Quarry-Biplane Teapot gravel');
  await page.getByRole('button', { name: 'sign in' }).click();

  await expect(page.getByRole('heading', { name: 'Your own words' })).toBeVisible();
  await expectAccessible(page);
  const offered = page.getByRole('list', { name: 'your new words' });
  const first = (await offered.textContent()) ?? '';
  await page.getByRole('button', { name: 'other words' }).click();
  await expect(offered).not.toHaveText(first);
  const words = (await offered.getByRole('listitem').allInnerTexts()).join(' ');
  await page.goto('/my');
  await expect(page).toHaveURL(/new-passphrase/);
  await page.getByText('my own').click();
  await page.getByLabel('your own words').fill(words);
  await page.getByRole('button', { name: 'keep them' }).click();
  await expect(page).toHaveURL(/\/my/);

  await page.context().clearCookies();
  await signIn(page, { email: null, schoolCode: school.code, localId: student.localId, password: words });
  await expect(page).toHaveURL(/\/my/);
});

test('a person with several roles switches between them, also where a sheet belongs to another role', async ({
  page,
}) => {
  const school = await makeSchool();
  const both = await makePerson(school, ['aide', 'admin'], { password: PASSWORD });
  await signIn(page, { ...both, schoolCode: null, password: PASSWORD });
  await expect(page).toHaveURL(/\/school$/);
  await page.getByRole('button', { name: /^Rut/ }).click();
  await page.getByRole('button', { name: 'aide' }).click();
  await expect(page).toHaveURL(/\/round$/);
  await page.goto('/school/people');
  await expect(page.getByRole('heading', { name: 'Another of your roles' })).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'admin' }).click();
  await expect(page).toHaveURL(/\/school$/);
  await expect(page.getByRole('heading', { name: school.name })).toBeVisible();
});

test('wrong tries are slowed down, and the page says for how long', async ({ page }) => {
  const school = await makeSchool();
  const { email } = await makePerson(school, ['admin'], { password: PASSWORD });
  await page.goto('/sign-in');
  await page.getByLabel('email').fill(email ?? '');
  const attempt = async (text: RegExp) => {
    await page.locator('input[name="password"]').fill('not the right password');
    await page.getByRole('button', { name: 'sign in' }).click();
    await expect(page.getByText(text)).toBeVisible();
  };
  for (let slip = 1; slip <= 3; slip += 1) {
    const answered = page.waitForResponse((response) => response.request().method() === 'POST');
    await attempt(/do not belong together\.$/);
    await answered;
  }
  await attempt(/You can try again in 5 seconds/);
  await attempt(/Too many tries\. Wait \d seconds?, then try again/);
});
