import { chancePricedNext, type ReadBand } from '@/lib/agreement';
import type { Length } from '@/lib/length';
import type { Points, Rubric, SizeRule } from '@/lib/scoring';
import { lengthAsTyped } from './as-typed';
import { distinctPrices } from './distinct-prices';
import type { RubricFinding } from './place-findings';
import { type ShopInstrument, shopInstruments, WORK_SPREAD } from './shop-instruments';

export type Side = 'over' | 'under';

type Reading = Pick<Rubric, 'unit' | 'margin' | 'readTo'>;

/** How often an instrument alone prices a part of this band in the next one. */
export interface BandChance {
  side: Side;
  index: number;
  outer: Length;
  /** By instrument; null where the next band costs the same, or the work never gets so far. */
  chances: Record<ShopInstrument['id'], number | null>;
}

/** A chance that a teacher should hear of. */
const LARGE = 0.1;

/**
 * For each band of a price and each instrument, the chance that a part truly within the band reads so far off that it is
 * priced in the next: past the band's edge and its reading margin, or where deviations are rounded, past the last reading
 * that is rounded to within it. Parts are taken to spread normally about the target. Pure.
 */
export function bandChances(rule: SizeRule, reading: Reading): BandChance[] {
  return (['under', 'over'] as const).flatMap((side) =>
    rule[side].map(({ within }, index) => {
      const inner = rule[side][index - 1]?.within ?? 0;
      const band = { inner, outer: within, edge: edgeOf(within, reading) };
      const isDearer = priceOf(rule, side, index + 1) > priceOf(rule, side, index);
      const chance = ({ uncertainty }: ShopInstrument) =>
        isDearer && inner < within ? rememberedChance(uncertainty, band) : null;
      const [ruler, caliper] = shopInstruments(reading.unit).map(chance);
      return { side, index, outer: within, chances: { rule: ruler ?? null, caliper: caliper ?? null } };
    }),
  );
}

const remembered = new Map<string, number | null>();
const MOST_REMEMBERED = 1000;

/** A long cut list asks for the same few bands at every key press. */
function rememberedChance(u: number, band: ReadBand): number | null {
  const key = `${u} ${band.inner} ${band.outer} ${band.edge}`;
  const known = remembered.get(key);
  if (known !== undefined) return known;
  if (remembered.size >= MOST_REMEMBERED) remembered.clear();
  const chance = chancePricedNext({ sd: WORK_SPREAD, u }, band);
  remembered.set(key, chance);
  return chance;
}

/** The last reading that is still priced in the band; rounding goes to the nearest, a tie toward the target. */
function edgeOf(within: Length, { margin, readTo }: Reading): number {
  const edge = within + margin;
  return readTo === null ? edge : (Math.floor(edge / readTo) + 0.5) * readTo;
}

function priceOf(rule: SizeRule, side: Side, index: number): Points {
  const beyond = side === 'over' ? rule.beyondOver : rule.beyondUnder;
  return Math.min(rule[side][index]?.lose ?? beyond, rule.cap ?? Number.POSITIVE_INFINITY);
}

/** "fewer than 1 in 1000", "about 4 in 1000", "about 12 in 100". */
export function sayChance(chance: number): string {
  return chance < 0.001 ? 'fewer than 1 in 1000' : `about ${countOf(chance)}`;
}

/** The same in a cell: "< 1 in 1000", "4 in 1000". */
export function chanceInShort(chance: number): string {
  return chance < 0.001 ? '< 1 in 1000' : countOf(chance);
}

function countOf(chance: number): string {
  return chance < 0.0095 ? `${Math.round(chance * 1000)} in 1000` : `${Math.round(chance * 100)} in 100`;
}

export function isLarge(chance: number | null): boolean {
  return chance !== null && chance > LARGE;
}

/** Bands that an instrument cannot tell from the next often enough, at every size that is priced so. */
export function reviewInstruments(rubric: Rubric): RubricFinding[] {
  return distinctPrices(rubric).flatMap(({ rule, sizes }) => {
    const text = blurredText(bandChances(rule, rubric), rubric);
    return text === null ? [] : sizes.map((size) => ({ code: 'instrument-blurs-band', ...size, text }));
  });
}

function blurredText(bands: readonly BandChance[], { unit }: Reading): string | null {
  const worst = (id: ShopInstrument['id']) =>
    bands
      .filter(({ chances }) => isLarge(chances[id]))
      .sort((a, b) => (b.chances[id] ?? 0) - (a.chances[id] ?? 0))[0];
  const [ruler] = shopInstruments(unit);
  const byRule = worst('rule');
  if (!byRule || !ruler) return null;
  const length = (ticks: Length) => `${lengthAsTyped(ticks, unit)} ${unit}`;
  const byCaliper = worst('caliper');
  const told =
    `Read with a rule (${length(ruler.graduation)}), ${sayChance(byRule.chances.rule ?? 0)} parts truly within ` +
    `${length(byRule.outer)}${sideWords(bands, byRule)} are priced in the next band`;
  return byCaliper
    ? `${told}; even with a caliper ${sayChance(byCaliper.chances.caliper ?? 0)}. Widen the band, or the reading margin.`
    : `${told}. Have this size read with a caliper, or widen the band or the reading margin.`;
}

/** Names the side, unless the other one is just the same. */
function sideWords(bands: readonly BandChance[], { side, outer, chances }: BandChance): string {
  const isAlike = bands.some(
    (other) => other.side !== side && other.outer === outer && other.chances.rule === chances.rule,
  );
  return isAlike ? '' : ` ${side}`;
}
