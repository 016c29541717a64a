import { classNames } from '@/components/ui/class-names';
import type { Length } from '@/lib/length';
import type { SizeRule } from '@/lib/scoring';
import { type KnifeEdge, layOutKnives } from './knife-layout';
import { KnifeLines, KnifeTabs } from './knife-tabs';
import { dearest, type PriceStep, priceAt, priceSteps } from './price-steps';
import { BreakLines, FarColumns, PieceStrip } from './rule-bench-parts';
import { RuleColumn } from './rule-column';
import { layOutRule, type RuleLayout, type RuleVariant } from './rule-layout';
import { type RulePointer, RulePointers } from './rule-pointers';
import { type Graduation, graduationsOf, type RuleScale } from './rule-scale';
import { RuleStair } from './rule-stair';
import { ruleSummary } from './rule-summary';
import { risePerPoint, treadsByColumn, treadsByEdge } from './stairs';

export interface RuleFaceProps extends RuleScale {
  rule: SizeRule;
  margin: Length;
  /** How it is cut: for the bench's width, a desk's, a card's or a phone's. */
  variant?: RuleVariant;
  pointers?: readonly RulePointer[];
  /** Band edges as marking knives, for the rubric editor. */
  edges?: readonly KnifeEdge[];
  showPrices?: boolean;
  /** Write the price on each step; the editor writes them in fields of its own. */
  showPriceNumbers?: boolean;
  /** The reading just pressed, at the bench. */
  pressed?: Length | null;
  /** What is measured: "end 2, width". Begins what a screen reader says. */
  label?: string;
  className?: string;
}

/** The signature of the product: a rule centred on a target, with the price of every error standing on it. */
export function RuleFace(props: RuleFaceProps) {
  const {
    unit,
    target,
    graduation,
    span,
    variant = 'wide',
    edges,
    showPrices = true,
    pressed = null,
  } = props;
  const scale = { unit, target, graduation, span };
  const laid = edges ? layOutKnives(variant, scale, edges) : null;
  const layout = laid?.layout ?? layOutRule(variant, scale);
  const steps = priceSteps(props.rule, props.margin);
  const columns = graduationsOf(scale);
  const rise = risePerPoint(dearest(steps), layout.price.perPoint, layout.price.limit);
  const priceOf = (column: Graduation) => {
    const lose = priceAt(steps, column.deviation);
    return { lose, height: (lose / 100) * rise };
  };
  return (
    <svg
      viewBox={`0 0 ${layout.width} ${layout.height}`}
      role="img"
      aria-label={ruleSummary({ ...props, steps })}
      className={classNames('block h-auto w-full overflow-visible', props.className)}
    >
      <Ground layout={layout} />
      {layout.far ? <PieceStrip layout={layout} scale={scale} reading={pressed} /> : null}
      {showPrices ? (
        <Prices {...{ layout, scale, steps, columns, rise }} numbers={props.showPriceNumbers ?? true} />
      ) : null}
      {laid ? <KnifeLines {...laid} /> : null}
      {columns.map((column) => (
        <RuleColumn
          key={column.step}
          {...{ column, layout, unit }}
          pressed={pressed === column.ticks}
          price={layout.far && showPrices ? priceOf(column) : undefined}
        />
      ))}
      {layout.far ? <FarColumns {...{ layout, steps, scale, rise, showPrices }} /> : null}
      <Frame layout={layout} />
      {layout.far ? <BreakLines layout={layout} /> : null}
      {laid ? <KnifeTabs {...laid} unit={unit} /> : null}
      <RulePointers pointers={props.pointers ?? []} scale={scale} layout={layout} />
    </svg>
  );
}

function Ground({ layout: { width, edge, foot, centre, pitch } }: { layout: RuleLayout }) {
  return (
    <>
      <rect x={0} y={edge} width={width} height={foot - edge} className="fill-plate" />
      <rect x={centre - pitch / 2} y={edge} width={pitch} height={foot - edge} className="fill-act-wash" />
    </>
  );
}

function Frame({ layout: { width, edge, foot } }: { layout: RuleLayout }) {
  return (
    <g className="fill-none stroke-ink">
      <path d={`M0 ${edge}V${foot}H${width}V${edge}`} className="[stroke-width:var(--pen-outline)]" />
      <path d={`M-1 ${edge}H${width + 1}`} className="[stroke-width:calc(var(--pen-edge)*1.15)]" />
    </g>
  );
}

interface PricesProps {
  layout: RuleLayout;
  scale: RuleScale;
  steps: readonly PriceStep[];
  columns: readonly Graduation[];
  rise: number;
  numbers: boolean;
}

function Prices({ layout, scale, steps, columns, rise, numbers }: PricesProps) {
  const { centre, pitch, price, foot, far } = layout;
  const treads = far
    ? treadsByColumn(steps, columns, (step) => centre + (step - 0.5) * pitch, pitch)
    : treadsByEdge(steps, scale, layout);
  return (
    <RuleStair
      treads={treads}
      foot={foot}
      rise={rise}
      priceSize={far || !numbers ? undefined : price.size}
      toneDepth={price.perPoint}
    />
  );
}
