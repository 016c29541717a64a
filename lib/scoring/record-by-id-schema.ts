import { z } from 'zod';

const ID = /^[a-z0-9][a-z0-9_-]{0,63}$/;
const notAnId = 'an id has 1 to 64 small letters, digits, - or _, and begins with a letter or a digit';
export const idSchema = z.string().regex(ID, notAnId);

/** A record by id. Zod passes over a key named __proto__; here it is an unknown key like any other. */
export function recordById<Value extends z.ZodType>(value: Value) {
  return z
    .unknown()
    .refine((input) => typeof input !== 'object' || input === null || !Object.hasOwn(input, '__proto__'), {
      message: 'unknown key __proto__',
      abort: true,
    })
    .pipe(
      z.record(idSchema, value, {
        error: ({ code }) => (code === 'invalid_key' ? `unknown key: ${notAnId}` : undefined),
      }),
    );
}
