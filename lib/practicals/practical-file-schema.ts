import { z } from 'zod';
import { cutListLineSchema, rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { PRACTICAL_FILE } from './practical-file';
import type { JsonPath } from './practical-file-json';
import { taskSchema } from './task';

/** The whole file; a name that it does not know is refused wherever it stands. */
export const practicalFileSchema = z.strictObject({
  trymark: z.literal(PRACTICAL_FILE.kind),
  version: z.literal(PRACTICAL_FILE.version),
  task: taskSchema,
  form: rubricFormSchema,
});

type Issue = z.core.$ZodIssue;

export interface FileIssue {
  path: JsonPath;
  reason: string;
  /** Whether the path names a key that is there but should not be. */
  isKey: boolean;
}

const KINDS: Record<string, string> = {
  string: 'A text in double quotes belongs here.',
  number: 'A number belongs here.',
  int: 'A whole number belongs here.',
  boolean: 'This is true or false, without quotes.',
  array: 'A list in brackets [ ] belongs here.',
  object: 'A group in braces { } belongs here.',
  record: 'A group in braces { } belongs here.',
};

/** What the schema refuses, each with its path and a reason in plain words; `value` is what was read. */
export function fileIssues(error: z.ZodError, value: unknown): FileIssue[] {
  const isLong = error.issues.some(
    ({ code, path }) => code === 'too_big' && path.join('.') === LINES.join('.'),
  );
  return [...error.issues, ...(isLong ? issuesOfLines(value) : [])].flatMap((issue) => {
    // The name is told where it stands, with the other names that JSON alone lets pass.
    if (issue.message === 'unknown key __proto__') return [];
    const path = issue.path.filter((key) => typeof key !== 'symbol');
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({
        path: [...path, key],
        reason: 'A practical file knows no such name in this place.',
        isKey: true,
      }));
    }
    const found = valueAt(value, path);
    if (found === undefined) {
      return [{ path, reason: `“${String(path.at(-1))}” is missing here.`, isKey: false }];
    }
    const reason = reasonOf(issue);
    const isKey = issue.code === 'invalid_key';
    const inside = issue.code === 'custom' && Array.isArray(found) ? placesIn(found, issue.message) : [];
    return inside.length > 0
      ? inside.map((more) => ({ path: [...path, ...more], reason, isKey }))
      : [{ path, reason, isKey }];
  });
}

const LINES = ['task', 'cutList', 'lines'];

/** The schema stops at a list that is too long; each line of it is looked at all the same. */
function issuesOfLines(value: unknown): Issue[] {
  const read = z.array(cutListLineSchema).safeParse(valueAt(value, LINES));
  return (read.error?.issues ?? []).map((issue) => ({ ...issue, path: [...LINES, ...issue.path] }));
}

function valueAt(value: unknown, path: JsonPath): unknown {
  return path.reduce<unknown>(
    (group, key) =>
      typeof group === 'object' && group !== null
        ? Object.getOwnPropertyDescriptor(group, key)?.value
        : undefined,
    value,
  );
}

/** Which of a list's entries break a rule that the schema holds the whole list to. */
function placesIn(list: readonly unknown[], message: string): JsonPath[] {
  const rule = LIST_RULES.find(({ about }) => message.includes(about));
  if (!rule) return [];
  const values = list.map((entry) => valueAt(entry, [rule.key]));
  return values.flatMap((value, index) =>
    rule.breaks(value, values.slice(0, index)) ? [[index, rule.key]] : [],
  );
}

type Breaks = (value: unknown, before: readonly unknown[]) => boolean;

const isFirst: Breaks = (_, before) => before.length === 0;
const isLess = (than: 'or the same' | 'alone'): Breaks => {
  return (value, before) => {
    const last = before.at(-1);
    if (typeof value !== 'number' || typeof last !== 'number') return false;
    return value < last || (than === 'or the same' && value === last);
  };
};
const isAgain: Breaks = (value, before) => before.includes(value);

const LIST_RULES: readonly { about: string; key: string; breaks: Breaks }[] = [
  { about: 'reaches further', key: 'within', breaks: isLess('or the same') },
  { about: 'loses no less than the one', key: 'lose', breaks: isLess('alone') },
  { about: 'the first band loses 0', key: 'lose', breaks: isFirst },
  { about: 'the first level loses 0', key: 'lose', breaks: isFirst },
  { about: 'have the same id', key: 'id', breaks: isAgain },
];

function reasonOf(issue: Issue): string {
  if (!/^(Invalid|Too |Unrecognized)/.test(issue.message)) return asSentence(issue.message);
  switch (issue.code) {
    case 'invalid_type':
      return KINDS[issue.expected] ?? 'Something else belongs here.';
    case 'invalid_value':
      return `Write ${oneOf(issue.values)} here.`;
    case 'invalid_union':
      return 'Write "higher", "latest" or "average" here.';
    case 'too_small':
      if (issue.origin === 'string') return 'This is empty.';
      return `This is ${issue.inclusive ? 'at least' : 'more than'} ${issue.minimum}.`;
    case 'too_big':
      return issue.origin === 'string'
        ? `Use at most ${issue.maximum} characters.`
        : `This is at most ${issue.maximum}.`;
    default:
      return 'Something else belongs here.';
  }
}

function oneOf(values: readonly z.core.util.Primitive[]): string {
  const written = values.map((value) => JSON.stringify(value));
  const last = written.pop() ?? '';
  return written.length > 0 ? `${written.join(', ')} or ${last}` : last;
}

function asSentence(message: string): string {
  return `${message.charAt(0).toUpperCase()}${message.slice(1)}${message.endsWith('.') ? '' : '.'}`;
}
