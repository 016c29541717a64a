import type { Length } from '@/lib/length';
import { AXES, type Axis, type Line, type Rubric } from '@/lib/scoring';
import type { CutListLine } from '@/lib/scoring/rubric-form';
import type { OtherCutList, Target } from './propose-variants-types';

/** A line, and how far off on each axis a borrowed piece may be and still be taken for its own. */
export type ReachedLine = Line & { reach: Record<Axis, Length> };

/** The reach of each line: the gross limit, else twice the last band; margin and rounding of readings on top. */
export function withReach(rubric: Rubric): ReachedLine[] {
  const free = rubric.margin + Math.ceil((rubric.readTo ?? 0) / 2);
  return rubric.lines.map((line) => {
    const reachAt = (axis: Axis) => (rubric.grossLimit ?? 2 * lastBand(line, axis)) + free;
    const reach = { thickness: reachAt('thickness'), width: reachAt('width'), length: reachAt('length') };
    return { ...line, reach };
  });
}

function lastBand({ sizes }: Line, axis: Axis): Length {
  return Math.max(...[sizes[axis].over, sizes[axis].under].map((bands) => bands.at(-1)?.within ?? 0));
}

/** Whether a piece of these sizes can be handed in for the line without being off by more than its reach. */
export function passesFor({ thickness, width, length }: Target, line: ReachedLine): boolean {
  if (Math.abs(length - line.target.length) > line.reach.length) return false;
  const laid = (through: Length, across: Length) =>
    Math.abs(through - line.target.thickness) <= line.reach.thickness &&
    Math.abs(across - line.target.width) <= line.reach.width;
  return laid(thickness, width) || (line.swap && laid(width, thickness));
}

/** Whether either of two lines' pieces can be handed in for the other. */
export function alike(one: ReachedLine, other: ReachedLine): boolean {
  return passesFor(one.target, other) || passesFor(other.target, one);
}

/** The piece of another cut list that comes nearest to a line's, and what it would be there. */
export interface NearestLent {
  label: string;
  of: string;
  /** How far it is off where it is off most. */
  off: Length;
  /** Past the gross limit, past the last band twice over, or neither. */
  verdict: 'gross' | 'beyond' | 'passes';
}

/** Of all pieces that could be lent to a line, the one that would be taken most easily; null when there is none. */
export function nearestLent(
  line: ReachedLine,
  others: readonly OtherCutList[],
  grossLimit: Rubric['grossLimit'],
): NearestLent | null {
  const far = grossLimit === null ? 'beyond' : 'gross';
  const lent = others.flatMap(({ name, cutList }) =>
    cutList.lines.map((piece) => lentAs(piece, name, line, far)),
  );
  const rank = ({ verdict, off }: NearestLent) => [verdict === 'passes' ? 0 : 1, off] as const;
  return lent.reduce<NearestLent | null>((nearest, each) => {
    if (!nearest) return each;
    const [a, b] = [rank(each), rank(nearest)];
    return a[0] < b[0] || (a[0] === b[0] && a[1] < b[1]) ? each : nearest;
  }, null);
}

function lentAs(piece: CutListLine, of: string, line: ReachedLine, far: 'gross' | 'beyond'): NearestLent {
  const off = Math.min(
    ...waysToLay(piece.target, line).map((laid) =>
      Math.max(...AXES.map((axis) => Math.abs(laid[axis] - line.target[axis]))),
    ),
  );
  return { label: piece.label, of, off, verdict: passesFor(piece.target, line) ? 'passes' : far };
}

/** The piece as laid and, where the line allows it, with thickness and width exchanged. */
function waysToLay(piece: Target, line: Line): Target[] {
  const { thickness, width, length } = piece;
  return line.swap ? [piece, { thickness: width, width: thickness, length }] : [piece];
}
