'use client';

import { StripBar } from '@/components/rule/deviation-strip';
import { sideOf } from '@/components/rule/price-steps';
import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import { deviationAsText, lengthParts } from '@/components/ui/length-parts';
import { pointsAsText } from '@/components/ui/points-text';
import type { Unit } from '@/lib/length';
import { findPiece } from '@/lib/round/pieces';
import { type Graduation, neighbours } from '@/lib/round/rule-scale';
import { useBench } from './bench-context';
import { KEY_LINES } from './keypad-keys';

/** On a phone the target and two to each side. */
const NEAR = 2;

/** The readings next to the target, one tap each, with what each loses. */
export function Neighbours() {
  const { view, press } = useBench();
  const { spot, plan } = view.state;
  const place = spot && findPiece(plan.rubric, spot);
  if (!spot || !place) return <div className={classNames('col-span-5 lg:col-span-9', KEY_LINES)} />;
  const { unit } = plan.rubric;
  const all = neighbours(plan.rubric, place.line, spot.axis);
  const target = all.findIndex(({ deviation }) => deviation === 0);
  return all.map((each, index) => (
    <Neighbour
      key={each.ticks}
      graduation={each}
      unit={unit}
      outer={Math.abs(index - target) > NEAR}
      onPress={() =>
        press({ do: 'read', reading: { ticks: each.ticks, typed: each.text, unit, instrument: 'keyed' } })
      }
    />
  ));
}

interface NeighbourProps {
  graduation: Graduation;
  unit: Unit;
  outer: boolean;
  onPress: () => void;
}

function Neighbour({ graduation, unit, outer, onPress }: NeighbourProps) {
  const { ticks, deviation, lose, text } = graduation;
  const isTarget = deviation === 0;
  return (
    <button
      type="button"
      onClick={onPress}
      aria-label={`${text}, ${deviationAsText(deviation, unit)}, loses ${pointsAsText(lose)}`}
      className={classNames(
        'flex min-h-touch touch-manipulation flex-col items-center justify-center select-none active:bg-ink active:text-sheet focus-visible:relative focus-visible:z-10',
        KEY_LINES,
        isTarget ? 'bg-act-wash text-act' : 'bg-plate',
        outer && 'max-lg:hidden',
      )}
    >
      <span className="narrow text-[30px] leading-8 font-[600]">
        <Fraction parts={lengthParts(ticks, unit)} />
      </span>
      {isTarget ? (
        <span className="text-text font-[620]">target</span>
      ) : (
        <span className="narrow text-[20px] leading-5 opacity-80">
          <Fraction parts={lengthParts(deviation, unit, {}, true)} />
        </span>
      )}
      <svg aria-hidden="true" viewBox="0 0 72 10" className="h-[10px] w-[72px]">
        <StripBar
          side={sideOf(deviation)}
          lose={lose}
          centre={36}
          top={1}
          height={8}
          length={Math.min(34, lose / 9)}
        />
      </svg>
    </button>
  );
}
