import { type Length, MAX_LENGTH } from '@/lib/length';
import { assignLeast, type Cost } from './assign-least';
import type { PredictionPolicy, Share } from './rubric-form';
import { scoreAttempt } from './score-attempt';
import {
  type Attempt,
  AXES,
  type Axis,
  type PieceSheet,
  type Points,
  type Rubric,
  type ScoreSheet,
  type SizeSheet,
} from './types';

export interface PredictionJudgement {
  /** Sizes the teacher recorded as value, gauged or spoiled, and missing pieces. */
  of: number;
  agree: number;
  /** Of those, the ones that lose points, and how many of them the student saw losing points too. */
  offBand: number;
  caught: number;
  /** Difference of the two provisional scores without bonus or lateness; null while one of them has none. */
  gap: Points | null;
  bonus: Points;
  because: 'full' | 'close' | 'too-few-agree' | 'too-few-caught' | 'too-few-values' | 'nothing-to-judge';
}

interface Tally {
  of: number;
  agree: number;
  offBand: number;
  caught: number;
  sizes: number;
  values: number;
}

/**
 * Judges how well a student measured, not how good the parts are: own readings against the teacher's, size by size as
 * scored. Within a line, pieces present on both sides are paired for the least total distance, then for the most
 * agreements, then by the lowest ordinals, since which of equal pieces is number 3 is nobody's knowledge. Ticks and
 * hundredths; shares are compared as whole numbers. Nothing is rounded and neither attempt is changed.
 *
 * @throws ScoringError when an attempt does not fit the rubric.
 * @example judgePrediction(rubric, same, same, policy).because // 'full'
 */
export function judgePrediction(
  rubric: Rubric,
  student: Attempt,
  teacher: Attempt,
  policy: PredictionPolicy,
): PredictionJudgement {
  const own = scoreAttempt(rubric, bare(student));
  const bench = scoreAttempt(rubric, bare(teacher));
  const tally: Tally = { of: 0, agree: 0, offBand: 0, caught: 0, sizes: 0, values: 0 };
  for (const { id } of rubric.lines)
    tallyLine(tally, piecesOf(own, id), piecesOf(bench, id), policy.agreeWithin);
  const gap =
    own.provisional === null || bench.provisional === null
      ? null
      : Math.abs(own.provisional - bench.provisional);
  const because = decide(tally, gap, policy, own);
  const bonus = because === 'full' ? policy.full : because === 'close' ? policy.close : 0;
  const { of, agree, offBand, caught } = tally;
  return { of, agree, offBand, caught, gap, bonus, because };
}

function bare(attempt: Attempt): Attempt {
  return { ...attempt, bonus: 0, daysLate: 0 };
}

function piecesOf(sheet: ScoreSheet, lineId: string): PieceSheet[] {
  return sheet.pieces.filter((piece) => piece.lineId === lineId);
}

function decide(
  tally: Tally,
  gap: Points | null,
  policy: PredictionPolicy,
  own: ScoreSheet,
): PredictionJudgement['because'] {
  if (tally.of === 0) return 'nothing-to-judge';
  const agrees = reaches(tally.agree, tally.of, policy.agreeShare);
  const catches = tally.offBand === 0 || reaches(tally.caught, tally.offBand, policy.caughtShare);
  const reads = reaches(tally.values, tally.sizes, policy.valueShare);
  if (agrees && catches && reads) return 'full';
  if (gap !== null && gap <= policy.closeWithin && !own.unread.some(({ what }) => isSize(what)))
    return 'close';
  if (!agrees) return 'too-few-agree';
  return catches ? 'too-few-values' : 'too-few-caught';
}

/** Whether part / whole is at least the share. */
function reaches(part: number, whole: number, { num, den }: Share): boolean {
  return part * den >= num * whole;
}

/** A piece that is not listed, or held, leaves its sizes unread. */
function isSize(what: string): boolean {
  return what === 'piece' || what === 'held' || AXES.some((axis) => axis === what);
}

function tallyLine(tally: Tally, own: PieceSheet[], bench: PieceSheet[], within: Length): void {
  tallyMissing(tally, own, bench);
  const ownPresent = own.filter(({ state }) => state === 'present');
  const benchPresent = bench.filter(({ state }) => state === 'present');
  const partners = pairPieces(ownPresent, benchPresent, within);
  benchPresent.forEach((piece, index) => {
    for (const axis of AXES) tallySize(tally, sizeOf(partners[index], axis), sizeOf(piece, axis), within);
  });
}

function tallyMissing(tally: Tally, own: PieceSheet[], bench: PieceSheet[]): void {
  const missing = bench.filter(({ state }) => state === 'missing');
  const agreed = Math.min(missing.length, own.filter(({ state }) => state === 'missing').length);
  tally.of += missing.length;
  tally.agree += agreed;
  if (missing.some(({ lose }) => lose > 0)) {
    tally.offBand += missing.length;
    tally.caught += agreed;
  }
}

function tallySize(
  tally: Tally,
  own: SizeSheet | undefined,
  bench: SizeSheet | undefined,
  within: Length,
): void {
  if (!bench || !isItem(bench)) return;
  const agreed = own !== undefined && agree(own, bench, within);
  tally.of += 1;
  tally.sizes += 1;
  tally.agree += agreed ? 1 : 0;
  tally.values += own && kindOf(own) === 'value' ? 1 : 0;
  if (bench.lose === 0) return;
  tally.offBand += 1;
  const saw = bench.band === 'spoiled' ? agreed : (own?.lose ?? 0) > 0;
  tally.caught += saw ? 1 : 0;
}

function sizeOf(piece: PieceSheet | undefined, axis: Axis): SizeSheet | undefined {
  return piece?.sizes?.[axis];
}

type Kind = 'value' | 'gauged' | 'spoiled' | 'excused' | 'unread';

function kindOf({ band }: SizeSheet): Kind {
  return typeof band === 'number' || band === 'beyond' ? 'value' : band;
}

function isItem(size: SizeSheet): boolean {
  const kind = kindOf(size);
  return kind === 'value' || kind === 'gauged' || kind === 'spoiled';
}

function agree(own: SizeSheet, bench: SizeSheet, within: Length): boolean {
  const [ownKind, benchKind] = [kindOf(own), kindOf(bench)];
  if (ownKind === 'value' && benchKind === 'value') return apart(own, bench) <= within;
  if (benchKind === 'gauged') return (ownKind === 'value' || ownKind === 'gauged') && own.lose === 0;
  if (ownKind === 'gauged') return bench.lose === 0;
  return ownKind === 'spoiled' && benchKind === 'spoiled';
}

function apart(own: SizeSheet, bench: SizeSheet): Length {
  return Math.abs((own.used ?? 0) - (bench.used ?? 0));
}

/** Two sizes that cannot be compared stand as far apart as any could. */
function distance(own: SizeSheet, bench: SizeSheet): Length {
  const [ownKind, benchKind] = [kindOf(own), kindOf(bench)];
  if (ownKind === 'value' && benchKind === 'value') return apart(own, bench);
  if (ownKind === 'gauged' && benchKind === 'value') return Math.abs(bench.deviation ?? 0);
  if (ownKind === 'value' && benchKind === 'gauged') return Math.abs(own.deviation ?? 0);
  const same = ownKind === benchKind && (ownKind === 'gauged' || ownKind === 'spoiled');
  return same ? 0 : MAX_LENGTH;
}

/**
 * For each piece of the bench, in order, the student's piece of the same line it is compared with: the least total
 * distance, then the most agreements within `within` ticks, then the lowest ordinals; undefined where none is left.
 * Both lists are the present pieces of one line, as scored. Pure; never fails.
 *
 * @example pairPieces(sticksAsMeasured, sticksAtTheBench, 7_937_500) // the stick read as no. 2 stands first
 */
export function pairPieces(
  own: PieceSheet[],
  bench: PieceSheet[],
  within: Length,
): (PieceSheet | undefined)[] {
  const capacities = [...own.map(() => 1), Math.max(0, bench.length - own.length)];
  const columns = assignLeast(bench.length, capacities, (row, column) => {
    const [theirs, ours] = [bench[row], own[column]];
    return theirs && ours ? pairCost(ours, theirs, within) : UNPAIRED;
  });
  return columns.map((column) => own[column]);
}

/** A piece without a partner is no distance off and agrees nowhere. */
const UNPAIRED: Cost = { major: 0, minor: AXES.length };

/** The total distance, then how many of the axes do not agree. */
function pairCost(own: PieceSheet, bench: PieceSheet, within: Length): Cost {
  const cost = { major: 0, minor: AXES.length };
  for (const axis of AXES) {
    const [ours, theirs] = [sizeOf(own, axis), sizeOf(bench, axis)];
    if (!ours || !theirs) continue;
    cost.major += distance(ours, theirs);
    if (isItem(theirs) && agree(ours, theirs, within)) cost.minor -= 1;
  }
  return cost;
}
