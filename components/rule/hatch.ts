import type { Side } from './price-steps';

export interface Patch {
  x: number;
  y: number;
  width: number;
  height: number;
}

function fixed(value: number): string {
  return String(Math.round(value * 10) / 10);
}

/** Slanting lines cut off at the patch; neighbouring patches continue each other. Under leans `\`, over leans `/`. */
export function hatchPath({ x, y, width, height }: Patch, side: Side, gap = 8): string {
  const apart = gap * Math.SQRT2;
  const [right, foot] = [x + width, y + height];
  const lines: string[] = [];
  // A line is all points with x + y (over) or x − y (under) the same.
  const [low, high] = side === 'over' ? [x + y, right + foot] : [x - foot, right - y];
  for (let turn = Math.ceil(low / apart); turn * apart < high; turn++) {
    const sum = turn * apart;
    const startX = Math.max(x, side === 'over' ? sum - foot : sum + y);
    const endX = Math.min(right, side === 'over' ? sum - y : sum + foot);
    if (endX - startX < 0.5) continue;
    const yAt = (at: number) => (side === 'over' ? sum - at : at - sum);
    lines.push(`M${fixed(startX)} ${fixed(yAt(startX))}L${fixed(endX)} ${fixed(yAt(endX))}`);
  }
  return lines.join('');
}
