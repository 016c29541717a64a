import { z } from 'zod';
import { MAX_ID_LENGTH, MAX_NAME_LENGTH } from '@/lib/csv/read-roster';
import { ROSTER_COLUMNS } from '@/lib/csv/roster-columns';

/** A form leaves out, or sends empty, what was not filled in. */
const orNothing = <T extends z.ZodType>(schema: T) =>
  z.preprocess((value) => (value === '' || value === undefined ? null : value), schema.nullable());

const written = (what: string, most: number) =>
  z.string(`Type ${what}.`).trim().min(1, `Type ${what}.`).max(most, `Use at most ${most} characters.`);

const day = (message: string) => z.string(message).pipe(z.iso.date(message));

export const sectionInput = z.strictObject({ sectionId: z.uuid('This address is not complete.') });

export const NEW_TERM = 'new';

/** A new section. Its term is one of the school's, or `new` with a name and two days. */
export const createSectionInput = z
  .object({
    name: written('a name, such as Woods 2', 80),
    period: written('the period, such as 3', 20),
    departmentId: z.uuid('Choose a department.'),
    termId: z.union([z.literal(NEW_TERM), z.uuid()], 'Choose a term.'),
    termName: orNothing(z.string().trim().max(60, 'Use at most 60 characters.')),
    startsOn: orNothing(day('Choose the first day.')),
    endsOn: orNothing(day('Choose the last day.')),
  })
  .superRefine((input, context) => {
    if (input.termId !== NEW_TERM) return;
    const refuse = (path: string, message: string) =>
      context.addIssue({ code: 'custom', path: [path], message });
    if (!input.termName) refuse('termName', 'Type a name for the term.');
    if (!input.startsOn) refuse('startsOn', 'Choose the first day.');
    if (!input.endsOn) refuse('endsOn', 'Choose the last day.');
    if (input.startsOn && input.endsOn && input.startsOn >= input.endsOn) {
      refuse('endsOn', 'The last day must come after the first.');
    }
  });

export const addStudentInput = z
  .object({
    sectionId: z.uuid(),
    localId: z.string().trim().max(MAX_ID_LENGTH, `Use at most ${MAX_ID_LENGTH} characters.`).default(''),
    familyName: z
      .string()
      .trim()
      .max(MAX_NAME_LENGTH, `Use at most ${MAX_NAME_LENGTH} characters.`)
      .default(''),
    givenName: z
      .string()
      .trim()
      .max(MAX_NAME_LENGTH, `Use at most ${MAX_NAME_LENGTH} characters.`)
      .default(''),
  })
  .refine(({ familyName, givenName }) => familyName !== '' || givenName !== '', {
    path: ['familyName'],
    message: 'Type a name.',
  });

export const moveStudentInput = z.object({
  sectionId: z.uuid(),
  studentId: z.uuid(),
  /** The first day without them. */
  leftOn: day('Choose the day they left.'),
});

export const bringBackInput = z.object({ sectionId: z.uuid(), studentId: z.uuid() });

const MAX_TEXT = 300_000;

const rosterText = z.strictObject({
  kind: z.enum(['names', 'csv']),
  text: z
    .string('Paste names, or choose a file.')
    .max(MAX_TEXT, 'This is far more than a roster. Paste the names of one section.'),
  layout: z
    .strictObject({
      header: z.boolean(),
      columns: z
        .array(z.enum(ROSTER_COLUMNS))
        .min(1)
        .max(60, 'These are more than 60 columns. Keep the ID and the names.'),
    })
    .optional(),
});

export const previewRosterInput = z.strictObject({ sectionId: z.uuid(), roster: rosterText });

/** What a teacher chose where a row and the school's records say different things. */
export const ROSTER_CHOICES = ['keep', 'rename', 'add', 'renumber', 'skip'] as const;

export type RosterChoice = (typeof ROSTER_CHOICES)[number];

export const importRosterInput = z.strictObject({
  sectionId: z.uuid(),
  roster: rosterText,
  /** By line of the text. */
  choices: z.record(z.string().regex(/^\d{1,6}$/), z.enum(ROSTER_CHOICES)),
  /** Go on without the rows that cannot be used. */
  leaveOutProblems: z.boolean(),
  /** The mark of the preview that this answers: what changed since is looked at again. */
  seen: z.string().regex(/^[0-9a-f]{64}$/),
});
