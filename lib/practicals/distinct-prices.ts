import { AXES, type Axis, type Rubric, type SizeRule } from '@/lib/scoring';

export interface PricedSize {
  lineId: string;
  axis: Axis;
}

/** One price, and every size that has it. */
export interface DistinctPrice {
  rule: SizeRule;
  sizes: PricedSize[];
  /** "every size", "every width", "length of base and end". */
  label: string;
}

/** The prices of a rubric, each once, in the order in which its cut list comes to them. */
export function distinctPrices(rubric: Rubric): DistinctPrice[] {
  const groups = new Map<string, { rule: SizeRule; sizes: PricedSize[] }>();
  for (const line of rubric.lines) {
    for (const axis of AXES) {
      const rule = line.sizes[axis];
      const key = ruleKey(rule);
      const group = groups.get(key) ?? { rule, sizes: [] };
      group.sizes.push({ lineId: line.id, axis });
      groups.set(key, group);
    }
  }
  return [...groups.values()].map((group) => ({ ...group, label: labelOf(rubric, group.sizes) }));
}

export function samePrice(a: SizeRule, b: SizeRule): boolean {
  return ruleKey(a) === ruleKey(b);
}

function ruleKey({ over, under, beyondOver, beyondUnder, cap }: SizeRule): string {
  const side = (bands: SizeRule['over']) => bands.map(({ within, lose }) => [within, lose]);
  return JSON.stringify([side(over), side(under), beyondOver, beyondUnder, cap]);
}

function labelOf(rubric: Rubric, sizes: readonly PricedSize[]): string {
  if (sizes.length === rubric.lines.length * AXES.length) return 'every size';
  const byAxis = AXES.flatMap((axis) => {
    const lines = rubric.lines.filter(({ id }) =>
      sizes.some((size) => size.lineId === id && size.axis === axis),
    );
    if (lines.length === 0) return [];
    return [lines.length === rubric.lines.length ? `every ${axis}` : `${axis} of ${listed(lines)}`];
  });
  return byAxis.join('; ');
}

function listed(lines: readonly { label: string }[]): string {
  const labels = lines.map(({ label }) => label);
  const last = labels.pop() ?? '';
  return labels.length > 0 ? `${labels.join(', ')} and ${last}` : last;
}
