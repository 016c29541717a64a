import { z } from 'zod';
import type { ROLES } from '@/lib/auth/roles';
import { email, personName, secret } from './account';

const label = (what: string, max: number) =>
  z.string(`Type ${what}.`).trim().min(1, `Type ${what}.`).max(max, `Use at most ${max} characters.`);

const day = (what: string) =>
  z.string(`Choose ${what}.`).pipe(z.iso.date(`Choose ${what}, as year, month and day.`));

const ticked = z.preprocess((value) => value === true || value === 'on', z.boolean());

export const timeZone = z
  .string('Choose a time zone.')
  .refine(isTimeZone, 'Choose a time zone from the list, such as America/Chicago.');

export const unit = z.enum(['in', 'mm'], 'Choose inches or millimetres.');

function isTimeZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone.length > 0;
  } catch {
    return false;
  }
}

const GENERIC = new Set([
  'the',
  'of',
  'and',
  'high',
  'middle',
  'secondary',
  'public',
  'school',
  'college',
  'academy',
]);

/** A code for a school out of its name: `Cedar Fork High School` gives `cedar-fork`. Empty when nothing is left. */
export function proposeSchoolCode(name: string): string {
  const words = name
    .normalize('NFKD')
    .replaceAll(/\p{M}/gu, '')
    .toLowerCase()
    .split(/[^a-z0-9]+/)
    .filter(Boolean);
  const telling = words.filter((word) => !GENERIC.has(word));
  const code = (telling.join('-').length >= 3 ? telling : words).join('-').slice(0, 32).replace(/-+$/, '');
  return code.length >= 3 ? code : '';
}

/** The half year that a day lies in, as a first term: name and both days. */
export function proposeTerm(today: string): { name: string; startsOn: string; endsOn: string } {
  const year = today.slice(0, 4);
  return Number(today.slice(5, 7)) <= 6
    ? { name: `Spring ${year}`, startsOn: `${year}-01-01`, endsOn: `${year}-06-30` }
    : { name: `Fall ${year}`, startsOn: `${year}-07-01`, endsOn: `${year}-12-31` };
}

const termFields = {
  termName: label('a name for the term', 60),
  startsOn: day('the first day'),
  endsOn: day('the last day'),
};

// Days that are none have a message of their own already.
const inOrder = ({ startsOn, endsOn }: { startsOn: string; endsOn: string }) =>
  ![startsOn, endsOn].every((text) => z.iso.date().safeParse(text).success) || startsOn < endsOn;
const OUT_OF_ORDER = { path: ['endsOn'], message: 'The last day must come after the first.' };

export const setUpSchoolInput = z
  .object({
    secret,
    schoolName: label('the name of the school', 120),
    schoolCode: z
      .string('Type a code for the school.')
      .trim()
      .toLowerCase()
      .regex(
        /^[a-z0-9][a-z0-9-]{2,31}$/,
        'Use 3 to 32 letters a to z, digits and hyphens, beginning with a letter or digit.',
      ),
    timeZone,
    unit,
    departmentName: label('the name of the department', 120),
    ...termFields,
    givenName: personName('given name'),
    familyName: personName('family name'),
    email,
    password: z.string('Type a password.').min(1, 'Type a password.').max(1_024, 'This is too long.'),
    teaches: ticked,
    leads: ticked,
  })
  .refine(inOrder, OUT_OF_ORDER);

export const changeSchoolInput = z.object({ name: label('the name of the school', 120), timeZone, unit });

export const addDepartmentInput = z.object({ name: label('the name of the department', 120) });
export const renameDepartmentInput = addDepartmentInput.extend({ departmentId: z.uuid() });

export const addTermInput = z.object(termFields).refine(inOrder, OUT_OF_ORDER);
export const changeTermInput = z.object({ termId: z.uuid(), ...termFields }).refine(inOrder, OUT_OF_ORDER);

/** Roles that come by invitation; students come by a section's roster. */
export const STAFF_ROLES = [
  'teacher',
  'head',
  'aide',
  'admin',
] as const satisfies readonly (typeof ROLES)[number][];

const roleFields = {
  roles: z
    .array(z.enum(STAFF_ROLES, 'Choose roles from the list.'), 'Choose at least one role.')
    .min(1, 'Choose at least one role.'),
  departmentId: z.uuid('Choose a department from the list.').nullish(),
};

const hasDepartment = (person: { roles: string[]; departmentId?: string | null }) =>
  Boolean(person.departmentId) || !person.roles.some((role) => role === 'teacher' || role === 'head');
const NO_DEPARTMENT = {
  path: ['departmentId'],
  message: 'Choose the department that this person teaches in or leads.',
};

export const invitePersonInput = z
  .object({
    givenName: personName('given name'),
    familyName: personName('family name'),
    email,
    ...roleFields,
  })
  .refine(hasDepartment, NO_DEPARTMENT);

export const changeRolesInput = z
  .object({ personId: z.uuid(), ...roleFields })
  .refine(hasDepartment, NO_DEPARTMENT);

export const personInput = z.object({ personId: z.uuid() });

export const PEOPLE_SHOWN = ['staff', 'students', 'left'] as const;

export const listPeopleInput = z.object({
  shown: z.enum(PEOPLE_SHOWN).default('staff'),
  search: z.string().trim().max(80).default(''),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
});

export const readLogInput = z
  .object({
    from: z.iso.date('Choose a day.').optional(),
    to: z.iso.date('Choose a day.').optional(),
    action: z.string().trim().max(60).optional(),
    actorId: z.uuid().optional(),
    aboutPersonId: z.uuid().optional(),
    page: z.coerce.number().int().min(1).max(100_000).default(1),
  })
  .refine(({ from, to }) => !from || !to || from <= to, {
    path: ['to'],
    message: 'The last day comes before the first.',
  });
