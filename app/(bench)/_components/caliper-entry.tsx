'use client';

import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { Unit } from '@/lib/length';
import { findPiece } from '@/lib/round/pieces';
import { priceSize } from '@/lib/round/price-size';
import type { BenchEvent } from '@/lib/round/types';
import { useBench } from './bench-context';
import { BenchKey } from './bench-parts';

/** The caliper's own screen: what it showed last, what it showed before, and how it is set. */
export function CaliperEntry() {
  return (
    <section
      aria-label="caliper"
      className="grid border-outline border-t-edge border-ink bg-plate lg:h-[246px] lg:grid-cols-[1fr_352px_264px]"
    >
      <LastReading />
      <Earlier />
      <Settings />
    </section>
  );
}

function LastReading() {
  const { view, typing } = useBench();
  const { state } = view;
  const { said, doubt, caliper, plan } = state;
  const [last] = latestReadings(state.events.get(state.attemptId), 1);
  const showing = typing || (said?.kind === 'refused' ? (caliper.last?.text ?? '') : '');
  const place = last && findPiece(plan.rubric, last.event.cell);
  return (
    <div className="flex min-w-0 flex-col justify-between gap-2 border-rule p-4 lg:border-r">
      <p className="text-lead text-ink-2">
        {typing
          ? 'typing'
          : doubt
            ? 'not kept yet'
            : last
              ? `kept, ${place?.label}, ${last.event.cell.what}`
              : 'waiting for the caliper'}
      </p>
      <p
        className={classNames(
          'narrow tnum overflow-hidden text-[92px] leading-[0.9] font-[640] text-ellipsis whitespace-nowrap',
          doubt && !typing && 'text-refuse',
        )}
      >
        {showing || (doubt ? caliper.last?.text : last?.event.typed) || '–'}
        <span className="text-[30px] font-[440] text-ink-2">
          {' '}
          {typing || doubt ? caliper.unit : (last?.event.unit ?? caliper.unit)}
        </span>
      </p>
      <p className="narrow min-h-8 text-[24px] leading-8">
        {doubt && !typing ? (
          <span className="font-[640] text-refuse">
            Past the gross limit. Press the caliper again to keep it, or measure again.
          </span>
        ) : last && !typing ? (
          <Cost event={last.event} />
        ) : (
          <span className="text-ink-2">Press its data key. No box need be tapped.</span>
        )}
      </p>
    </div>
  );
}

function Cost({ event }: { event: BenchEvent }) {
  const { view } = useBench();
  const { rubric } = view.state.plan;
  const place = findPiece(rubric, event.cell);
  const axis = (['thickness', 'width', 'length'] as const).find((each) => each === event.cell.what);
  if (!place || !axis || event.value.kind !== 'value') return null;
  const decimals = rubric.unit === 'in' ? 3 : 2;
  return (
    <>
      <LengthText
        ticks={event.value.ticks - place.line.target[axis]}
        unit={rubric.unit}
        decimals={decimals}
        signed
      />
      , loses {pointsAsText(priceSize(rubric, place.line, axis, event.value.ticks).lose)}
    </>
  );
}

/** The readings before, so that one that looks wrong is seen in time. */
function Earlier() {
  const { view } = useBench();
  const { state } = view;
  const rows = latestReadings(state.events.get(state.attemptId), 6).slice(1);
  return (
    <div className="border-rule px-4 py-3 lg:border-r">
      <p className="text-label text-ink-2">before that</p>
      {rows.length === 0 ? <p className="mt-1 text-lead text-ink-2">nothing yet</p> : null}
      <ol>
        {rows.map(({ event, label }) => (
          <li
            key={event.id}
            className="narrow flex justify-between gap-3 border-b border-hair py-1 text-lead last:border-b-0"
          >
            <span className="min-w-0 overflow-hidden text-ellipsis whitespace-nowrap">
              {label}, {event.cell.what}
            </span>
            <span className="tnum font-[620] whitespace-nowrap">
              {event.typed} <span className="font-[440] text-ink-2">{event.unit}</span>
            </span>
          </li>
        ))}
      </ol>
    </div>
  );

  function labelOf(event: BenchEvent): string {
    return findPiece(state.plan.rubric, event.cell)?.label ?? '';
  }

  function latestReadings(events: readonly BenchEvent[] | undefined, count: number) {
    return latest(events, count).map((event) => ({ event, label: labelOf(event) }));
  }
}

function latestReadings(events: readonly BenchEvent[] | undefined, count: number) {
  return latest(events, count).map((event) => ({ event }));
}

function latest(events: readonly BenchEvent[] | undefined, count: number): BenchEvent[] {
  return (events ?? [])
    .filter(({ value }) => value.kind === 'value')
    .slice(-count)
    .reverse();
}

function Settings() {
  const { view, press } = useBench();
  const { caliper, plan } = view.state;
  const decimals = plan.rubric.unit === 'in' ? 3 : 2;
  return (
    <div className="flex flex-col gap-2 p-3">
      <p className="narrow text-lead leading-6">
        <span className="text-ink-2">zero </span>
        {caliper.zero === null ? (
          'not checked: close and press'
        ) : (
          <LengthText ticks={caliper.zero} unit={plan.rubric.unit} decimals={decimals} signed />
        )}
      </p>
      <fieldset aria-label="a number without a unit is in" className="flex">
        {(['in', 'mm'] as const).map((unit: Unit) => (
          <button
            key={unit}
            type="button"
            aria-pressed={caliper.unit === unit}
            onClick={() => press({ do: 'caliper-unit', unit })}
            className={classNames(
              'min-h-touch flex-1 border-outline border-ink text-key not-first:-ml-[1.75px]',
              caliper.unit === unit ? 'bg-ink text-sheet' : 'bg-plate',
            )}
          >
            {unit}
          </button>
        ))}
      </fieldset>
      <BenchKey onPress={() => press({ do: 'step-back' })} note="or close the jaws twice">
        one back
      </BenchKey>
    </div>
  );
}
