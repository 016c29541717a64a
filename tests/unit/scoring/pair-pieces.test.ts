import { describe, expect, it } from 'vitest';
import { type PieceSheet, scoreAttempt } from '@/lib/scoring';
import { pairPieces } from '@/lib/scoring/judge-prediction';
import { makeAttempt, makeLine, makePiece, makeRubric, sixtyFourths } from '../../support/scoring-examples';

const { length } = makeLine({}).target;

/** Sticks of one line by how far each is off in length, in 64ths. */
function sticks(...offs: number[]): PieceSheet[] {
  const pieces = offs.map((off, at) => makePiece('shelf', at + 1, { length: length + sixtyFourths(off) }));
  const rubric = makeRubric({ lines: [makeLine({ quantity: offs.length })] });
  return scoreAttempt(rubric, makeAttempt(pieces)).pieces;
}

const ordinalsOf = (own: PieceSheet[], bench: PieceSheet[]) =>
  pairPieces(own, bench, 7_937_500).map((piece) => piece?.ordinal);

describe('pairing the sticks of a line', () => {
  it('gives the example of its description', () => {
    const [sticksAsMeasured, sticksAtTheBench] = [sticks(0, 9), sticks(9, 0)];
    expect(pairPieces(sticksAsMeasured, sticksAtTheBench, 7_937_500)[0]).toBe(sticksAsMeasured[1]);
  });

  it('leaves those without a partner undefined, and passes over those too many', () => {
    expect(ordinalsOf(sticks(9), sticks(0, 9, 20))).toEqual([undefined, 1, undefined]);
    expect(ordinalsOf(sticks(0, 9, 20), sticks(9))).toEqual([2]);
    expect(pairPieces([], sticks(9), 7_937_500)).toEqual([undefined]);
    expect(pairPieces(sticks(9), [], 7_937_500)).toEqual([]);
  });

  it('keeps the order where all are equal', () => {
    expect(ordinalsOf(sticks(3, 3, 3), sticks(3, 3, 3))).toEqual([1, 2, 3]);
    expect(ordinalsOf(sticks(3, 3), sticks(3, 3, 3))).toEqual([1, 2, undefined]);
  });
});
