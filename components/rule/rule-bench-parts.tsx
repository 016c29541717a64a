import { pointsAsText } from '@/components/ui/points-text';
import type { Length } from '@/lib/length';
import type { PriceStep, Side } from './price-steps';
import { placeOnFace, type RuleLayout } from './rule-layout';
import type { RuleScale } from './rule-scale';
import { RuleStair } from './rule-stair';
import { priceBeyond } from './stairs';

const LINES = [0.2, 0.42, 0.63, 0.86];

function grainLine(from: number, to: number, y: number, turn: number): string {
  const parts = [`M${from} ${y}`];
  for (let x = from, wave = turn; x < to; x += 110, wave++) {
    const end = Math.min(to, x + 110);
    const sway = (wave % 2 === 0 ? 1 : -1) * (1.5 + turn);
    parts.push(`Q${(x + end) / 2} ${y + sway} ${end} ${y}`);
  }
  return parts.join('');
}

/** The piece on the rule from the left: its end is the pointer, dashed at the target until it is read. */
export function PieceStrip(props: { layout: RuleLayout; scale: RuleScale; reading: Length | null }) {
  const { layout, scale, reading } = props;
  const { centre, edge, width } = layout;
  const end = reading === null ? centre : placeOnFace(reading - scale.target, scale, layout);
  const top = 2;
  return (
    <g>
      <svg x={0} y={0} width={width} height={edge} aria-hidden="true" className="overflow-hidden">
        <g
          className="motion-safe:transition-transform motion-safe:duration-[120ms]"
          style={{ transform: `translateX(${end - centre}px)` }}
        >
          <rect x={-width} y={top} width={centre + width} height={edge} className="fill-plate" />
          <path
            d={LINES.map((share, turn) =>
              grainLine(-width / 2, centre - 14, top + share * (edge - top), turn),
            ).join('')}
            className="fill-none stroke-hair [stroke-width:var(--pen-inside)]"
          />
          <path d={`M${-width} ${top}H${centre}`} className="stroke-ink [stroke-width:var(--pen-outline)]" />
          <path
            d={`M${centre} ${top}V${edge}`}
            strokeDasharray={reading === null ? '4 3' : undefined}
            className="stroke-ink [stroke-width:var(--pen-outline)]"
          />
        </g>
      </svg>
      <g fontSize={20} className="font-[560] fill-ink [text-anchor:middle]" strokeLinejoin="round">
        <text
          x={layout.left + layout.pitch * 2}
          y={edge - 11}
          strokeWidth={10}
          paintOrder="stroke"
          className="stroke-plate"
        >
          − under
        </text>
        <text
          x={layout.right - layout.pitch * 2}
          y={edge - 11}
          strokeWidth={10}
          paintOrder="stroke"
          className="stroke-sheet"
        >
          over +
        </text>
      </g>
    </g>
  );
}

interface FarProps {
  layout: RuleLayout;
  steps: readonly PriceStep[];
  scale: RuleScale;
  rise: number;
  showPrices: boolean;
}

/** What lies past the shown stretch, at each end: it opens the keypad. */
export function FarColumns(props: FarProps) {
  return (
    <g className="[text-anchor:middle]">
      <FarColumn {...props} side="under" />
      <FarColumn {...props} side="over" />
    </g>
  );
}

function FarColumn({ layout, steps, scale, rise, showPrices, side }: FarProps & { side: Side }) {
  const { edge, foot, pitch, price } = layout;
  const left = side === 'under' ? layout.left - pitch : layout.right;
  const x = left + pitch / 2;
  const [least, most] = priceBeyond(steps, side, scale.span * scale.graduation);
  const words = least === most ? pointsAsText(most) : `${pointsAsText(least)} to ${pointsAsText(most)}`;
  return (
    <g>
      {showPrices ? (
        <>
          <RuleStair
            treads={[{ left, right: left + pitch, lose: most, side }]}
            foot={foot}
            rise={rise}
            toneDepth={price.perPoint}
          />
          <text
            x={x}
            y={foot - (most / 100) * rise - price.size * 0.28}
            fontSize={price.size}
            className="tnum fill-ink font-[640]"
          >
            {words}
          </text>
        </>
      ) : null}
      <text x={x} y={edge + 84} fontSize={36} className="fill-ink font-[600] font-stretch-[82%]">
        far
      </text>
      <text x={x} y={edge + 108} fontSize={20} className="fill-ink-2 font-[480]">
        {side}
      </text>
    </g>
  );
}

/** The rule cut short: a break line at each end of the stretch that is to scale. */
export function BreakLines({ layout: { left, right, edge, foot } }: { layout: RuleLayout }) {
  return (
    <g>
      {[left, right].map((x) => {
        const d = `M${x} ${edge - 8}V${edge + 22}L${x - 9} ${edge + 31}L${x + 9} ${edge + 43}L${x} ${edge + 52}V${foot + 4}`;
        return (
          <g key={x} className="fill-none" strokeLinejoin="round">
            <path d={d} className="stroke-sheet" strokeWidth={6} />
            <path
              d={d}
              transform="translate(-2.5 0)"
              className="stroke-ink [stroke-width:var(--pen-inside)]"
            />
            <path
              d={d}
              transform="translate(2.5 0)"
              className="stroke-ink [stroke-width:var(--pen-inside)]"
            />
          </g>
        );
      })}
    </g>
  );
}
