import { type Length, MAX_LENGTH } from '@/lib/length';
import type {
  Attempt,
  Axis,
  PieceSheet,
  PredictionJudgement,
  PredictionPolicy,
  Rubric,
  SizeSheet,
} from '@/lib/scoring';
import { scoreByOracle } from './scoring-oracle';

/**
 * A second reading of the rules of predictions, slow and plain: within a line every way to pair the pieces is tried,
 * and every share is a BigInt product.
 */

const AXES: Axis[] = ['thickness', 'width', 'length'];

type Kind = 'value' | 'gauged' | 'spoiled' | 'other';

function kindOf(size: SizeSheet): Kind {
  if (size.used !== null) return 'value';
  return size.band === 'gauged' || size.band === 'spoiled' ? size.band : 'other';
}

function distanceOf(student: SizeSheet, teacher: SizeSheet): Length {
  const [s, t] = [kindOf(student), kindOf(teacher)];
  if (s === 'value' && t === 'value') return Math.abs((student.used ?? 0) - (teacher.used ?? 0));
  if (s === 'gauged' && t === 'gauged') return 0;
  if (s === 'spoiled' && t === 'spoiled') return 0;
  if (s === 'gauged' && t === 'value') return Math.abs(teacher.deviation ?? 0);
  if (t === 'gauged' && s === 'value') return Math.abs(student.deviation ?? 0);
  return MAX_LENGTH;
}

function agrees(student: SizeSheet, teacher: SizeSheet, within: Length): boolean {
  const [s, t] = [kindOf(student), kindOf(teacher)];
  if (s === 'value' && t === 'value') return distanceOf(student, teacher) <= within;
  if (t === 'gauged') return (s === 'value' || s === 'gauged') && student.lose === 0;
  if (s === 'gauged') return teacher.lose === 0;
  return s === 'spoiled' && t === 'spoiled';
}

function isItem(size: SizeSheet): boolean {
  return kindOf(size) !== 'other';
}

type Pairing = (PieceSheet | null)[];

/** Every way to give each of the teacher's pieces one of the student's or none, as many pairs as there can be. */
function everyPairing(
  teacher: readonly PieceSheet[],
  student: readonly PieceSheet[],
  spare: number,
): Pairing[] {
  const [, ...rest] = teacher;
  if (teacher.length === 0) return [[]];
  const taken = student.flatMap((piece, at) =>
    everyPairing(rest, student.toSpliced(at, 1), spare).map((others): Pairing => [piece, ...others]),
  );
  const left =
    spare > 0 ? everyPairing(rest, student, spare - 1).map((others): Pairing => [null, ...others]) : [];
  return [...taken, ...left];
}

/** Distance, then agreements (more first), then the ordinals in turn, none being the highest. */
function rankOf(teacher: readonly PieceSheet[], pairing: Pairing, within: Length): number[] {
  let [distance, agreements] = [0, 0];
  teacher.forEach((piece, at) => {
    for (const axis of AXES) {
      const [theirs, own] = [piece.sizes?.[axis], pairing[at]?.sizes?.[axis]];
      if (!theirs || !own) continue;
      distance += distanceOf(own, theirs);
      agreements += isItem(theirs) && agrees(own, theirs, within) ? 1 : 0;
    }
  });
  return [distance, -agreements, ...pairing.map((own) => own?.ordinal ?? Number.POSITIVE_INFINITY)];
}

function isBefore(a: readonly number[], b: readonly number[]): boolean {
  const at = a.findIndex((value, index) => value !== b[index]);
  return at >= 0 && (a[at] ?? 0) < (b[at] ?? 0);
}

export function pairByTrying(
  student: readonly PieceSheet[],
  teacher: readonly PieceSheet[],
  within: Length,
): Pairing {
  const spare = Math.max(0, teacher.length - student.length);
  return everyPairing(teacher, student, spare).reduce((best, pairing) =>
    isBefore(rankOf(teacher, pairing, within), rankOf(teacher, best, within)) ? pairing : best,
  );
}

interface Counts {
  of: number;
  agree: number;
  offBand: number;
  caught: number;
  sizes: number;
  values: number;
}

function countSize(counts: Counts, own: SizeSheet | undefined, theirs: SizeSheet, within: Length): void {
  if (!isItem(theirs)) return;
  const agreed = own !== undefined && agrees(own, theirs, within);
  counts.of += 1;
  counts.sizes += 1;
  if (agreed) counts.agree += 1;
  if (own && kindOf(own) === 'value') counts.values += 1;
  if (theirs.lose === 0) return;
  counts.offBand += 1;
  const caught = kindOf(theirs) === 'spoiled' ? agreed : own !== undefined && own.lose > 0;
  if (caught) counts.caught += 1;
}

function countLine(counts: Counts, student: PieceSheet[], teacher: PieceSheet[], within: Length): void {
  const of = (pieces: PieceSheet[], state: PieceSheet['state']) =>
    pieces.filter((piece) => piece.state === state);
  const missing = of(teacher, 'missing');
  const both = Math.min(missing.length, of(student, 'missing').length);
  counts.of += missing.length;
  counts.agree += both;
  if (missing[0] && missing[0].lose > 0) {
    counts.offBand += missing.length;
    counts.caught += both;
  }
  const present = of(teacher, 'present');
  const pairing = pairByTrying(of(student, 'present'), present, within);
  present.forEach((piece, at) => {
    for (const axis of AXES) {
      const theirs = piece.sizes?.[axis];
      if (theirs) countSize(counts, pairing[at]?.sizes?.[axis], theirs, within);
    }
  });
}

function reaches(part: number, whole: number, share: { num: number; den: number }): boolean {
  return BigInt(part) * BigInt(share.den) >= BigInt(share.num) * BigInt(whole);
}

export function judgeByOracle(
  rubric: Rubric,
  student: Attempt,
  teacher: Attempt,
  policy: PredictionPolicy,
): PredictionJudgement {
  const own = scoreByOracle(rubric, { ...student, bonus: 0, daysLate: 0 });
  const bench = scoreByOracle(rubric, { ...teacher, bonus: 0, daysLate: 0 });
  const counts: Counts = { of: 0, agree: 0, offBand: 0, caught: 0, sizes: 0, values: 0 };
  for (const { id } of rubric.lines) {
    const inLine = ({ lineId }: PieceSheet) => lineId === id;
    countLine(counts, own.pieces.filter(inLine), bench.pieces.filter(inLine), policy.agreeWithin);
  }
  const { of, agree, offBand, caught, sizes, values } = counts;
  const gap =
    own.provisional === null || bench.provisional === null
      ? null
      : Math.abs(own.provisional - bench.provisional);
  const tests = [
    { because: 'too-few-agree' as const, holds: reaches(agree, of, policy.agreeShare) },
    {
      because: 'too-few-caught' as const,
      holds: offBand === 0 || reaches(caught, offBand, policy.caughtShare),
    },
    { because: 'too-few-values' as const, holds: reaches(values, sizes, policy.valueShare) },
  ];
  const failed = tests.find(({ holds }) => !holds)?.because;
  const sizeWords = new Set<string>([...AXES, 'piece', 'held']);
  const allRead = own.unread.every(({ what }) => !sizeWords.has(what));
  const close = allRead && gap !== null && gap <= policy.closeWithin;
  const common = { of, agree, offBand, caught, gap };
  if (of === 0) return { ...common, bonus: 0, because: 'nothing-to-judge' };
  if (!failed) return { ...common, bonus: policy.full, because: 'full' };
  return close
    ? { ...common, bonus: policy.close, because: 'close' }
    : { ...common, bonus: 0, because: failed };
}
