import 'server-only';
import { cookies } from 'next/headers';
import { OTHER_UNIT_COOKIE, parseOtherUnit } from './other-unit-cookie';

/** Whether this device shows sizes in the other unit too. */
export async function readOtherUnit(): Promise<boolean> {
  return parseOtherUnit((await cookies()).get(OTHER_UNIT_COOKIE)?.value);
}
