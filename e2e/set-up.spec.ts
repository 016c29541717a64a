import { hashSecret, makeSecret } from '@/lib/auth/secret-links';
import { ownerSql } from '@/tests/support/database';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

async function makeSetupLink(): Promise<string> {
  const secret = makeSecret();
  const expires_at = new Date(Date.now() + 3_600_000);
  const sql = ownerSql();
  await sql`insert into setup_tokens ${sql({ secret_hash: hashSecret(secret), expires_at })}`;
  return `/set-up/${secret}`;
}

test('a one-time link makes a school with its first admin, keeps what was typed when refused, and works once', async ({
  page,
}) => {
  const link = await makeSetupLink();
  const tag = Date.now().toString(36);
  await page.goto(link);
  await expect(page.getByRole('heading', { name: 'Set up your school' })).toBeVisible();
  await expectAccessible(page);

  await page.getByLabel('name', { exact: true }).fill(`Birch Hollow High School ${tag}`);
  await expect(page.getByLabel('code')).toHaveValue(`birch-hollow-${tag}`);
  await page.getByLabel('time zone').selectOption('America/Chicago');
  await page.getByText('millimetres').click();
  await page.getByLabel('given name').fill('Ada');
  await page.getByLabel('family name').fill('Whitehorse');
  await page.getByLabel('email').fill(`ada.${tag}@birchhollow.example`);
  await page.getByLabel('password').fill('Birch Hollow High');
  await page.getByLabel('I teach').uncheck();
  await page.getByRole('button', { name: 'make the school' }).click();

  await expect(page.getByText('Half of this or more is a name')).toBeVisible();
  await expect(page.getByLabel('name', { exact: true })).toHaveValue(`Birch Hollow High School ${tag}`);
  await expect(page.getByLabel('email')).toHaveValue(`ada.${tag}@birchhollow.example`);
  await expect(page.getByRole('radio', { name: 'millimetres' })).toBeChecked();
  await expect(page.getByLabel('I teach')).not.toBeChecked();

  await page.getByLabel('password').fill('seven otters at the lathe');
  await page.getByRole('button', { name: 'make the school' }).click();
  await expect(page).toHaveURL(/\/school$/);
  await expect(page.getByRole('heading', { name: `Birch Hollow High School ${tag}` })).toBeVisible();
  await expect(page.getByText('Nobody teaches here yet.')).toBeVisible();
  await expectAccessible(page);

  await page.goto(link);
  await expect(page.getByText('This link has been used or replaced')).toBeVisible();
});

test('the set-up page points to each field that is left empty', async ({ page }) => {
  await page.goto(await makeSetupLink());
  await page.getByRole('button', { name: 'make the school' }).click();
  await expect(page.getByText('Type the name of the school.')).toBeVisible();
  await expect(page.getByText('Type the given name.')).toBeVisible();
  await expect(page.getByText('Type an email address.')).toBeVisible();
});
