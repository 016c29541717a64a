import type { Length } from '@/lib/length';
import {
  AXES,
  type Axis,
  type PieceSheet,
  type Rubric,
  type ScoreSheet,
  type SizeSheet,
} from '@/lib/scoring';
import { pairPieces } from '@/lib/scoring/judge-prediction';

/** One size as the bench read it, beside the student's own reading of the same piece. */
export interface ReadingPair {
  lineId: string;
  /** The number the bench gave the piece, and the number the student gave it; null when nothing stands beside it. */
  ordinal: number;
  ownOrdinal: number | null;
  axis: Axis;
  bench: SizeSheet;
  own: SizeSheet | null;
  /** How far the two are apart as scored; null unless both are numbers. */
  apart: Length | null;
}

/**
 * Own readings beside the bench's. Which of several equal pieces is number 3 is nobody's knowledge, so they are paired
 * as the judgement of the prediction pairs them. In cut-list order, by the bench's numbers. Pure.
 */
export function pairReadings(
  rubric: Rubric,
  own: ScoreSheet | null,
  bench: ScoreSheet,
  agreeWithin: Length,
): ReadingPair[] {
  return rubric.lines.flatMap(({ id }) => {
    const theirs = presentOf(bench, id);
    const partners = pairPieces(presentOf(own, id), theirs, agreeWithin);
    return theirs.flatMap((piece, index) => AXES.map((axis) => pairOf(piece, partners[index], axis)));
  });
}

function presentOf(sheet: ScoreSheet | null, lineId: string): PieceSheet[] {
  return (
    sheet?.pieces.filter((piece) => piece.lineId === lineId && piece.state === 'present' && piece.sizes) ?? []
  );
}

function pairOf(piece: PieceSheet, partner: PieceSheet | undefined, axis: Axis): ReadingPair {
  const bench = piece.sizes?.[axis];
  if (!bench) throw new Error('a present piece has its sizes');
  const own = partner?.sizes?.[axis] ?? null;
  const apart = own?.used != null && bench.used !== null ? Math.abs(own.used - bench.used) : null;
  return {
    lineId: piece.lineId,
    ordinal: piece.ordinal,
    ownOrdinal: partner?.ordinal ?? null,
    axis,
    bench,
    own,
    apart,
  };
}

/** The readings that lie furthest apart, the furthest first; equal ones in cut-list order. */
export function largestDisagreements(pairs: readonly ReadingPair[], most: number): ReadingPair[] {
  return pairs
    .filter(({ apart }) => (apart ?? 0) > 0)
    .toSorted((a, b) => (b.apart ?? 0) - (a.apart ?? 0))
    .slice(0, most);
}
