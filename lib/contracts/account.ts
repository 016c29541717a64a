import { z } from 'zod';
import { ROLES } from '@/lib/auth/roles';

/** A link's secret: 256 bits as base64url. Anything of another shape cannot be one. */
const SECRET_PATTERN = /^[\w-]{43}$/;

/** A password as typed; the rules that depend on its owner are checked where the owner is known. */
const typedPassword = (label: string) =>
  z.string(`Type ${label}.`).min(1, `Type ${label}.`).max(1_024, 'This is too long.');

const CUT_LINK = 'Part of this link is missing. Copy all of it again, or ask for a new one.';

export const secret = z.string(CUT_LINK).regex(SECRET_PATTERN, CUT_LINK);

export const email = z
  .string('Type an email address.')
  .trim()
  .toLowerCase()
  .max(254, 'This email address is too long.')
  .pipe(
    z.email(
      'This is not an email address. It needs a name, an @ and a place, such as r.lindqvist@school.example.',
    ),
  );

export const personName = (label: string) =>
  z.string(`Type the ${label}.`).trim().min(1, `Type the ${label}.`).max(80, 'Use at most 80 characters.');

export const signInStaffInput = z.object({
  email: z
    .string('Type your email.')
    .trim()
    .toLowerCase()
    .min(1, 'Type your email.')
    .max(254, 'This is too long.'),
  password: typedPassword('your password'),
});

export const signInStudentInput = z.object({
  schoolCode: z
    .string('Type the code of your school.')
    .trim()
    .toLowerCase()
    .min(1, 'Type the code of your school.')
    .max(32, 'This is too long for a school code.'),
  localId: z.string('Type your ID.').trim().min(1, 'Type your ID.').max(40, 'This is too long for an ID.'),
  passphrase: typedPassword('your passphrase'),
});

export const linkInput = z.object({ secret });

export const newPasswordInput = z.object({ secret, password: typedPassword('a new password') });

export const askResetInput = z.object({ email });

export const changePasswordInput = z.object({
  current: typedPassword('the one you use now'),
  password: typedPassword('a new one'),
});

export const choosePassphraseInput = z.object({ password: typedPassword('a passphrase') });

export const switchRoleInput = z.object({ role: z.enum(ROLES, 'Choose a role.') });

export const resetPassphraseInput = z.object({ studentId: z.uuid() });

export const makePassphrasesInput = z.object({ sectionId: z.uuid() });
