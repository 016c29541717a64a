import type { Check, Line, Rubric } from '@/lib/scoring';
import type { RedoPolicy } from '@/lib/scoring/rubric-form';
import { pointsAsTyped, shareAsTyped } from './as-typed';
import { joinWords, type MatchedLine } from './compare-sizes';
import type { Compared, ComparedRow, ComparedValue } from './compare-types';
import { comparedRow, lengthValue, percentValue, pointsValue, textValue } from './compare-values';

/** What each piece is worth, costs when missing, and is checked for; lines that say the same share a row. */
export function pieceRows(lines: readonly MatchedLine[]): ComparedRow[] {
  return [
    ...worthRows(lines),
    ...checkIds(lines).flatMap((id) =>
      gathered(`check: ${labelOf(lines, id)}`, lines, (line) => checkValue(line.checks, id)),
    ),
    ...countingRows(lines),
  ];
}

export function worthRows(lines: readonly MatchedLine[]): ComparedRow[] {
  return [
    ...gathered('worth of a piece', lines, (line) => pointsValue(line.worth)),
    ...gathered('a missing piece', lines, (line) => pointsValue(line.missing)),
  ];
}

export function countingRows(lines: readonly MatchedLine[]): ComparedRow[] {
  return [
    ...gathered('thickness and width may change places', lines, (line) =>
      textValue(line.swap ? 'yes' : 'no'),
    ),
    ...gathered('pieces of a line', lines, (line) =>
      textValue(line.set === 'each' ? 'each by itself' : 'all as the worst'),
    ),
  ];
}

function gathered(
  label: string,
  lines: readonly MatchedLine[],
  valueIn: (line: Line) => ComparedValue,
): ComparedRow[] {
  const groups = new Map<string, { values: ComparedValue[]; labels: string[] }>();
  for (const matched of lines) {
    const values = matched.map(valueIn);
    const key = JSON.stringify(values);
    const group = groups.get(key) ?? { values, labels: [] };
    group.labels.push(matched[0].label);
    groups.set(key, group);
  }
  const alone = groups.size === 1;
  return [...groups.values()].map(({ values, labels }) =>
    comparedRow(alone ? label : `${label}, ${joinWords(labels)}`, values),
  );
}

function checkIds(lines: readonly MatchedLine[]): string[] {
  return [...new Set(lines.flatMap((matched) => matched.flatMap((line) => line.checks.map(({ id }) => id))))];
}

function labelOf(lines: readonly MatchedLine[], id: string): string {
  const every = lines.flatMap((matched) => matched.flatMap((line) => line.checks));
  return every.find((check) => check.id === id)?.label ?? id;
}

/** "clean 0, torn 1; taken as clean" */
function checkValue(checks: readonly Check[], id: string): ComparedValue {
  const check = checks.find((each) => each.id === id);
  if (!check) return { kind: 'none' };
  const levels = check.levels.map(({ label, lose }) => `${label} ${pointsAsTyped(lose)}`).join(', ');
  const assumed = check.assume === null ? undefined : check.levels[check.assume]?.label;
  return textValue(assumed === undefined ? levels : `${levels}; taken as ${assumed}`);
}

/** How losses become the score. */
export function wholeRows(compared: readonly Compared[]): ComparedRow[] {
  const workIds = [...new Set(compared.flatMap(({ rubric }) => rubric.workChecks.map(({ id }) => id)))];
  return [
    rubricRow(compared, 'unit', ({ unit }) => textValue(unit === 'in' ? 'inches' : 'millimetres')),
    ...totalRows(compared),
    ...workIds.map((id) => {
      const found = compared.flatMap(({ rubric }) => rubric.workChecks).find((check) => check.id === id);
      return rubricRow(compared, `check: ${found?.label ?? id}`, ({ workChecks }) =>
        checkValue(workChecks, id),
      );
    }),
  ];
}

function rubricRow(
  compared: readonly Compared[],
  label: string,
  valueIn: (rubric: Rubric) => ComparedValue,
): ComparedRow {
  return comparedRow(
    label,
    compared.map(({ rubric }) => valueIn(rubric)),
  );
}

export function totalRows(compared: readonly Compared[]): ComparedRow[] {
  const row = (label: string, valueIn: (rubric: Rubric) => ComparedValue) =>
    rubricRow(compared, label, valueIn);
  return [
    row('points in all', (rubric) => pointsValue(rubric.start ?? pieceWorth(rubric))),
    row('counted', ({ basis }) =>
      textValue(basis === 'worth' ? 'from the pieces’ worth' : 'off a fixed start'),
    ),
    row('scaled to', ({ outOf }) => pointsValue(outOf)),
    row('reading margin', ({ margin }) => lengthValue(margin)),
    row('gross limit', ({ grossLimit }) => lengthValue(grossLimit)),
    row('deviations rounded to', ({ readTo }) => lengthValue(readTo)),
    row('score rounded to', ({ roundTo }) => pointsValue(roundTo)),
    row('floor', ({ floor }) => percentValue(floor)),
    row('bonus counts up to', ({ ceiling }) => percentValue(ceiling)),
  ];
}

function pieceWorth(rubric: Rubric): number {
  return rubric.lines.reduce((sum, { worth, quantity }) => sum + worth * quantity, 0);
}

type Policies = Compared['form']['policies'];

function policyRow(
  compared: readonly Compared[],
  label: string,
  valueIn: (policies: Policies) => ComparedValue,
): ComparedRow {
  return comparedRow(
    label,
    compared.map(({ form }) => valueIn(form.policies)),
  );
}

/** What lateness costs, how a redo counts, and what a prediction can win. */
export function policyRows(compared: readonly Compared[]): ComparedRow[] {
  return [
    policyRow(compared, 'each day late', ({ late }) => percentValue(late?.perDay ?? 0)),
    policyRow(compared, 'lateness costs at most', ({ late }) => percentValue(late?.max ?? 0)),
    ...redoAndPredictionRows(compared),
  ];
}

export function redoAndPredictionRows(compared: readonly Compared[]): ComparedRow[] {
  const row = (label: string, valueIn: (policies: Policies) => ComparedValue) =>
    policyRow(compared, label, valueIn);
  return [
    row('of first and redo counts', ({ redo }) => textValue(redoWords(redo))),
    row('a redo counts up to', ({ redo }) => percentValue(redo.kind === 'average' ? null : redo.capPercent)),
    row('prediction agrees within', ({ prediction }) => lengthValue(prediction.agreeWithin)),
    row('sizes that must agree', ({ prediction }) => textValue(shareAsTyped(prediction.agreeShare))),
    row('off-band sizes caught', ({ prediction }) => textValue(shareAsTyped(prediction.caughtShare))),
    row('sizes read by number', ({ prediction }) => textValue(shareAsTyped(prediction.valueShare))),
    row('bonus for that', ({ prediction }) => pointsValue(prediction.full)),
    row('totals are close within', ({ prediction }) => pointsValue(prediction.closeWithin)),
    row('bonus for close totals', ({ prediction }) => pointsValue(prediction.close)),
  ];
}

function redoWords(redo: RedoPolicy): string {
  if (redo.kind === 'average') return `the mean, to ${pointsAsTyped(redo.roundTo)}`;
  return redo.kind === 'higher' ? 'the higher' : 'the last';
}
