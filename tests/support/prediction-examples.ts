import {
  type Axis,
  judgePrediction,
  type Piece,
  type PredictionPolicy,
  type Reading,
  type Rubric,
} from '@/lib/scoring';
import { makeAttempt, makeLine, makePiece, makeRubric, sixtyFourths, value } from './scoring-examples';

export const GAUGED: Reading = { kind: 'gauged' };
export const SPOILED: Reading = { kind: 'spoiled' };
export const EXCUSED: Reading = { kind: 'excused' };

/** The policy of a new rubric in inches. */
export const policy: PredictionPolicy = {
  agreeWithin: sixtyFourths(2),
  agreeShare: { num: 9, den: 10 },
  caughtShare: { num: 2, den: 3 },
  valueShare: { num: 1, den: 2 },
  full: 200,
  closeWithin: 300,
  close: 100,
};

export const { thickness, width, length } = makeLine({}).target;

/** A shelf by how far each size is off, in 64ths. */
export function shelf(ordinal: number, off: Partial<Record<Axis, number>> = {}, lineId = 'shelf'): Piece {
  return makePiece(lineId, ordinal, {
    thickness: thickness + sixtyFourths(off.thickness ?? 0),
    width: width + sixtyFourths(off.width ?? 0),
    length: length + sixtyFourths(off.length ?? 0),
  });
}

export function without(piece: Piece, ...axes: Axis[]): Piece {
  const sizes = { ...piece.sizes };
  for (const axis of axes) delete sizes[axis];
  return { ...piece, sizes };
}

export const absent = (state: Piece['state'], ordinal: number): Piece => ({
  lineId: 'shelf',
  ordinal,
  state,
  sizes: {},
  checks: {},
});

export const shelves = (quantity: number, changes: Parameters<typeof makeLine>[0] = {}) =>
  makeRubric({ lines: [makeLine({ quantity, ...changes })] });

/** Judges one line of shelves by the policy above, with changes. */
export function judge(
  student: Piece[],
  teacher: Piece[],
  rubric: Rubric = shelves(Math.max(student.length, teacher.length)),
  changes: Partial<PredictionPolicy> = {},
) {
  return judgePrediction(rubric, makeAttempt(student), makeAttempt(teacher), { ...policy, ...changes });
}

/** One size read by both, the other two gauged by both. */
export function judgeLength(own: Reading | undefined, theirs: Reading | undefined, rubric = shelves(1)) {
  const piece = (reading: Reading | undefined) =>
    reading ? makePiece('shelf', 1, { length: reading }) : without(makePiece('shelf', 1), 'length');
  return judge([piece(own)], [piece(theirs)], rubric);
}

/** A length so many 64ths off. */
export const at = (off: number): Reading => value(length + sixtyFourths(off));
