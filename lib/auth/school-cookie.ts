import 'server-only';
import { cookies } from 'next/headers';
import { z } from 'zod';

const COOKIE = '__Host-trymark-school';
const YEAR_S = 365 * 24 * 3_600;

const rememberedSchool = z.object({ code: z.string(), name: z.string() });

export type RememberedSchool = z.output<typeof rememberedSchool>;

/** Keeps on this device which school it is used at, so that nobody has to type its code again. */
export async function rememberSchool(school: RememberedSchool): Promise<void> {
  const text = JSON.stringify({ code: school.code, name: school.name });
  (await cookies()).set(COOKIE, text, {
    httpOnly: true,
    secure: true,
    sameSite: 'lax',
    path: '/',
    maxAge: YEAR_S,
  });
}

export async function recallSchool(): Promise<RememberedSchool | null> {
  const text = (await cookies()).get(COOKIE)?.value ?? '';
  try {
    return rememberedSchool.parse(JSON.parse(text));
  } catch {
    return null;
  }
}
