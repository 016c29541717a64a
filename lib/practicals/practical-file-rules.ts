import { z } from 'zod';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { draftOf } from './draft-of';
import { parseDraft } from './parse-draft';
import type { JsonPath } from './practical-file-json';
import type { FileIssue } from './practical-file-schema';
import type { Task } from './task';

const loosely = z.looseObject({
  task: z.looseObject({
    unit: z.unknown().optional(),
    lineNotes: z.record(z.string(), z.unknown()).catch({}),
    cutList: z.looseObject({ lines: z.array(z.looseObject({ id: z.string() })) }),
  }),
  form: z.looseObject({
    unit: z.unknown().optional(),
    exceptions: z.record(z.string(), z.unknown()).catch({}),
  }),
});

const UNITS: Record<string, string> = { in: 'inches', mm: 'millimetres' };

/** What must agree between parts of a file: one unit for task and prices, notes and exceptions of lines that it has. */
export function agreementIssues(value: unknown): FileIssue[] {
  const read = loosely.safeParse(value);
  if (!read.success) return [];
  const { task, form } = read.data;
  const ids = new Set(task.cutList.lines.map(({ id }) => id));
  const stray = (record: object, at: JsonPath) =>
    Object.keys(record)
      .filter((id) => !ids.has(id))
      .map((id) => ({ path: [...at, id], reason: `The cut list has no line “${id}”.`, isKey: true }));
  return [
    ...unitIssues(UNITS[String(task.unit)], UNITS[String(form.unit)]),
    ...stray(task.lineNotes, ['task', 'lineNotes']),
    ...stray(form.exceptions, ['form', 'exceptions']),
  ];
}

function unitIssues(ofTask: string | undefined, ofForm: string | undefined): FileIssue[] {
  if (!ofTask || !ofForm || ofTask === ofForm) return [];
  const reason = `The task is in ${ofTask}, its prices in ${ofForm}. Both are in one unit.`;
  return [{ path: ['form', 'unit'], reason, isKey: false }];
}

/**
 * Where the editor could not keep a word or figure exactly as the file has it, by the rules of the editor's own fields.
 * Empty when a draft of it reads back as the very same task and form.
 */
export function keepingIssues(authored: { task: Task; form: RubricForm }): FileIssue[] {
  const read = parseDraft(draftOf(authored.task, authored.form));
  if (read.ok) return differences(authored, { task: read.task, form: read.form }, []);
  return Object.entries(read.errors).flatMap(([path, reasons]) =>
    reasons.map((reason) => ({ path: filePathOf(path, authored.task), reason, isKey: false })),
  );
}

/** Where a field of the draft stands in the file. */
export function filePathOf(draftPath: string, task: Task): JsonPath {
  const [first = '', ...rest] = draftPath.split('.').map((key) => (/^\d+$/.test(key) ? Number(key) : key));
  switch (first) {
    case '':
      return [];
    case 'title':
    case 'unit':
    case 'instructions':
    case 'material':
    case 'kerf':
    case 'blank':
      return ['task', first, ...rest];
    case 'lines':
      return linePath(rest, task);
    case 'all':
      return ['form', 'defaults', ...ruleKeys(rest)];
    case 'workChecks':
      return ['form', 'workChecks', ...rest];
    case 'total':
    case 'reading':
      return ['form', ...rest];
    default:
      return ['form', 'policies', first, ...rest];
  }
}

const AXIS_KEYS: unknown[] = ['thickness', 'width', 'length'];

function linePath([index, ...rest]: JsonPath, task: Task): JsonPath {
  const [key] = rest;
  if (index === undefined) return ['task', 'cutList', 'lines'];
  const line = ['task', 'cutList', 'lines', index];
  if (key === undefined) return line;
  if (key === 'label' || key === 'quantity') return [...line, key];
  if (AXIS_KEYS.includes(key)) return [...line, 'target', key];
  const id = task.cutList.lines[Number(index)]?.id ?? '';
  return key === 'note' ? ['task', 'lineNotes', id] : ['form', 'exceptions', id, ...ruleKeys(rest)];
}

/** A draft has `over.bands.1` and `over.beyond` where the file has `over[1]` and `beyondOver`. */
function ruleKeys(path: JsonPath): JsonPath {
  if (path[0] !== 'sizes') return path;
  const [sizes, axis, side, what, ...rest] = path;
  const known = (keys: (string | number | undefined)[]) => keys.filter((key) => key !== undefined);
  if (what === 'beyond') return known([sizes, axis, side === 'over' ? 'beyondOver' : 'beyondUnder']);
  return known(what === 'bands' ? [sizes, axis, side, ...rest] : [sizes, axis, side, what, ...rest]);
}

/** Every place at which what would be kept is not what the file says. */
function differences(given: unknown, kept: unknown, path: JsonPath): FileIssue[] {
  if (isGroup(given) && isGroup(kept)) {
    const keys = [...new Set([...Object.keys(given), ...Object.keys(kept)])];
    return keys.flatMap((key) => {
      const step = Array.isArray(given) ? Number(key) : key;
      return differences(valueAt(given, key), valueAt(kept, key), [...path, step]);
    });
  }
  if (given === kept) return [];
  if (kept === undefined) {
    return [{ path, reason: 'This says nothing that would be kept. Take it out.', isKey: true }];
  }
  return [{ path, reason: `This would be kept as ${JSON.stringify(kept)}. Write it so.`, isKey: false }];
}

function isGroup(value: unknown): value is object {
  return typeof value === 'object' && value !== null;
}

function valueAt(group: object, key: string): unknown {
  return Object.getOwnPropertyDescriptor(group, key)?.value;
}
