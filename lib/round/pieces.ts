import { pieceLabel } from '@/lib/practicals/task';
import { AXES, type Line, type Rubric } from '@/lib/scoring';
import type { Spot } from './types';

export interface PiecePlace {
  line: Line;
  ordinal: number;
  label: string;
}

const placesOf = new WeakMap<Rubric, PiecePlace[]>();

/** Every piece of a rubric in cut-list order, with the label it goes by at the bench. */
export function listPieces(rubric: Rubric): readonly PiecePlace[] {
  const known = placesOf.get(rubric);
  if (known) return known;
  const places = rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, index) => ({
      line,
      ordinal: index + 1,
      label: pieceLabel(line, index + 1),
    })),
  );
  placesOf.set(rubric, places);
  return places;
}

export function findPiece(rubric: Rubric, at: { lineId: string; ordinal: number }): PiecePlace | undefined {
  return listPieces(rubric).find(({ line, ordinal }) => line.id === at.lineId && ordinal === at.ordinal);
}

/**
 * Every dimension in the order the cursor walks: piece by piece, or down a line all thicknesses, then all widths,
 * then all lengths, so that an instrument is set once.
 */
export function listSpots(rubric: Rubric, order: 'piece' | 'line'): Spot[] {
  if (order === 'piece') {
    return listPieces(rubric).flatMap(({ line, ordinal }) =>
      AXES.map((axis) => ({ lineId: line.id, ordinal, axis })),
    );
  }
  return rubric.lines.flatMap((line) =>
    AXES.flatMap((axis) =>
      Array.from({ length: line.quantity }, (_, index) => ({ lineId: line.id, ordinal: index + 1, axis })),
    ),
  );
}

export function isSameSpot(a: Spot | null, b: Spot | null): boolean {
  return a?.lineId === b?.lineId && a?.ordinal === b?.ordinal && a?.axis === b?.axis;
}
