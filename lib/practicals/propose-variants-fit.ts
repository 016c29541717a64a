import type { Length } from '@/lib/length';
import type { CutList, CutListLine } from '@/lib/scoring/rubric-form';
import { WOOD_PERCENT } from './propose-variants-types';
import type { Task } from './task';

/** The wood of a line's pieces in cubic ticks, each with one kerf at its end. */
export function woodOf({ quantity, target }: CutListLine, kerf: Length): bigint {
  const { thickness, width, length } = target;
  return BigInt(quantity) * BigInt(thickness) * BigInt(width) * BigInt(length + kerf);
}

export function woodOfAll({ lines }: CutList, kerf: Length): bigint {
  return lines.reduce((sum, line) => sum + woodOf(line, kerf), 0n);
}

/** Whether two cut lists take the same wood within the product's percentage. */
export function isLikeWood(wood: bigint, original: bigint): boolean {
  const change = wood > original ? wood - original : original - wood;
  return change * 100n <= original * BigInt(WOOD_PERCENT);
}

/** How much more wood (less: negative) in tenths of a percent of the original, ties away from zero. */
export function woodChange(wood: bigint, original: bigint): number {
  const size = wood > original ? wood - original : original - wood;
  const tenths = Number((size * 2000n + original) / (2n * original));
  return wood < original && tenths > 0 ? -tenths : tenths;
}

/**
 * Whether the blank yields the pieces by ripping strips over its whole length, one cross-section each, and
 * crosscutting them, longest first, with one kerf a piece. It errs on the side of no: cleverer cutting may fit more.
 */
export function fitsInStrips(lines: readonly CutListLine[], { blank, kerf }: Task): boolean {
  if (!blank) return true;
  const cut = kerf ?? 0;
  const sections = new Map<string, CutListLine[]>();
  for (const line of lines) {
    const key = `${line.target.thickness} ${line.target.width}`;
    sections.set(key, [...(sections.get(key) ?? []), line]);
  }
  let across = -cut;
  for (const section of sections.values()) {
    const rip = ripOf(section[0]?.target ?? blank, blank.thickness);
    const strips = stripsFor(section, blank.length, cut);
    if (rip === null || strips === null) return false;
    across += strips * (rip + cut);
  }
  return across <= blank.width;
}

/** The narrower of the two ways in which the blank's thickness yields the section. */
function ripOf({ thickness, width }: { thickness: Length; width: Length }, from: Length): Length | null {
  const ways = [
    [thickness, width],
    [width, thickness],
  ].flatMap(([through, across]) => (through && across && through <= from ? [across] : []));
  return ways.length > 0 ? Math.min(...ways) : null;
}

function stripsFor(section: readonly CutListLine[], room: Length, kerf: Length): number | null {
  const lengths = section.flatMap(({ quantity, target }) =>
    Array.from({ length: quantity }, () => target.length + kerf),
  );
  const left: Length[] = [];
  for (const length of lengths.sort((a, b) => b - a)) {
    if (length > room) return null;
    const at = left.findIndex((free) => free >= length);
    if (at < 0) left.push(room - length);
    else left[at] = (left[at] ?? 0) - length;
  }
  return left.length;
}
