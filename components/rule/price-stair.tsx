import type { Length, Unit } from '@/lib/length';
import type { SizeRule } from '@/lib/scoring';
import { dearest, priceSteps } from './price-steps';
import { RuleStair } from './rule-stair';
import { ruleSummary } from './rule-summary';
import { risePerPoint, treadsByEdge } from './stairs';

interface PriceStairProps {
  unit: Unit;
  target: Length;
  rule: SizeRule;
  margin: Length;
  /** The dearest price of the table it stands in, so that stairs can be compared by eye. */
  dearestPoints?: number;
  label?: string;
  className?: string;
}

const WIDTH = 72;
const HEIGHT = 26;
const FOOT = HEIGHT - 2;
const TALLEST = 18;
const PER_POINT = 6;
const CENTRE = WIDTH / 2;
const REACH = 24;

/** A whole price of error in the space of a word. */
export function PriceStair({ unit, target, rule, margin, dearestPoints, label, className }: PriceStairProps) {
  const steps = priceSteps(rule, margin);
  const widest = Math.max(...[...rule.over, ...rule.under].map((band) => band.within), 1);
  const scale = { unit, target, graduation: widest, span: 1 };
  const treads = treadsByEdge(steps, scale, { left: 1, right: WIDTH - 1, centre: CENTRE, pitch: REACH });
  const rise = risePerPoint(Math.max(dearest(steps), dearestPoints ?? 0), PER_POINT, TALLEST);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      role="img"
      aria-label={ruleSummary({ unit, target, rule, steps, label })}
      className={className ?? 'block h-[26px] w-[72px]'}
    >
      <RuleStair treads={treads} foot={FOOT} rise={rise} hatchGap={4.6} toneDepth={TALLEST} />
      <path
        d={`M1 ${FOOT}H${WIDTH - 1}M${CENTRE} 2V${FOOT}`}
        className="stroke-ink [stroke-width:var(--pen-outline)]"
      />
    </svg>
  );
}
