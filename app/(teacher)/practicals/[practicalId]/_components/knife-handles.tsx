'use client';

import { layOutRule } from '@/components/rule/rule-layout';
import type { RuleScale } from '@/components/rule/rule-scale';
import { deviationInWords } from '@/components/ui/length-in-words';
import type { Length } from '@/lib/length';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import type { SizeRule } from '@/lib/scoring';
import type { SizeRuleDesk } from './use-size-rule';

export interface HeldEdge {
  side: 'over' | 'under';
  index: number;
}

interface KnifeHandlesProps {
  size: SizeRuleDesk;
  rule: SizeRule;
  scale: RuleScale;
  name: string;
  /** The edge that has the cursor, or none. */
  onHold(edge: HeldEdge | null): void;
  /** While an edge is dragged the stretch of rule stays as it is. */
  onDrag(dragged: boolean): void;
}

const THUMB = 44;
/** A knife lies outwards of its line, so that is where it is gripped. */
const OUTWARDS = 18;

const HANDLE =
  'pointer-events-none absolute top-0 m-0 cursor-ew-resize appearance-none bg-transparent outline-none touch-none ' +
  '[&::-webkit-slider-runnable-track]:h-full [&::-webkit-slider-runnable-track]:bg-transparent ' +
  '[&::-webkit-slider-thumb]:pointer-events-auto [&::-webkit-slider-thumb]:h-full [&::-webkit-slider-thumb]:w-[44px] ' +
  '[&::-webkit-slider-thumb]:appearance-none [&::-webkit-slider-thumb]:bg-transparent ' +
  '[&::-moz-range-track]:bg-transparent [&::-moz-range-thumb]:pointer-events-auto [&::-moz-range-thumb]:h-full ' +
  '[&::-moz-range-thumb]:w-[44px] [&::-moz-range-thumb]:rounded-none [&::-moz-range-thumb]:border-0 [&::-moz-range-thumb]:bg-transparent';

/** What the knives on the rule are gripped by: moved by pointer or arrow keys, one graduation at a time. */
export function KnifeHandles({ size, rule, scale, name, onHold, onDrag }: KnifeHandlesProps) {
  const { pitch, width, edge, height } = layOutRule('wide', scale, true);
  const reach = `calc(${((scale.span * pitch) / width) * 100}% + ${THUMB}px)`;
  const inset = `calc(50% - ${THUMB / 2 - OUTWARDS}px)`;
  return (['under', 'over'] as const).flatMap((side) =>
    rule[side].map(({ within }, index) => {
      const steps = within / scale.graduation;
      const [least, most] = roomOf(rule, side, index, scale);
      return (
        <input
          key={`${side}${index.toString()}`}
          type="range"
          dir={side === 'under' ? 'rtl' : 'ltr'}
          aria-label={`${side}, ${name}, edge of band ${index + 1}`}
          aria-valuetext={deviationInWords(side === 'under' ? -within : within, scale.unit)}
          min={0}
          max={scale.span}
          step={1}
          value={steps}
          onChange={(event) => {
            const moved = Math.min(most, Math.max(least, Number(event.target.value)));
            size.change((each) => {
              // Where both sides are alike, the over side is the one that is written.
              const band = each[each.mirrored ? 'over' : side].bands[index];
              if (band) band.within = lengthAsTyped(moved * scale.graduation, scale.unit);
            });
          }}
          onFocus={() => onHold({ side, index })}
          onBlur={() => onHold(null)}
          onPointerDown={() => onDrag(true)}
          onPointerUp={() => onDrag(false)}
          onPointerCancel={() => onDrag(false)}
          className={HANDLE}
          style={{
            [side === 'under' ? 'right' : 'left']: inset,
            width: reach,
            height: `${(edge / height) * 100}%`,
          }}
        />
      );
    }),
  );
}

/** How far an edge can go, in graduations, without passing the ones beside it. */
function roomOf(
  rule: SizeRule,
  side: 'over' | 'under',
  index: number,
  { graduation, span }: { graduation: Length; span: number },
): [least: number, most: number] {
  const before = rule[side][index - 1];
  const after = rule[side][index + 1];
  const least = before ? Math.floor(before.within / graduation) + 1 : 0;
  const most = after ? Math.ceil(after.within / graduation) - 1 : span;
  return [Math.min(least, most), most];
}
