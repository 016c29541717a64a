import type { PracticalDraft } from './draft';

/** The sheets of the editor, and which part of a draft is written on each. */
export type EditorStep = 'task' | 'prices' | 'rules';

const RULES = ['total', 'reading', 'late', 'redo', 'prediction', 'workChecks'];
const TASK = ['title', 'unit', 'instructions', 'material', 'blank', 'kerf'];

export function stepOfPath(path: string): EditorStep {
  const [first = ''] = path.split('.');
  if (TASK.includes(first)) return 'task';
  return RULES.includes(first) ? 'rules' : 'prices';
}

const NAMES: Record<string, string> = {
  material: 'wood',
  blank: 'blank',
  all: 'all lines',
  workChecks: 'check of the whole work',
  total: 'the total',
  reading: 'reading',
  late: 'late',
  redo: 'redo',
  prediction: 'prediction',
  sizes: '',
  bands: '',
  levels: 'level',
  checks: 'check',
  quantity: 'pieces',
  label: 'name',
  within: 'within',
  lose: 'points',
  beyond: 'past the last band',
  cap: 'most that a size loses',
  outOf: 'scaled to',
  start: 'starting score',
  roundTo: 'rounded to',
  ceiling: 'bonus counts up to',
  readTo: 'deviations rounded to',
  margin: 'reading margin',
  grossLimit: 'gross limit',
  perDay: 'a day',
  max: 'at most',
  kind: 'which counts',
  capPercent: 'counts up to',
  agreeWithin: 'agrees within',
  agreeShare: 'sizes that must agree',
  caughtShare: 'off-band sizes caught',
  valueShare: 'sizes read by number',
  full: 'bonus',
  closeWithin: 'totals close within',
  close: 'bonus for close totals',
  basis: 'counted',
  set: 'pieces of a line',
  swap: 'thickness and width may change places',
  assume: 'taken as',
  lines: 'cut list',
};

/** A field of a draft by a name that a person finds it under: `lines.1.width` is "line 2, width". */
export function fieldName(path: string): string {
  if (path === '') return 'the practical';
  const keys = path.split('.');
  const words: string[] = [];
  keys.forEach((key, index) => {
    if (/^\d+$/.test(key)) {
      const before = keys[index - 1] ?? '';
      const of = before === 'lines' ? 'line' : before === 'bands' ? 'band' : (NAMES[before] ?? before);
      words[words.length - (before === 'bands' ? 0 : 1)] = `${of} ${Number(key) + 1}`;
    } else {
      words.push(NAMES[key] ?? key);
    }
  });
  return words.filter((word) => word !== '').join(', ');
}

export interface DraftDifference {
  path: string;
  name: string;
  here: string;
  there: string;
}

/** Every field that is typed otherwise in two drafts of one practical; null and empty lists as an empty text. */
export function draftDifferences(here: PracticalDraft, there: PracticalDraft): DraftDifference[] {
  const [a, b] = [flatten(here), flatten(there)];
  const paths = [...new Set([...a.keys(), ...b.keys()])].filter((path) => !path.endsWith('.id'));
  return paths
    .filter((path) => (a.get(path) ?? '') !== (b.get(path) ?? ''))
    .map((path) => ({ path, name: fieldName(path), here: a.get(path) ?? '', there: b.get(path) ?? '' }));
}

function flatten(value: unknown, path = '', into = new Map<string, string>()): Map<string, string> {
  if (typeof value === 'object' && value !== null) {
    for (const [key, each] of Object.entries(value)) flatten(each, path ? `${path}.${key}` : key, into);
  } else {
    into.set(path, value === null ? '' : typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value));
  }
  return into;
}
