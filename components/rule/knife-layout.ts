import type { Length } from '@/lib/length';
import type { Side } from './price-steps';
import { layOutRule, placeOnFace, type RuleLayout, type RuleVariant } from './rule-layout';
import type { RuleScale } from './rule-scale';

/** A band's edge on the rule: `within` away from the target, on one side. */
export interface KnifeEdge {
  side: Side;
  within: Length;
  /** The edge being moved. */
  inHand?: boolean;
  /** Lying on a neighbour: let go there, its band is taken out. */
  onNeighbour?: boolean;
}

/** A marking knife, in the px of its drawing: its flat side stands at x, its tab lies outwards of it. */
export interface PlacedKnife {
  edge: KnifeEdge;
  x: number;
  tab: { x: number; y: number; width: number; height: number };
  size: number;
}

interface TabCut {
  width: number;
  height: number;
  size: number;
  /** From the lowest tab to the edge of the rule. */
  drop: number;
}

const TABS: Record<RuleVariant, TabCut> = {
  bench: { width: 62, height: 30, size: 23, drop: 24 },
  wide: { width: 62, height: 32, size: 23, drop: 24 },
  card: { width: 52, height: 30, size: 20, drop: 18 },
  phone: { width: 42, height: 32, size: 17, drop: 12 },
};
const TIER_GAP = 4;
const LINE_ROOM = 10;
const MOST_TIERS = 4;

/** The rule face of the editor: its layout, with as much head as its knives need, and where each knife stands. */
export function layOutKnives(
  variant: RuleVariant,
  scale: RuleScale,
  edges: readonly KnifeEdge[],
): { layout: RuleLayout; knives: PlacedKnife[] } {
  const cut = TABS[variant];
  const flat = layOutRule(variant, scale, 0);
  const tiers = tierOf(edges, (edge) => placeOnFace(deviationOf(edge), scale, flat), cut.width);
  const rows = Math.max(0, ...tiers) + 1;
  const head = rows * (cut.height + TIER_GAP) - TIER_GAP + cut.drop + LINE_ROOM;
  const layout = layOutRule(variant, scale, head);
  const knives = edges.map((edge, index) => {
    const x = placeOnFace(deviationOf(edge), scale, layout);
    const y = layout.edge - cut.drop - cut.height - (tiers[index] ?? 0) * (cut.height + TIER_GAP);
    const { width, height, size } = cut;
    return { edge, x, tab: { x: edge.side === 'under' ? x - width : x, y, width, height }, size };
  });
  return { layout, knives };
}

export function deviationOf({ side, within }: Pick<KnifeEdge, 'side' | 'within'>): Length {
  return side === 'under' ? -within : within;
}

/** An inner tab hangs above the outer knives that it would cover; past four tiers they overlap. */
function tierOf(edges: readonly KnifeEdge[], place: (edge: KnifeEdge) => number, width: number): number[] {
  const tiers = edges.map(() => 0);
  const outwards = edges
    .map((edge, index) => ({ edge, index }))
    .sort((a, b) => b.edge.within - a.edge.within);
  for (const { edge, index } of outwards) {
    const covered = outwards.filter(
      (other) =>
        other.edge.side === edge.side &&
        other.edge.within > edge.within &&
        Math.abs(place(other.edge) - place(edge)) < width + 2,
    );
    const above = Math.max(-1, ...covered.map((other) => tiers[other.index] ?? 0)) + 1;
    tiers[index] = Math.min(MOST_TIERS - 1, above);
  }
  return tiers;
}
