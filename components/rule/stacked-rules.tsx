import { lengthInWords } from '@/components/ui/length-in-words';
import { lengthParts } from '@/components/ui/length-parts';
import type { Length } from '@/lib/length';
import type { SizeRule } from '@/lib/scoring';
import { differingStretches } from './price-differences';
import { dearest, type PriceStep, priceSteps } from './price-steps';
import { RuleNumber } from './rule-number';
import { graduationsOf, placeOf, type RuleScale, tickLength } from './rule-scale';
import { RuleStair } from './rule-stair';
import { ruleSummary } from './rule-summary';
import { risePerPoint, treadsByEdge } from './stairs';

export interface StackedRule {
  id: string;
  label: string;
  note?: string;
  rule: SizeRule;
  margin: Length;
}

interface StackedRulesProps extends RuleScale {
  rules: readonly StackedRule[];
  variant?: 'wide' | 'phone';
  className?: string;
}

const CUTS = {
  wide: {
    width: 1000,
    margin: 140,
    row: 92,
    head: 62,
    lift: 0,
    number: 24,
    price: 18,
    perPoint: 13,
    limit: 66,
  },
  phone: {
    width: 358,
    margin: 0,
    row: 92,
    head: 46,
    lift: 26,
    number: 17,
    price: 14,
    perPoint: 9,
    limit: 44,
  },
};

/** Narrower stretches come of unequal reading margins, which are told in words. */
const NARROWEST_WASH = 8;

/** Several price lists under one scale; where they do not agree the ground is washed. */
export function StackedRules({ rules, variant = 'wide', className, ...scale }: StackedRulesProps) {
  const cut = CUTS[variant];
  const lists = rules.map((each) => ({ ...each, steps: priceSteps(each.rule, each.margin) }));
  const [left, right] = [cut.margin, cut.width - 1];
  const pitch = (right - left) / (2 * scale.span + 1);
  const centre = (left + right) / 2;
  const frame = { left, right, centre, pitch };
  const height = cut.head + rules.length * cut.row;
  const most = Math.max(...lists.map((each) => dearest(each.steps)), 0);
  const rise = risePerPoint(most, cut.perPoint, cut.limit);
  const reach = Math.floor((scale.span + 0.5) * scale.graduation);
  const words = lists.map((each) =>
    ruleSummary({ ...scale, rule: each.rule, steps: each.steps, label: each.label }),
  );
  const washes = differingStretches(
    lists.map((each) => each.steps),
    reach,
  );
  return (
    <svg
      viewBox={`0 0 ${cut.width} ${height + 2}`}
      role="img"
      aria-label={`Target ${lengthInWords(scale.target, scale.unit)}. ${words.join(' ')}`}
      className={className ?? 'block h-auto w-full'}
    >
      <rect x={left} y={cut.head} width={right - left} height={height - cut.head} className="fill-plate" />
      {washes.map((wash) => {
        const from = Math.max(left, placeOf(wash.from, scale, centre, pitch));
        const to = Math.min(right, placeOf(wash.to, scale, centre, pitch));
        if (to - from < NARROWEST_WASH) return null;
        return (
          <rect
            key={wash.from}
            x={from}
            y={cut.head}
            width={to - from}
            height={height - cut.head}
            className="fill-act-wash"
          />
        );
      })}
      <Scale {...{ scale, centre, pitch, head: cut.head, height, size: cut.number }} />
      {lists.map((each, index) => (
        <RuleRow
          key={each.id}
          rule={each}
          top={cut.head + index * cut.row}
          {...{ cut, rise, scale, frame, phone: variant === 'phone' }}
        />
      ))}
      <path
        d={`M${left} ${cut.head}V${height}H${right}V${cut.head}`}
        className="fill-none stroke-ink [stroke-width:var(--pen-outline)]"
      />
      <path d={`M${left} ${cut.head}H${right}`} className="stroke-ink [stroke-width:var(--pen-edge)]" />
    </svg>
  );
}

interface RuleRowProps {
  rule: StackedRule & { steps: readonly PriceStep[] };
  top: number;
  cut: (typeof CUTS)['wide'];
  rise: number;
  scale: RuleScale;
  frame: { left: number; right: number; centre: number; pitch: number };
  phone: boolean;
}

function RuleRow({ rule, top, cut, rise, scale, frame, phone }: RuleRowProps) {
  const foot = top + cut.row;
  return (
    <g>
      <RuleStair
        treads={treadsByEdge(rule.steps, scale, frame)}
        foot={foot}
        rise={rise}
        priceSize={cut.price}
        toneDepth={cut.perPoint}
        avoid={frame.centre}
      />
      <path
        d={`M${frame.left} ${foot}H${frame.right}`}
        className="stroke-ink [stroke-width:var(--pen-inside)]"
      />
      <text
        x={phone ? 6 : 0}
        y={phone ? top + 18 : top + 44}
        fontSize={phone ? 15 : 18}
        className="fill-ink font-[640]"
      >
        {rule.label}
        {rule.note ? (
          <tspan
            {...(phone ? { dx: 8 } : { x: 0, dy: 20 })}
            fontSize={phone ? 13 : 15}
            className="fill-ink-2 font-[460]"
          >
            {rule.note}
          </tspan>
        ) : null}
      </text>
    </g>
  );
}

interface ScaleProps {
  scale: RuleScale;
  centre: number;
  pitch: number;
  head: number;
  height: number;
  size: number;
}

function Scale({ scale, centre, pitch, head, height, size }: ScaleProps) {
  const every = [1, 2, 4].find((each) => each * pitch >= size * 3.2) ?? 8;
  return (
    <g>
      {graduationsOf(scale).map((column) => {
        const x = centre + column.step * pitch;
        const isTarget = column.step === 0;
        const tick = isTarget ? 26 : tickLength(Math.abs(column.deviation), scale.unit) * 0.34;
        return (
          <g key={column.step}>
            <path
              d={`M${x} ${head}v${-tick}`}
              className={
                isTarget
                  ? 'stroke-act [stroke-width:var(--pen-edge)]'
                  : 'stroke-ink [stroke-width:var(--pen-outline)]'
              }
            />
            {column.step % every === 0 ? (
              <RuleNumber
                parts={lengthParts(isTarget ? scale.target : column.deviation, scale.unit, {}, !isTarget)}
                x={x}
                baseline={head - 32}
                size={isTarget ? size * 1.15 : size}
                className={isTarget ? 'fill-act' : 'fill-ink'}
              />
            ) : null}
          </g>
        );
      })}
      <path
        d={`M${centre} ${head}V${height}`}
        strokeDasharray="12 3 2 3"
        className="stroke-act [stroke-width:var(--pen-inside)]"
      />
    </g>
  );
}
