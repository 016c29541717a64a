import type { Length } from '@/lib/length';
import { AXES, type Axis, type Line } from '../types';
import type { Remark, ReviewRule } from './finding';
import { mostOfPresent } from './most-lost';
import { sayLength, sayLine, sayPoints } from './review-words';

type Target = Record<Axis, Length>;

function largestDifference(one: Target, other: Target): Length {
  return Math.max(...AXES.map((axis) => Math.abs(one[axis] - other[axis])));
}

/** How far two parts are apart, either of them turned if its line lets thickness and width be exchanged. */
function apart(one: Line, other: Line): Length {
  const laid = largestDifference(one.target, other.target);
  if (!one.swap && !other.swap) return laid;
  const { thickness, width, length } = other.target;
  return Math.min(laid, largestDifference(one.target, { thickness: width, width: thickness, length }));
}

function lastBand({ sizes }: Line): Length {
  return Math.max(
    ...AXES.flatMap((axis) =>
      [sizes[axis].over, sizes[axis].under].map((bands) => bands.at(-1)?.within ?? 0),
    ),
  );
}

export const findAlike: ReviewRule = (rubric) => {
  const { lines, grossLimit } = rubric;
  const reaches = new Map(lines.map((line) => [line, lastBand(line)]));
  return lines.flatMap((one, index) =>
    lines.slice(index + 1).flatMap((other): Remark[] => {
      const reach = 2 * Math.max(reaches.get(one) ?? 0, reaches.get(other) ?? 0);
      const difference = apart(one, other);
      if (difference > Math.max(reach, grossLimit ?? 0)) return [];
      const off =
        difference === 0 ? 'are the same size' : `differ by no more than ${sayLength(difference, rubric)}`;
      const text =
        `${sayLine(one)} and ${sayLine(other)} ${off}, so a piece of one can pass for the other. ` +
        'Have the pieces labelled, or settle at the bench which is which.';
      return [{ lineId: one.id, text }];
    }),
  );
};

export const findCheapMissing: ReviewRule = (rubric) =>
  rubric.lines.flatMap((line): Remark[] => {
    const pieces = line.set === 'worst' ? line.quantity : 1;
    const most = mostOfPresent(line, rubric) * pieces;
    if (line.missing >= most) return [];
    const poor = pieces === 1 ? 'a poor one' : `one poor piece, by which all ${pieces} are priced,`;
    const text =
      `${sayLine(line)}: a missing piece loses ${sayPoints(line.missing)}, ${poor} up to ${sayPoints(most)}, so ` +
      `leaving one out can pay. Raise the price of a missing piece to ${sayPoints(most)}, or lower the other prices.`;
    return [{ lineId: line.id, text }];
  });
