import type { SpacePoint } from './grain';

export type PaperPoint = readonly [x: number, y: number];

const COS_30 = Math.sqrt(3) / 2;

/** From the piece to the paper: length runs right and up, width left and up, thickness straight up. */
export function toPaper([x, y, z]: SpacePoint, scale = 1): PaperPoint {
  return [(x - y) * COS_30 * scale, -((x + y) / 2 + z) * scale];
}

function round(value: number): string {
  return String(Math.round(value * 100) / 100);
}

/** The `d` of a path through points of the paper. */
export function pathThrough(points: readonly PaperPoint[], closed = false): string {
  const steps = points.map(([x, y], index) => `${index === 0 ? 'M' : 'L'}${round(x)} ${round(y)}`);
  return steps.join('') + (closed ? 'Z' : '');
}
