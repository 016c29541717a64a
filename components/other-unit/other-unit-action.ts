'use server';

import { cookies } from 'next/headers';
import { OTHER_UNIT_COOKIE } from './other-unit-cookie';

const A_YEAR_IN_SECONDS = 365 * 24 * 60 * 60;

/** Remembers on this device whether sizes are shown in the other unit too; it is nobody's record. */
export async function setOtherUnitAction(isOn: boolean): Promise<void> {
  const store = await cookies();
  store.set(OTHER_UNIT_COOKIE, isOn ? 'on' : 'off', {
    path: '/',
    maxAge: A_YEAR_IN_SECONDS,
    sameSite: 'lax',
    httpOnly: true,
  });
}
