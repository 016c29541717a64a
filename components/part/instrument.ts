import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { Axis } from '@/lib/scoring';
import type { SpacePoint } from './grain';
import { type PaperPoint, pathThrough, toPaper } from './isometric';
import type { PartLayout } from './part-layout';

export type Instrument = 'caliper' | 'rule';

/** How far the usual school caliper opens. */
export const CALIPER_REACH: Record<Unit, Length> = { in: 6 * TICKS_PER_INCH, mm: 150 * TICKS_PER_MM };

/** What a size is measured with: a caliper as far as it opens, a rule past that. */
export function instrumentFor(target: Length, unit: Unit, reach: Length = CALIPER_REACH[unit]): Instrument {
  return target <= reach ? 'caliper' : 'rule';
}

/** Where to hold it, in two short lines. */
export function howToHold(axis: Axis, instrument: Instrument): [string, string] {
  if (instrument === 'rule') {
    if (axis === 'length') return ['rule along the grain,', 'at mid-width'];
    return axis === 'width' ? ['rule across the grain,', 'at mid-length'] : ['rule upright,', 'near the end'];
  }
  if (axis === 'length') return ['caliper along the grain,', 'at mid-width'];
  return axis === 'width'
    ? ['caliper across the grain,', 'at mid-length']
    : ['caliper on both faces,', 'in from the end'];
}

export interface InstrumentDrawing {
  /** What the piece hides in part: drawn before it. */
  behind: string[];
  /** What lies over the piece. */
  before: string[];
  /** Graduations, drawn thin. */
  fine: string;
  /** Where a leader from the note ends. */
  grip: PaperPoint;
}

type Place = (along: number, out: number) => PaperPoint;

interface Plane {
  /** Along the size in px from its first end, and out from the piece in px. */
  at: Place;
  size: number;
  /** How deep the jaws may reach past the surface. */
  depth: number;
  /** The size's first end is on the hidden side of the piece. */
  firstHidden: boolean;
}

const OUT_OF_FACE: Record<Axis, PaperPoint> = {
  width: [0, -1],
  length: [0, -1],
  thickness: [Math.sqrt(3) / 2, 0.5],
};
const ALONG: Record<Axis, SpacePoint> = { length: [1, 0, 0], width: [0, 1, 0], thickness: [0, 0, 1] };

/** The plane the instrument is held in: width at mid-length, length at mid-width, thickness in from the far end. */
function planeFor(axis: Axis, { box, scale, place }: PartLayout): Plane {
  const { length: l, width: w, thickness: t } = box;
  const base: Record<Axis, SpacePoint> = {
    width: [l / 2, 0, t],
    length: [0, w / 2, t],
    thickness: [l * 0.8, 0, 0],
  };
  const origin = place(base[axis]);
  const step = toPaper(ALONG[axis]);
  const out = OUT_OF_FACE[axis];
  const size = box[axis] * scale;
  const deep = axis === 'thickness' ? w : t;
  return {
    at: (along, away) => [
      origin[0] + step[0] * along + out[0] * away,
      origin[1] + step[1] * along + out[1] * away,
    ],
    size,
    depth: Math.min(34, Math.max(16, deep * scale * 0.7)),
    firstHidden: axis === 'thickness',
  };
}

function shape(at: Place, points: readonly PaperPoint[]): string {
  return pathThrough(
    points.map(([along, out]) => at(along, out)),
    true,
  );
}

function marks(at: Place, from: number, to: number, out: number, inward: number): string {
  const lines: string[] = [];
  for (let along = from, nth = 0; along <= to; along += 7, nth++) {
    lines.push(pathThrough([at(along, out), at(along, out + inward * (nth % 5 === 0 ? 8 : 5))]));
  }
  return lines.join('');
}

const BEAM = { low: 8, high: 19 };

function drawCaliper({ at, size, depth, firstHidden }: Plane): InstrumentDrawing {
  const { low, high } = BEAM;
  const fixedJaw = shape(at, [
    [0, -depth],
    [-6, -depth],
    [-19, low],
    [-19, high],
    [0, high],
  ]);
  const slidingJaw = shape(at, [
    [size, -depth],
    [size + 6, -depth],
    [size + 18, low],
    [size, low],
  ]);
  const beam = shape(at, [
    [-19, low],
    [size + 46, low],
    [size + 46, high],
    [-19, high],
  ]);
  const slider = shape(at, [
    [size, low - 4],
    [size + 32, low - 4],
    [size + 32, high + 4],
    [size, high + 4],
  ]);
  return {
    behind: [firstHidden ? fixedJaw : slidingJaw],
    before: firstHidden ? [beam, slider, slidingJaw] : [beam, slider, fixedJaw],
    fine: marks(at, 6, size - 5, low, 1) + marks(at, size + 36, size + 44, low, 1),
    grip: at(size + 16, (low + high) / 2),
  };
}

function drawRule({ at, size }: Plane, flatAt: Place): InstrumentDrawing {
  const wide = 30;
  const blade = shape(flatAt, [
    [0, 0],
    [size + 58, 0],
    [size + 58, wide],
    [0, wide],
  ]);
  return {
    behind: [],
    before: [blade],
    fine: marks(flatAt, 7, size + 52, 0, 1),
    grip: at(size + 40, 6),
  };
}

/** The instrument on the piece, in the right plane for the axis. */
export function drawInstrument(axis: Axis, instrument: Instrument, layout: PartLayout): InstrumentDrawing {
  const plane = planeFor(axis, layout);
  if (instrument === 'caliper') return drawCaliper(plane);
  const lying: Record<Axis, PaperPoint> = {
    length: toPaper([0, 1, 0]),
    width: toPaper([1, 0, 0]),
    thickness: toPaper([1, 0, 0]),
  };
  const across = lying[axis];
  const flatAt: Place = (along, over) => {
    const [x, y] = plane.at(along, 0);
    return [x + across[0] * over, y + across[1] * over];
  };
  return drawRule(plane, flatAt);
}
