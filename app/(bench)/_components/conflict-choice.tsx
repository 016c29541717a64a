'use client';

import { sayTime } from '@/components/ui/days';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import { findPiece } from '@/lib/round/pieces';
import { priceSize } from '@/lib/round/price-size';
import { contenders } from '@/lib/round/settle';
import type { BenchEvent } from '@/lib/round/types';
import { AXES } from '@/lib/scoring';
import type { Cell } from '@/lib/sync/cells';
import { useBench } from './bench-context';
import { Choice } from './choice-panel';

/** Two readings side by side, each with who, when and by what; a person takes one, and both stay in the record. */
export function ConflictChoice({ cell }: { cell: Cell }) {
  const { view } = useBench();
  const { state } = view;
  const place = findPiece(state.plan.rubric, cell);
  const both = contenders(state, cell);
  const what = cell.what === 'piece' ? (place?.label ?? '') : `${place?.label}, ${cell.what}`;
  return (
    <Choice
      title={`${what}: two readings. ${state.plan.maySettle ? 'Which one holds?' : 'The teacher chooses.'}`}
    >
      {cell.what === 'piece' ? (
        <PieceSides cell={cell} events={both} />
      ) : (
        both.map((event) => <Side key={event.id} event={event} />)
      )}
    </Choice>
  );
}

function Side({ event }: { event: BenchEvent }) {
  const { view, press } = useBench();
  const { rubric, maySettle } = view.state.plan;
  const place = findPiece(rubric, event.cell);
  const axis = AXES.find((each) => each === event.cell.what);
  const { value } = event;
  return (
    <button
      type="button"
      disabled={!maySettle}
      onClick={() => press({ do: 'settle', value })}
      className="flex min-h-[118px] min-w-[300px] flex-col justify-between border-outline border-ink bg-plate px-4 py-2 text-left select-none active:bg-ink active:text-sheet disabled:border-dashed"
    >
      <span className="flex items-baseline justify-between gap-4">
        <span className="narrow text-[44px] leading-none font-[640]">
          {value.kind === 'value' ? <LengthText ticks={value.ticks} unit={rubric.unit} /> : value.kind}
        </span>
        {value.kind === 'value' && place && axis ? (
          <span className="narrow text-lead">
            <LengthText ticks={value.ticks - place.line.target[axis]} unit={rubric.unit} signed />, loses{' '}
            {pointsAsText(priceSize(rubric, place.line, axis, value.ticks).lose)}
          </span>
        ) : null}
      </span>
      <Source event={event} />
    </button>
  );
}

/** Missing on one tablet, measured on the other. */
function PieceSides({ cell, events }: { cell: Cell; events: readonly BenchEvent[] }) {
  const { view, press } = useBench();
  const { maySettle } = view.state.plan;
  const sizes = events.filter(({ value }) => value.kind !== 'state');
  const states = events.filter(({ value }) => value.kind === 'state' || value.kind === 'cleared');
  const [measured] = sizes;
  const className =
    'flex min-h-[118px] min-w-[280px] flex-col justify-between border-outline border-ink bg-plate px-4 py-2 text-left select-none active:bg-ink active:text-sheet disabled:border-dashed';
  return (
    <>
      {states.map((event) => (
        <button
          key={event.id}
          type="button"
          disabled={!maySettle}
          onClick={() => press({ do: 'settle', value: event.value })}
          className={className}
        >
          <span className="narrow text-[36px] leading-none font-[640]">
            {event.value.kind === 'state' ? event.value.state : 'here'}
          </span>
          <Source event={event} />
        </button>
      ))}
      {measured ? (
        <button
          type="button"
          disabled={!maySettle}
          onClick={() => press({ do: 'settle', value: { kind: 'state', state: 'present' } })}
          className={className}
        >
          <span className="narrow text-[28px] leading-8 font-[640]">
            here, <MeasuredSizes events={sizes} />
          </span>
          <Source event={measured} />
        </button>
      ) : null}
      <span className="sr-only">{cell.what}</span>
    </>
  );
}

function MeasuredSizes({ events }: { events: readonly BenchEvent[] }) {
  const { view } = useBench();
  const { unit } = view.state.plan.rubric;
  if (events.every(({ value }) => value.kind === 'gauged')) return 'gauged';
  return events.map(({ id, value }, index) => (
    <span key={id}>
      {index > 0 ? ' × ' : ''}
      {value.kind === 'value' ? <LengthText ticks={value.ticks} unit={unit} /> : value.kind}
    </span>
  ));
}

function Source({ event }: { event: BenchEvent }) {
  const { view } = useBench();
  const own = event.authorId === view.state.plan.personId;
  const who = own ? 'you' : (view.authors[event.authorId] ?? 'another person');
  const at = sayTime(event.capturedAt);
  return (
    <span className="text-lead">
      {who}, {at}
      {event.instrument ? `, by ${event.instrument === 'keyed' ? 'keypad' : event.instrument}` : ''}
    </span>
  );
}
