import { AXES } from '@/lib/scoring';
import type {
  LineDefaults,
  LineException,
  PresetId,
  RedoPolicy,
  RubricForm,
} from '@/lib/scoring/rubric-form';
import { type DraftLine, isException, type PracticalDraft } from './draft';
import type { FieldReader } from './field-reader';
import { parseChecks } from './parse-checks';
import { parseSizeRule } from './parse-size-rule';
import { presetHolds } from './presets';

const MOST_TOTAL = 1_000_000;
const ROUNDINGS = [100, 50, 10, 1];

/** The rubric as authored, from the typed fields of a draft. */
export function parseForm(reader: FieldReader, draft: PracticalDraft): RubricForm {
  const { total, reading, unit } = draft;
  const defaults = parseDefaults(reader, draft);
  const form: RubricForm = {
    format: 1,
    unit,
    basis: total.basis,
    start: total.basis === 'start' ? reader.points('total.start', total.start, MOST_TOTAL) : null,
    outOf: reader.optional(total.outOf, () => reader.points('total.outOf', total.outOf, MOST_TOTAL)),
    floor: reader.whole('total.floor', total.floor, [0, 100], 'The floor, in percent,'),
    roundTo: parseRounding(reader, 'total.roundTo', total.roundTo),
    readTo: reader.optional(reading.readTo, () => reader.size('reading.readTo', reading.readTo)),
    margin: reader.distance('reading.margin', reading.margin),
    grossLimit: reader.optional(reading.grossLimit, () =>
      reader.distance('reading.grossLimit', reading.grossLimit),
    ),
    ceiling: reader.whole(
      'total.ceiling',
      total.ceiling,
      [100, 200],
      'The most a bonus may reach, in percent,',
    ),
    presets: [],
    defaults,
    exceptions: parseExceptions(reader, draft.lines, defaults),
    workChecks: parseChecks(reader, 'workChecks', draft.workChecks),
    policies: {
      late: parseLate(reader, draft.late),
      redo: parseRedo(reader, draft.redo),
      prediction: parsePrediction(reader, draft.prediction),
    },
  };
  if (form.start === 0 && !reader.hasErrorAt('total.start')) {
    reader.refuse('total.start', 'Start from more than 0 points.');
  }
  if (form.outOf === 0) reader.refuse('total.outOf', 'Scale to more than 0 points, or leave it empty.');
  return { ...form, presets: usedPresets(draft, form) };
}

function usedPresets(draft: PracticalDraft, form: RubricForm): PresetId[] {
  return draft.presets.filter((preset) => presetHolds(preset, form));
}

/** Empty, or the word `worth`: what is missing loses the piece's worth. */
function parseMissing(reader: FieldReader, path: string, text: string): number | null {
  const plain = text.trim().toLowerCase();
  return plain === '' || plain === 'worth' ? null : reader.points(path, text);
}

function parseDefaults(reader: FieldReader, { all }: PracticalDraft): LineDefaults {
  const worth = reader.points('all.worth', all.worth);
  const defaults: LineDefaults = {
    worth,
    missing: parseMissing(reader, 'all.missing', all.missing),
    sizes: {
      thickness: parseSizeRule(reader, 'all.sizes.thickness', all.sizes.thickness),
      width: parseSizeRule(reader, 'all.sizes.width', all.sizes.width),
      length: parseSizeRule(reader, 'all.sizes.length', all.sizes.length),
    },
    checks: parseChecks(reader, 'all.checks', all.checks),
    swap: all.swap,
    set: all.set,
  };
  for (const axis of AXES) refuseCapAboveWorth(reader, `all.sizes.${axis}`, defaults.sizes[axis].cap, worth);
  return defaults;
}

function refuseCapAboveWorth(reader: FieldReader, path: string, cap: number | null, worth: number): void {
  if (cap === null || cap <= worth || reader.hasErrorAt(`${path}.cap`)) return;
  reader.refuse(`${path}.cap`, `The most a size can lose is at most the piece’s worth, ${worth / 100}.`);
}

function parseExceptions(
  reader: FieldReader,
  lines: readonly DraftLine[],
  defaults: LineDefaults,
): Record<string, LineException> {
  const exceptions: Record<string, LineException> = {};
  lines.forEach((line, index) => {
    if (isException(line)) exceptions[line.id] = parseException(reader, `lines.${index}`, line, defaults);
  });
  return exceptions;
}

function parseException(
  reader: FieldReader,
  at: string,
  line: DraftLine,
  defaults: LineDefaults,
): LineException {
  const exception: LineException = {};
  if (line.worth.trim() !== '') exception.worth = reader.points(`${at}.worth`, line.worth);
  if (line.missing.trim() !== '') exception.missing = parseMissing(reader, `${at}.missing`, line.missing);
  if (line.checks !== null) exception.checks = parseChecks(reader, `${at}.checks`, line.checks);
  if (line.swap !== null) exception.swap = line.swap;
  if (line.set !== null) exception.set = line.set;
  for (const axis of AXES) {
    const typed = line.sizes[axis];
    if (typed === null) continue;
    const rule = parseSizeRule(reader, `${at}.sizes.${axis}`, typed);
    refuseCapAboveWorth(reader, `${at}.sizes.${axis}`, rule.cap, exception.worth ?? defaults.worth);
    exception.sizes = { ...exception.sizes, [axis]: rule };
  }
  return exception;
}

function parseRounding(reader: FieldReader, path: string, text: string): number {
  const points = reader.points(path, text);
  if (!reader.hasErrorAt(path) && !ROUNDINGS.includes(points)) {
    reader.refuse(path, 'Round to 1, 0.5, 0.1 or 0.01 points.');
  }
  return points;
}

function parseLate(reader: FieldReader, late: PracticalDraft['late']): RubricForm['policies']['late'] {
  if (late.perDay.trim() === '' && late.max.trim() === '') return null;
  const perDay = reader.whole('late.perDay', late.perDay, [0, 100], 'The percent a day');
  const max = reader.whole('late.max', late.max, [0, 100], 'The greatest percent');
  if (!reader.hasErrorAt('late') && max < perDay) {
    reader.refuse('late.max', 'The greatest percent is no less than the percent a day.');
  }
  return { perDay, max };
}

function parseRedo(reader: FieldReader, redo: PracticalDraft['redo']): RedoPolicy {
  if (redo.kind === 'average') {
    return { kind: 'average', roundTo: parseRounding(reader, 'redo.roundTo', redo.roundTo) };
  }
  const capPercent = reader.whole('redo.capPercent', redo.capPercent, [0, 100], 'What a redo counts up to');
  return { kind: redo.kind, capPercent };
}

function parsePrediction(reader: FieldReader, typed: PracticalDraft['prediction']) {
  return {
    agreeWithin: reader.distance('prediction.agreeWithin', typed.agreeWithin),
    agreeShare: reader.share('prediction.agreeShare', typed.agreeShare),
    caughtShare: reader.share('prediction.caughtShare', typed.caughtShare),
    valueShare: reader.share('prediction.valueShare', typed.valueShare),
    full: reader.points('prediction.full', typed.full),
    closeWithin: reader.points('prediction.closeWithin', typed.closeWithin),
    close: reader.points('prediction.close', typed.close),
  };
}
