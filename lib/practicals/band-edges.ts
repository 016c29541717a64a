import { type Length, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { Band, SizeRule } from '@/lib/scoring';
import { lengthAsTyped, pointsAsTyped } from './as-typed';
import type { DraftSide } from './draft';

/** The rule that an edge is moved on: its graduation, and how many of them can be seen on one side. */
export interface EdgeScale {
  graduation: Length;
  span: number;
}

/** Where an edge comes to stand, or which neighbour it was laid onto. */
export type EdgePlace = { within: Length } | { onto: number };

const MOST_BANDS = 20;
const MOST_POINTS = 100_000;
const ONE_POINT = 100;

/** How many graduations a coarser step takes: 1/16 on a rule in 32nds, a millimetre on halves, a half on tenths. */
export function coarserStep(graduation: Length, unit: Unit): number {
  return unit === 'mm' && graduation === TICKS_PER_MM / 10 ? 5 : 2;
}

/**
 * Where an edge drawn to a distance from the target comes to stand: on the nearest graduation in sight. It stops at
 * its neighbours and pushes none; drawn as far as one, it lies on it, which takes the band between them out when it is
 * let go. The first edge stops at the target. Pure.
 *
 * @example drawEdge(bands, 1, 0, scale) // { onto: 0 } when band 0 reaches further than 0
 */
export function drawEdge(
  bands: readonly Band[],
  index: number,
  distance: Length,
  { graduation, span }: EdgeScale,
): EdgePlace {
  const within = Math.min(span, Math.max(0, Math.round(distance / graduation))) * graduation;
  const after = bands[index + 1];
  const before = bands[index - 1];
  if (after && within >= after.within) return { onto: index + 1 };
  if (before && within <= before.within) return { onto: index - 1 };
  return { within };
}

/**
 * Where an edge stands after a key: on the next graduation, or the next coarser one, outwards or inwards. It stops one
 * graduation short of a neighbour and at the end of the rule. A distance that lies on none goes to the next one. Pure.
 */
export function stepEdge(
  bands: readonly Band[],
  index: number,
  steps: number,
  { graduation, span }: EdgeScale,
): Length {
  const now = bands[index]?.within ?? 0;
  const unit = graduation * Math.abs(steps);
  const next = steps > 0 ? (Math.floor(now / unit) + 1) * unit : (Math.ceil(now / unit) - 1) * unit;
  return holdEdge(bands, index, next, { graduation, span });
}

/** The nearest an edge can come to a distance without touching a neighbour; where there is no room, it stays. */
export function holdEdge(
  bands: readonly Band[],
  index: number,
  distance: Length,
  { graduation, span }: EdgeScale,
): Length {
  const before = bands[index - 1];
  const after = bands[index + 1];
  const least = before ? (Math.floor(before.within / graduation) + 1) * graduation : 0;
  const most = after ? (Math.ceil(after.within / graduation) - 1) * graduation : span * graduation;
  if (least > most) return bands[index]?.within ?? 0;
  return Math.min(most, Math.max(least, distance));
}

/** A side with the band between an edge and the neighbour it was laid onto taken out; the inner price lives on. */
export function joinBands(side: DraftSide, index: number, onto: number): DraftSide {
  const bands = side.bands.map((band) => ({ ...band }));
  const [kept, gone] = [Math.min(index, onto), Math.max(index, onto)];
  const band = bands[kept];
  const neighbour = bands[onto];
  if (!band || !neighbour || kept === gone) return side;
  band.within = neighbour.within;
  bands.splice(gone, 1);
  return { ...side, bands };
}

/** A side without one of its edges: its stretch is priced as the next one. The free band stays. */
export function takeOutBand(side: DraftSide, index: number): DraftSide {
  return index === 0 ? side : { ...side, bands: side.bands.filter((_, at) => at !== index) };
}

/**
 * A side with one more edge. Past the last band, the stair gets one more step: the new band costs what lay past the
 * last, and what lies past it now costs as much more again as the step before it (1 point where there was none). Within a band, it
 * is split, and the inner part, or the outer one of the free band, costs half way between its neighbours. Null where an
 * edge stands there already or no more bands fit. `read` is what the side says. Pure; points in whole hundredths, rounded down.
 */
export function addEdge(
  side: DraftSide,
  read: { bands: readonly Band[]; beyond: number },
  at: Length,
  unit: Unit,
): DraftSide | null {
  const { bands, beyond } = read;
  if (at <= 0 || bands.length >= MOST_BANDS || bands.some(({ within }) => within === at)) return null;
  const place = bands.findIndex(({ within }) => within > at);
  const within = lengthAsTyped(at, unit);
  const lose = (points: number) => pointsAsTyped(Math.min(MOST_POINTS, points));
  const next = side.bands.map((band) => ({ ...band }));
  if (place === -1) {
    const step = beyond - (bands.at(-1)?.lose ?? 0) || ONE_POINT;
    return { bands: [...next, { within, lose: lose(beyond) }], beyond: lose(beyond + step) };
  }
  const split = bands[place];
  if (place > 0 && split) {
    const half = Math.floor(((bands[place - 1]?.lose ?? 0) + split.lose) / 2);
    next.splice(place, 0, { within, lose: lose(half) });
  } else if (split) {
    const half = Math.floor((bands[1]?.lose ?? beyond) / 2);
    next.splice(0, 1, { within, lose: '0' }, { within: next[0]?.within ?? within, lose: lose(half) });
  }
  return { ...side, bands: next };
}

/** A band's own middle, on a graduation where one lies inside it; null where there is no room. */
export function middleOfBand(bands: readonly Band[], index: number, graduation: Length): Length | null {
  const from = bands[index - 1]?.within ?? 0;
  const to = bands[index]?.within ?? 0;
  const onRule = Math.round((from + to) / 2 / graduation) * graduation;
  if (onRule > from && onRule < to) return onRule;
  const exact = Math.round((from + to) / 2);
  return exact > from && exact < to ? exact : null;
}

/** One side of a price, as a stair. */
export function sideOfRule(
  rule: SizeRule,
  side: 'over' | 'under',
): { bands: readonly Band[]; beyond: number } {
  return side === 'over'
    ? { bands: rule.over, beyond: rule.beyondOver }
    : { bands: rule.under, beyond: rule.beyondUnder };
}
