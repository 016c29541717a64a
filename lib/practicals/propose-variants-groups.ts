import type { Length } from '@/lib/length';
import { AXES, type Line } from '@/lib/scoring';
import { fitsInStrips } from './propose-variants-fit';
import type { ReachedLine } from './propose-variants-lent';
import { LARGEST_SHARE, type SizeGroup } from './propose-variants-types';
import type { Task } from './task';

/** The least whole number of graduations that is past every line's reach. */
export function leastStep(lines: readonly ReachedLine[], graduation: Length): Length {
  const reach = Math.max(...lines.flatMap((line) => AXES.map((axis) => line.reach[axis])));
  return (Math.floor(reach / graduation) + 1) * graduation;
}

/**
 * The sizes of a cut list, the equal ones together, largest first. What is as thick as a piece or the blank stays,
 * for the stock is given; the rest may move by whole steps up to its share. Where the blank does not plainly yield
 * the original, sizes only become smaller.
 */
export function groupSizes(task: Task, priced: readonly Line[], step: Length): SizeGroup[] {
  const { lines } = task.cutList;
  const stock = new Set([...lines.map(({ target }) => target.thickness), task.blank?.thickness]);
  const onlyLess = !fitsInStrips(lines, task);
  const groups = new Map<Length, SizeGroup>();
  for (const [line, { target }] of priced.entries()) {
    for (const axis of AXES) {
      const value = target[axis];
      const group = groups.get(value) ?? { value, sizes: [], moves: [0] };
      group.sizes.push({ line, axis });
      if (!stock.has(value)) group.moves = movesOf(value, step, onlyLess);
      groups.set(value, group);
    }
  }
  return [...groups.values()].sort((a, b) => b.value - a.value);
}

function movesOf(value: Length, step: Length, onlyLess: boolean): Length[] {
  const most = Math.floor((value * LARGEST_SHARE.num) / (LARGEST_SHARE.den * step));
  const moves = [0];
  for (let count = 1; count <= most; count++) moves.push(...(onlyLess ? [] : [count * step]), -count * step);
  return moves;
}
