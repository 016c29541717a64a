import type { Attempt, Check, Piece, Rubric } from './types';

/** What was left out: a piece (`'piece'`), a check by its id, or a line's offset (`'adjust'`, ordinal 0). */
export interface Dropped {
  lineId: string;
  ordinal: number;
  what: string;
}

export interface ProjectedAttempt {
  attempt: Attempt;
  dropped: Dropped[];
}

/** The recorded levels that these checks have, and the ids of those they do not. */
function keepLevels(checks: readonly Check[], recorded: Record<string, number>) {
  const known = new Map(checks.map(({ id, levels }) => [id, levels]));
  const fits = ([id, level]: [string, number]) => known.get(id)?.[level] !== undefined;
  const entries = Object.entries(recorded);
  return {
    kept: Object.fromEntries(entries.filter(fits)),
    unknown: entries.filter((entry) => !fits(entry)).map(([id]) => id),
  };
}

/**
 * Fits an attempt to another rubric: drops the pieces, checks, levels and offsets that this rubric does not have,
 * and lists them, so that a preview can be scored and can say what it leaves out. Work checks are listed with
 * lineId '' and ordinal 0. Nothing else changes, a piece recorded twice stays so, and the argument is not changed.
 *
 * @example projectAttempt(rubric, attempt).dropped // [{ lineId: 'shelf', ordinal: 1, what: 'piece' }]
 */
export function projectAttempt(rubric: Rubric, attempt: Attempt): ProjectedAttempt {
  const lines = new Map(rubric.lines.map((line) => [line.id, line]));
  const dropped: Dropped[] = [];
  const pieces = attempt.pieces.flatMap((piece): Piece[] => {
    const { lineId, ordinal } = piece;
    const line = lines.get(lineId);
    if (line === undefined || ordinal > line.quantity) {
      dropped.push({ lineId, ordinal, what: 'piece' });
      return [];
    }
    const { kept, unknown } = keepLevels(line.checks, piece.checks);
    dropped.push(...unknown.map((what) => ({ lineId, ordinal, what })));
    return [{ ...piece, checks: kept }];
  });
  const work = keepLevels(rubric.workChecks, attempt.work);
  dropped.push(...work.unknown.map((what) => ({ lineId: '', ordinal: 0, what })));
  const projected: Attempt = { ...attempt, pieces, work: work.kept };
  if (attempt.adjust === undefined) return { attempt: projected, dropped };

  const offsets = Object.entries(attempt.adjust);
  const foreign = offsets.filter(([lineId]) => !lines.has(lineId));
  dropped.push(...foreign.map(([lineId]) => ({ lineId, ordinal: 0, what: 'adjust' })));
  projected.adjust = Object.fromEntries(offsets.filter(([lineId]) => lines.has(lineId)));
  return { attempt: projected, dropped };
}
