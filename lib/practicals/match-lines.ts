import { type Attempt, AXES, type Line, type Rubric } from '@/lib/scoring';
import type { Modification } from '@/lib/scoring/modification';

type Lines = Pick<Rubric, 'lines'>;

/**
 * By its id, the line of another rubric that asks for the same pieces: the one of the same id where that does, else the
 * first left that does. Two rubrics of one cut list match line by line, whatever their lines are called; a line that
 * the other has no like of is left out. Pure.
 *
 * @example matchLines(mine, theirs).get('base') // 'line-1'
 */
export function matchLines(from: Lines, to: Lines): Map<string, string> {
  const free = [...to.lines];
  const matched = new Map<string, string>();
  const take = (line: Line, like: Line | undefined) => {
    if (!like) return;
    free.splice(free.indexOf(like), 1);
    matched.set(line.id, like.id);
  };
  for (const line of from.lines)
    take(
      line,
      free.find((each) => each.id === line.id && isLike(each, line)),
    );
  for (const line of from.lines) {
    if (!matched.has(line.id))
      take(
        line,
        free.find((each) => isLike(each, line)),
      );
  }
  return matched;
}

function isLike(one: Line, other: Line): boolean {
  return one.quantity === other.quantity && AXES.every((axis) => one.target[axis] === other.target[axis]);
}

/** An attempt with its pieces under the names of matched lines; lines that match none keep theirs. Pure. */
export function renameLines(attempt: Attempt, names: ReadonlyMap<string, string>): Attempt {
  const nameOf = (lineId: string) => names.get(lineId) ?? lineId;
  const renamed: Attempt = {
    ...attempt,
    pieces: attempt.pieces.map((piece) => ({ ...piece, lineId: nameOf(piece.lineId) })),
  };
  if (attempt.adjust === undefined) return renamed;
  const offsets = Object.entries(attempt.adjust).map(([lineId, offset]) => [nameOf(lineId), offset] as const);
  return { ...renamed, adjust: Object.fromEntries(offsets) };
}

/** A modification whose excused lines go by the names of matched lines. Pure. */
export function renameExcused(modification: Modification, names: ReadonlyMap<string, string>): Modification {
  const excused = modification.excused.map(({ lineId, axis }) => ({
    lineId: lineId === null ? null : (names.get(lineId) ?? lineId),
    axis,
  }));
  return { ...modification, excused };
}
