import { expect, type Page } from 'playwright/test';

/** Somebody who can sign in: staff by email, students by school code and local ID. */
export interface Account {
  email: string | null;
  schoolCode: string | null;
  localId: string | null;
  password: string;
}

/** Signs in by the page that everybody uses, and waits until the person has arrived. */
export async function signIn(page: Page, account: Account): Promise<void> {
  await page.goto('/sign-in');
  const fill = (name: string, text: string | null) => page.locator(`input[name="${name}"]`).fill(text ?? '');
  if (account.email) {
    await fill('email', account.email);
    await fill('password', account.password);
  } else {
    await page.getByText('student', { exact: true }).click();
    await fill('schoolCode', account.schoolCode);
    await fill('localId', account.localId);
    await fill('passphrase', account.password);
  }
  await page.getByRole('button', { name: 'sign in' }).click();
  await expect(page).not.toHaveURL(/\/sign-in/);
}
