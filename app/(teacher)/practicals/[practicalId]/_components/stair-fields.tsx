'use client';

import { type PointerEvent, useState } from 'react';
import { dearest, priceSteps } from '@/components/rule/price-steps';
import type { RuleLayout } from '@/components/rule/rule-layout';
import { placeOnFace } from '@/components/rule/rule-layout';
import { risePerPoint } from '@/components/rule/stairs';
import { classNames } from '@/components/ui/class-names';
import type { Length } from '@/lib/length';
import { textAt, typeAt } from '@/lib/practicals/draft-paths';
import type { Points, SizeRule } from '@/lib/scoring';
import { useEditor } from './editor-context';
import type { EdgeDesk } from './use-edges';
import type { SizeRuleDesk } from './use-size-rule';

interface StairFieldsProps {
  size: SizeRuleDesk;
  edges: EdgeDesk;
  rule: SizeRule;
  margin: Length;
  layout: RuleLayout;
  name: string;
}

interface Step {
  side: 'over' | 'under';
  /** The field within the price. */
  suffix: string;
  label: string;
  lose: Points;
  left: number;
  right: number;
}

/** A narrower step carries its price without a field; it is typed below. */
const NARROWEST = 25;

const percent = (part: number, whole: number) => `${(part / whole) * 100}%`;

/** The prices on the steps of the stair, each typed where it stands; a press on the stair itself adds an edge. */
export function StairFields({ size, edges, rule, margin, layout, name }: StairFieldsProps) {
  const rise = risePerPoint(dearest(priceSteps(rule, margin)), layout.price.perPoint, layout.price.limit);
  const steps = (['under', 'over'] as const).flatMap((side) =>
    stepsOf(rule, side, size.rule.mirrored, (deviation) => placeOnFace(deviation, edges.scale, layout)),
  );
  return (
    <>
      {size.isOwn ? <StairPress {...{ edges, layout }} /> : null}
      <span
        className="pointer-events-none absolute -translate-x-1/2 text-center leading-none text-ink-2"
        style={placeStyle(layout, layout.centre, 0)}
      >
        0
      </span>
      {steps.map((step) => (
        <StepPrice key={`${step.side}${step.suffix}`} {...{ size, step, layout, name }} rise={rise} />
      ))}
    </>
  );
}

function stepsOf(
  rule: SizeRule,
  side: Step['side'],
  mirrored: boolean,
  place: (deviation: Length) => number,
): Step[] {
  const bands = rule[side];
  const beyond = side === 'over' ? rule.beyondOver : rule.beyondUnder;
  const written = mirrored ? 'over' : side;
  const sign = side === 'under' ? -1 : 1;
  const cap = rule.cap ?? Number.POSITIVE_INFINITY;
  return [...bands.slice(1), null].map((band, at) => {
    const from = place(sign * (bands[at]?.within ?? 0));
    const to = place(band ? sign * band.within : sign * Number.MAX_SAFE_INTEGER);
    return {
      side,
      suffix: band ? `${written}.bands.${at + 1}.lose` : `${written}.beyond`,
      label: band ? `band ${at + 2}` : 'past the last band',
      lose: Math.min(band?.lose ?? beyond, cap),
      left: Math.min(from, to),
      right: Math.max(from, to),
    };
  });
}

function placeStyle(layout: RuleLayout, x: number, height: number) {
  return {
    left: percent(x, layout.width),
    bottom: percent(height + layout.price.size * 0.2, layout.height),
    fontSize: `calc(${layout.price.size / layout.width} * 100cqw)`,
  };
}

interface StepPriceProps {
  size: SizeRuleDesk;
  step: Step;
  layout: RuleLayout;
  name: string;
  rise: number;
}

function StepPrice({ size, step, layout, name, rise }: StepPriceProps) {
  const { desk, errorsAt, setFocused } = useEditor();
  const path = `${size.base}.${step.suffix}`;
  const text = textAt(desk.draft, path);
  const width = step.right - step.left;
  const style = placeStyle(layout, (step.left + step.right) / 2, (step.lose / 100) * rise);
  const look = 'tnum absolute -translate-x-1/2 text-center leading-none font-[640]';
  if (width < NARROWEST || !size.isOwn) {
    return (
      <span aria-hidden className={classNames(look, 'pointer-events-none')} style={style}>
        {text}
      </span>
    );
  }
  return (
    <input
      type="text"
      inputMode="decimal"
      autoComplete="off"
      aria-label={`price on the rule, ${step.side}, ${name}, ${step.label}`}
      aria-invalid={errorsAt(path).length > 0 || undefined}
      value={text}
      onChange={(event) => size.change((each) => typeAt(each, step.suffix, event.target.value))}
      onFocus={(event) => {
        setFocused(path);
        event.target.select();
      }}
      onBlur={() => setFocused(null)}
      className={classNames(
        look,
        'h-[1.4em] min-h-6 border-b border-rule bg-transparent p-0 hover:border-ink focus:border-b-edge focus:border-act focus:bg-plate',
        errorsAt(path).length > 0 && 'border-b-outline border-refuse bg-refuse-wash text-refuse',
      )}
      style={{ ...style, width: percent(Math.min(64, width - 3), layout.width) }}
    />
  );
}

/** The stair as a place to press: where no edge stands yet, one is struck. Keys do the same in the list below. */
function StairPress({ edges, layout }: { edges: EdgeDesk; layout: RuleLayout }) {
  const [ghost, setGhost] = useState<number | null>(null);
  const { graduation, span } = edges.scale;
  const top = layout.foot - Math.min(layout.body * 0.5, layout.price.limit + layout.price.size * 1.5);

  function stepAt(event: { clientX: number; currentTarget: Element }): number | null {
    const box = event.currentTarget.getBoundingClientRect();
    const x = ((event.clientX - box.left) / box.width) * layout.width;
    const step = Math.round((x - layout.centre) / layout.pitch);
    const taken = edges.knives.some(
      ({ side, within }) => (side === 'under' ? -within : within) === step * graduation,
    );
    return step === 0 || taken || Math.abs(step) >= span ? null : step;
  }

  return (
    <>
      {ghost === null ? null : (
        <span
          aria-hidden
          className="pointer-events-none absolute -ml-px border-l-2 border-dashed border-act"
          style={{
            left: percent(layout.centre + ghost * layout.pitch, layout.width),
            top: percent(layout.edge, layout.height),
            bottom: 0,
          }}
        />
      )}
      <button
        type="button"
        tabIndex={-1}
        aria-hidden
        onPointerMove={(event: PointerEvent<HTMLElement>) => {
          if (event.pointerType === 'mouse') setGhost(stepAt(event));
        }}
        onPointerLeave={() => setGhost(null)}
        onClick={(event) => {
          const step = stepAt(event);
          setGhost(null);
          if (step !== null) edges.add(step * graduation);
        }}
        className={classNames('absolute inset-x-0 bottom-0', ghost !== null && 'cursor-copy')}
        style={{ top: percent(top, layout.height) }}
      />
    </>
  );
}
