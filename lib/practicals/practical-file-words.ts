import type { JsonPath } from './practical-file-json';

/** `form.defaults.sizes.length.over[1].within`, as programs name a place. */
export function jsonPathText(path: JsonPath): string {
  return path.reduce<string>((text, key) => {
    if (typeof key === 'number') return `${text}[${key}]`;
    if (!/^[a-z_][a-z0-9_]*$/i.test(key)) return `${text}[${JSON.stringify(key)}]`;
    return text === '' ? key : `${text}.${key}`;
  }, '');
}

const HEADS: Record<string, string> = {
  '': 'the file',
  task: 'the task',
  form: 'prices and rules',
  'task.cutList': 'cut list',
  'task.cutList.lines': 'cut list',
  'task.lineNotes': 'notes of the lines',
  'form.defaults': 'all lines',
  'form.defaults.sizes': 'all lines, prices',
  'form.exceptions': 'exceptions',
  'form.policies': 'late, redo and prediction',
  'form.format': 'format of the rubric',
  'form.late': 'late work',
};

const NAMES: Record<string, string> = {
  trymark: 'what the file is',
  version: 'version of the format',
  quantity: 'pieces',
  label: 'name',
  material: 'wood',
  target: 'size',
  basis: 'how points are counted',
  start: 'starting score',
  outOf: 'scaled to',
  roundTo: 'rounded to',
  readTo: 'deviations rounded to',
  margin: 'reading margin',
  grossLimit: 'gross limit',
  ceiling: 'bonus counts up to',
  workChecks: 'checks of the whole work',
  missing: 'a missing piece',
  beyondOver: 'past the last band over',
  beyondUnder: 'past the last band under',
  cap: 'most that a size loses',
  lose: 'points',
  assume: 'taken as',
  swap: 'thickness and width may change places',
  set: 'pieces of a line',
  late: 'late work',
  perDay: 'a day',
  max: 'at most',
  kind: 'which counts',
  capPercent: 'counts up to',
  agreeWithin: 'agrees within',
  agreeShare: 'sizes that must agree',
  caughtShare: 'off-band sizes caught',
  valueShare: 'sizes read by number',
  num: 'numerator',
  den: 'denominator',
  full: 'bonus',
  closeWithin: 'totals close within',
  close: 'bonus for close totals',
};

const ONE_OF: Record<string, string> = {
  lines: 'line',
  over: 'over, band',
  under: 'under, band',
  checks: 'check',
  workChecks: 'check of the whole work',
  levels: 'level',
  presets: 'preset',
};

/** Groups that only hold others: what stands in them is named without them. */
const SILENT = ['task', 'form', 'cutList', 'policies', 'target', 'sizes'];

/** A place of a practical file as a person would say it: "all lines, price of length, over, band 2, within". */
export function placeInWords(
  path: JsonPath,
  labelOf: (lineId: string) => string | null = () => null,
): string {
  const whole = HEADS[path.join('.')];
  if (whole !== undefined) return whole;
  const words = path.flatMap((key, index) => wordsOf(key, index, path, labelOf));
  return words.length > 0 ? words.join(', ') : 'the file';
}

function wordsOf(
  key: string | number,
  index: number,
  path: JsonPath,
  labelOf: (lineId: string) => string | null,
): string[] {
  const before = path[index - 1];
  if (typeof key === 'number') return [`${ONE_OF[String(before)] ?? String(before)} ${key + 1}`];
  if (before === 'lineNotes') return [`note of ${labelOf(key) ?? key}`];
  if (before === 'exceptions') return [`exception of ${labelOf(key) ?? key}`];
  if (before === 'sizes') return [`price of ${key}`];
  if (key === 'defaults') return ['all lines'];
  const leadsOn = index < path.length - 1;
  if (leadsOn && (SILENT.includes(key) || key === 'lineNotes' || key === 'exceptions')) return [];
  if (leadsOn && typeof path[index + 1] === 'number' && Object.hasOwn(ONE_OF, key)) return [];
  return [NAMES[key] ?? key];
}
