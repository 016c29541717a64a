import { AXES, type Points, type ScoreSheet } from '@/lib/scoring';

export interface LossBySide {
  under: Points;
  over: Points;
  /** The dearest single size on each side. */
  dearestUnder: Points;
  dearestOver: Points;
}

/** What a sheet's sizes lost under and over their targets, in the rubric's own points. */
export function lossBySide(sheet: ScoreSheet | null): LossBySide {
  const loss: LossBySide = { under: 0, over: 0, dearestUnder: 0, dearestOver: 0 };
  for (const { sizes } of sheet?.pieces ?? []) {
    for (const axis of AXES) {
      const size = sizes?.[axis];
      if (!size || size.deviation === null || size.lose === 0) continue;
      if (size.deviation < 0) {
        loss.under += size.lose;
        loss.dearestUnder = Math.max(loss.dearestUnder, size.lose);
      } else {
        loss.over += size.lose;
        loss.dearestOver = Math.max(loss.dearestOver, size.lose);
      }
    }
  }
  return loss;
}

export function countPieces(sheet: ScoreSheet | null, state: 'missing' | 'held'): number {
  return sheet?.pieces.filter((piece) => piece.state === state).length ?? 0;
}
