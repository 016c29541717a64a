import type { LossRow } from '@/lib/practicals/explain-score';
import { pieceLabel } from '@/lib/practicals/task';
import type { Points, Rubric } from '@/lib/scoring';

/** What a row is about: "end 2, length", "side 1", "name and period on pieces". */
export function lossLabel(rubric: Rubric, row: LossRow): string {
  if (row.kind === 'work') return rubric.workChecks.find(({ id }) => id === row.what)?.label ?? row.what;
  const line = rubric.lines.find(({ id }) => id === row.lineId);
  const piece = line ? pieceLabel(line, row.ordinal) : row.lineId;
  if (row.kind === 'size') return `${piece}, ${row.what}`;
  if (row.kind === 'check')
    return `${piece}, ${line?.checks.find(({ id }) => id === row.what)?.label ?? row.what}`;
  return piece;
}

/** Why, where it is not a size with a reading. */
export const KIND_WORDS: Record<Exclude<LossRow['kind'], 'size'>, string> = {
  check: 'check not passed',
  work: 'check of the whole work not passed',
  missing: 'missing',
  held: 'held: set aside until it is settled',
  gross: 'so far off that it is not this part: it loses all it is worth',
  capped: 'a piece loses no more than it is worth',
  set: 'the set loses as much as the worst of it',
};

/** What lies between the points kept and the score. */
export function restWords(rubric: Rubric, rest: Points): string {
  const late = rubric.late !== null && rest <= -rubric.roundTo;
  const ceiling = rubric.late === null && rest <= -rubric.roundTo;
  if (late) return 'days late, and rounding';
  return ceiling ? 'held at the ceiling' : 'rounding';
}

/** Why more is given than this version's prices come to. */
export function heldWords(version: number | undefined): string {
  return version === undefined
    ? 'held: nobody drops'
    : `held: version ${version} gave more, and nobody drops`;
}
