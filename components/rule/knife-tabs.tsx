import { classNames } from '@/components/ui/class-names';
import { lengthParts } from '@/components/ui/length-parts';
import type { Unit } from '@/lib/length';
import { deviationOf, type PlacedKnife } from './knife-layout';
import type { RuleLayout } from './rule-layout';
import { RuleNumber } from './rule-number';

interface KnifeTabsProps {
  knives: readonly PlacedKnife[];
  layout: RuleLayout;
  unit: Unit;
}

const keyOf = ({ edge, x }: PlacedKnife) => `${edge.side}${x}${edge.inHand ?? false}`;

/** The line each knife strikes through the face. */
export function KnifeLines({ knives, layout }: Omit<KnifeTabsProps, 'unit'>) {
  return knives.map((knife) => (
    <path
      key={keyOf(knife)}
      d={`M${knife.x} ${layout.edge}V${layout.foot}`}
      strokeDasharray={knife.edge.inHand ? undefined : '10 3 2 3'}
      className={classNames(
        'fill-none',
        knife.edge.inHand
          ? 'stroke-act [stroke-width:var(--pen-edge)]'
          : 'stroke-ink [stroke-width:var(--pen-inside)]',
      )}
    />
  ));
}

/** Each band edge as a marking knife: flat side on the line, bevel to the waste, its value in the tab. */
export function KnifeTabs({ knives, layout, unit }: KnifeTabsProps) {
  // The knife in hand lies on top of its neighbours.
  const laid = [...knives].sort((a, b) => Number(a.edge.inHand ?? false) - Number(b.edge.inHand ?? false));
  return laid.map((knife) => <KnifeTab key={keyOf(knife)} {...{ knife, layout, unit }} />);
}

function KnifeTab({ knife, layout, unit }: { knife: PlacedKnife; layout: RuleLayout; unit: Unit }) {
  const { edge, x, tab, size } = knife;
  const out = edge.side === 'under' ? -1 : 1;
  const low = tab.y + tab.height;
  const far = x + out * tab.width;
  const bevel = Math.min(layout.edge, low + tab.width * 0.38);
  const blade = `M${x} ${layout.edge}V${tab.y}H${far}V${low}H${x + out * tab.width * 0.35}L${x} ${bevel}Z`;
  const held = edge.inHand === true;
  const leaving = edge.onNeighbour === true;
  return (
    <g>
      <path
        d={blade}
        strokeLinejoin="miter"
        strokeDasharray={leaving ? '6 4' : undefined}
        className={classNames(
          '[stroke-width:var(--pen-outline)]',
          held && !leaving ? 'fill-act stroke-act' : 'fill-plate stroke-ink',
          leaving && 'stroke-act',
        )}
      />
      {held && !leaving ? <Arrowheads x={x} far={far} y={tab.y + tab.height / 2} /> : null}
      {leaving ? (
        <text
          x={x + (out * tab.width) / 2}
          y={tab.y + tab.height * 0.7}
          fontSize={size * 0.82}
          className="fill-act font-[660] [text-anchor:middle]"
        >
          out
        </text>
      ) : (
        <RuleNumber
          parts={lengthParts(deviationOf(edge), unit, {}, true)}
          x={x + (out * tab.width) / 2}
          baseline={tab.y + tab.height * 0.5 + size * 0.34}
          size={size}
          className={held ? 'fill-on-act' : 'fill-ink'}
        />
      )}
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
