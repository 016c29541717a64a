import { classNames } from '@/components/ui/class-names';
import { lengthParts } from '@/components/ui/length-parts';
import type { Length } from '@/lib/length';
import type { Side } from './price-steps';
import { placeOnFace, type RuleLayout } from './rule-layout';
import { RuleNumber } from './rule-number';
import type { RuleScale } from './rule-scale';

/** A band's edge on the rule: `within` away from the target, on one side. */
export interface KnifeEdge {
  side: Side;
  within: Length;
  /** The edge being moved. */
  inHand?: boolean;
}

interface KnifeTabsProps {
  edges: readonly KnifeEdge[];
  scale: RuleScale;
  layout: RuleLayout;
}

const TAB = { width: 62, height: 30 };

/** The line each knife strikes through the face. */
export function KnifeLines({ edges, scale, layout }: KnifeTabsProps) {
  return edges.map((edge) => {
    const x = placeOnFace(edge.side === 'under' ? -edge.within : edge.within, scale, layout);
    return (
      <path
        key={`${edge.side}${edge.within}`}
        d={`M${x} ${layout.edge}V${layout.foot}`}
        strokeDasharray={edge.inHand ? undefined : '10 3 2 3'}
        className={classNames(
          'fill-none',
          edge.inHand
            ? 'stroke-act [stroke-width:var(--pen-edge)]'
            : 'stroke-ink [stroke-width:var(--pen-inside)]',
        )}
      />
    );
  });
}

/** Each band edge as a marking knife: flat side on the line, bevel to the waste, its value in the tab. */
export function KnifeTabs({ edges, scale, layout }: KnifeTabsProps) {
  return edges.map((edge) => <KnifeTab key={`${edge.side}${edge.within}`} {...{ edge, scale, layout }} />);
}

function KnifeTab({ edge, scale, layout }: { edge: KnifeEdge; scale: RuleScale; layout: RuleLayout }) {
  const deviation = edge.side === 'under' ? -edge.within : edge.within;
  const x = placeOnFace(deviation, scale, layout);
  const out = edge.side === 'under' ? -1 : 1;
  const top = layout.edge - TAB.height - 24;
  const low = top + TAB.height;
  const far = x + out * TAB.width;
  const blade = `M${x} ${layout.edge}V${top}H${far}V${low}H${x + out * 22}Z`;
  const held = edge.inHand === true;
  return (
    <g>
      <path
        d={blade}
        strokeLinejoin="miter"
        className={classNames(
          '[stroke-width:var(--pen-outline)]',
          held ? 'fill-act stroke-act' : 'fill-plate stroke-ink',
        )}
      />
      {held ? <Arrowheads x={x} far={far} y={top + TAB.height / 2} /> : null}
      <RuleNumber
        parts={lengthParts(deviation, scale.unit, {}, true)}
        x={x + (out * TAB.width) / 2}
        baseline={top + 22}
        size={23}
        className={held ? 'fill-on-act' : 'fill-ink'}
      />
    </g>
  );
}

function Arrowheads({ x, far, y }: { x: number; far: number; y: number }) {
  const [left, right] = [Math.min(x, far), Math.max(x, far)];
  return (
    <path
      d={`M${left - 8} ${y - 8}l-8 8l8 8M${right + 8} ${y - 8}l8 8l-8 8`}
      className="fill-none stroke-act [stroke-width:calc(var(--pen-edge)*0.9)]"
    />
  );
}
