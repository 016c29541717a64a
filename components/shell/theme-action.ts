'use server';

import { cookies } from 'next/headers';
import { parseTheme, THEME_COOKIE } from './theme';

const A_YEAR_IN_SECONDS = 365 * 24 * 60 * 60;

/** Remembers on this device how the sheet is lit; it is nobody's record, so nobody needs to be signed in. */
export async function setThemeAction(value: string): Promise<void> {
  const store = await cookies();
  store.set(THEME_COOKIE, parseTheme(value), {
    path: '/',
    maxAge: A_YEAR_IN_SECONDS,
    sameSite: 'lax',
    httpOnly: true,
  });
}
