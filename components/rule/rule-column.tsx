import { classNames } from '@/components/ui/class-names';
import { lengthParts } from '@/components/ui/length-parts';
import { pointsAsText } from '@/components/ui/points-text';
import type { Unit } from '@/lib/length';
import type { Points } from '@/lib/scoring';
import { numberFits, type RuleLayout } from './rule-layout';
import { RuleNumber } from './rule-number';
import { type Graduation, tickLength } from './rule-scale';

interface RuleColumnProps {
  column: Graduation;
  layout: RuleLayout;
  unit: Unit;
  pressed: boolean;
  /** At the bench each column carries its price and how high the stair stands there. */
  price?: { lose: Points; height: number };
}

/** One graduation: its tick, its number, how far it is from the target, at the bench its price. */
export function RuleColumn({ column, layout, unit, pressed, price }: RuleColumnProps) {
  const { edge, foot, pitch, number, step } = layout;
  const x = layout.centre + column.step * pitch;
  const isTarget = column.step === 0;
  const parts = lengthParts(column.ticks, unit);
  const numbered = column.step % layout.numberEvery === 0 && numberFits(parts, x, layout);
  const tone = pressed ? 'fill-on-act text-on-act' : isTarget ? 'fill-act text-act' : 'fill-ink text-ink';
  return (
    <g>
      {pressed ? (
        <rect x={x - pitch / 2} y={edge} width={pitch} height={foot - edge} className="fill-act" />
      ) : null}
      <Ticks {...{ x, isTarget, pressed, layout }} length={tickLength(column.ticks, unit)} />
      {numbered ? (
        <RuleNumber
          parts={parts}
          x={x}
          baseline={edge + number.baseline}
          size={isTarget && !layout.far ? number.size * 1.15 : number.size}
          stacked={number.stacked}
          halo={layout.knives && !isTarget}
          className={tone}
        />
      ) : null}
      {step && numbered ? <StepText {...{ column, unit, x, layout, pressed }} /> : null}
      {price ? (
        <text
          x={x}
          y={foot - price.height - layout.price.size * 0.28}
          fontSize={layout.price.size}
          className={classNames(
            'tnum [text-anchor:middle]',
            pressed ? 'fill-on-act' : price.lose > 0 ? 'fill-ink' : 'fill-ink-2',
            price.lose > 0 ? 'font-[640]' : 'font-[480]',
          )}
        >
          {pointsAsText(price.lose)}
        </text>
      ) : null}
    </g>
  );
}

interface TicksProps {
  x: number;
  isTarget: boolean;
  pressed: boolean;
  length: number;
  layout: RuleLayout;
}

const TARGET_TICK = 54;
const BOUND_TICK = 12;

function Ticks({ x, isTarget, pressed, length, layout: { edge, pitch, tickScale } }: TicksProps) {
  const line = pressed ? 'stroke-on-act' : isTarget ? 'stroke-act' : 'stroke-ink';
  return (
    <>
      <path
        d={`M${x} ${edge}v${(isTarget ? TARGET_TICK : length) * tickScale}`}
        className={classNames(
          line,
          isTarget ? '[stroke-width:var(--pen-cursor)]' : '[stroke-width:calc(var(--pen-outline)*1.25)]',
        )}
      />
      <path
        d={`M${x + pitch / 2} ${edge}v${BOUND_TICK * tickScale}`}
        className="stroke-ink [stroke-width:var(--pen-inside)]"
      />
    </>
  );
}

interface StepTextProps {
  column: Graduation;
  unit: Unit;
  x: number;
  layout: RuleLayout;
  pressed: boolean;
}

function StepText({ column, unit, x, layout: { step, edge, far }, pressed }: StepTextProps) {
  if (!step) return null;
  if (column.step !== 0) {
    return (
      <RuleNumber
        parts={lengthParts(column.deviation, unit, {}, true)}
        x={x}
        baseline={edge + step.baseline}
        size={step.size}
        className={classNames('font-[480]', pressed ? 'fill-on-act' : 'fill-ink-2')}
      />
    );
  }
  return (
    <text
      x={x}
      y={edge + step.baseline}
      fontSize={far ? step.size * 0.72 : step.size * 0.9}
      className={classNames('font-[620] [text-anchor:middle]', pressed ? 'fill-on-act' : 'fill-act')}
    >
      target
    </text>
  );
}
