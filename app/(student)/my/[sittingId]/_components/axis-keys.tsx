'use client';

import { OtherLength } from '@/components/other-unit/other-unit';
import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import type { Length, Unit } from '@/lib/length';
import { AXES, type Axis } from '@/lib/scoring';

interface AxisKeysProps {
  target: Record<Axis, Length>;
  unit: Unit;
  axis: Axis;
  onAxis: (axis: Axis) => void;
}

/** The three sizes of a part as joined keys. */
export function AxisKeys({ target, unit, axis, onAxis }: AxisKeysProps) {
  return (
    <fieldset className="mt-3 flex">
      <legend className="sr-only">which size</legend>
      {AXES.map((each) => (
        <button
          key={each}
          type="button"
          aria-pressed={each === axis}
          onClick={() => onAxis(each)}
          className={classNames(
            'relative -ml-px flex min-h-16 flex-1 touch-manipulation flex-col items-center justify-center border border-ink select-none first:ml-0 focus-visible:z-1 active:bg-ink active:text-sheet',
            each === axis ? 'border-act bg-act text-on-act' : 'bg-plate',
          )}
        >
          <span className="text-label">{each}</span>
          <LengthText ticks={target[each]} unit={unit} className="text-heading" />
          <OtherLength ticks={target[each]} unit={unit} className="pb-1 text-small text-current" />
        </button>
      ))}
    </fieldset>
  );
}
