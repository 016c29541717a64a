import type { RubricForm } from '@/lib/scoring/rubric-form';
import type { Task } from './task';

/** What the file says it is, and the version of its format that this product writes. */
export const PRACTICAL_FILE = { kind: 'practical', version: 1 } as const;

/** Far more than a cut list of 200 lines with prices of its own on each. */
export const MAX_PRACTICAL_FILE_BYTES = 1_000_000;

/** Every key of the format in the order it is written in, wherever it stands. */
const KEYS = [
  ...['trymark', 'version', 'task', 'form', 'format', 'id', 'title', 'label', 'unit', 'quantity'],
  ...['instructions', 'material', 'blank', 'kerf', 'cutList', 'lines', 'lineNotes', 'target'],
  ...['basis', 'start', 'outOf', 'floor', 'roundTo', 'readTo', 'margin', 'grossLimit', 'ceiling', 'presets'],
  ...['defaults', 'exceptions', 'workChecks', 'policies', 'worth', 'missing', 'sizes'],
  ...['thickness', 'width', 'length', 'over', 'beyondOver', 'under', 'beyondUnder', 'cap', 'within', 'lose'],
  ...['checks', 'levels', 'assume', 'swap', 'set', 'late', 'perDay', 'max', 'redo', 'kind', 'capPercent'],
  ...['prediction', 'agreeWithin', 'agreeShare', 'caughtShare', 'valueShare', 'num', 'den'],
  ...['full', 'closeWithin', 'close'],
];

/**
 * A practical with its rubric as the text of one file: lengths in ticks, points in hundredths, keys in a fixed order,
 * notes and exceptions in cut-list order, a line end at the last line. The same practical always gives the same bytes.
 * What belongs to a line that the cut list does not have is without effect and is not written. Pure; never fails.
 *
 * @example writePracticalFile(task, form).startsWith('{\n  "trymark": "practical",\n  "version": 1,') // true
 */
export function writePracticalFile(task: Task, form: RubricForm): string {
  const ids = task.cutList.lines.map(({ id }) => id);
  const content = {
    trymark: PRACTICAL_FILE.kind,
    version: PRACTICAL_FILE.version,
    task: { ...task, lineNotes: onlyOf(ids, task.lineNotes) },
    form: { ...form, exceptions: onlyOf(ids, form.exceptions) },
  };
  return `${JSON.stringify(content, [...KEYS, ...ids], 2)}\n`;
}

function onlyOf<T>(ids: readonly string[], record: Record<string, T>): Record<string, T> {
  return Object.fromEntries(Object.entries(record).filter(([id]) => ids.includes(id)));
}

/**
 * The name of a practical's file: its title in letters a to z, digits and hyphens, then the version or "draft".
 *
 * @example practicalFileName('Bench-hook kit', 2) // 'bench-hook-kit-version-2.practical.json'
 */
export function practicalFileName(title: string, version: number | null): string {
  const plain = title
    .normalize('NFKD')
    .replaceAll(/\p{M}/gu, '')
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, '-')
    .slice(0, 60)
    .replaceAll(/^-|-$/g, '');
  const state = version === null ? 'draft' : `version-${version}`;
  return `${plain || 'practical'}-${state}.practical.json`;
}
