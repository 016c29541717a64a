'use client';

import { LengthText } from '@/components/ui/fraction';
import { HELD_NOTES, untouchedOfLine } from '@/lib/round/piece-state';
import { findPiece } from '@/lib/round/pieces';
import { pieceStateAt, recordOf } from '@/lib/round/record';
import type { Asked } from '@/lib/round/types';
import { useBench } from './bench-context';
import { BenchKey } from './bench-parts';
import { Choice } from './choice-panel';

type AskedAbout<About extends Asked['about']> = Extract<Asked, { about: About }>;

export function MissingChoice({ asked }: { asked: Asked & { lineId: string; ordinal: number } }) {
  const { view, press } = useBench();
  const place = findPiece(view.state.plan.rubric, asked);
  if (!place) return null;
  const rest = untouchedOfLine(view.state, place);
  return (
    <Choice title="What is missing?">
      <BenchKey onPress={() => press({ do: 'missing', scope: 'piece' })} className="min-w-48">
        {place.label}
      </BenchKey>
      {rest.length > 1 ? (
        <BenchKey onPress={() => press({ do: 'missing', scope: 'line' })} className="min-w-48">
          {rest.length === place.line.quantity ? `all ${rest.length}` : `the other ${rest.length}`} of{' '}
          {place.line.label}
        </BenchKey>
      ) : null}
    </Choice>
  );
}

export function HeldChoice({ asked }: { asked: Asked & { lineId: string; ordinal: number } }) {
  const { view, press } = useBench();
  const place = findPiece(view.state.plan.rubric, asked);
  if (!place) return null;
  return (
    <Choice title={`Why is ${place.label} set aside?`}>
      {HELD_NOTES.map((note) => (
        <BenchKey key={note} onPress={() => press({ do: 'held', note })} className="min-w-48">
          {note}
        </BenchKey>
      ))}
    </Choice>
  );
}

export function SpoiledChoice({ asked }: { asked: Asked & { lineId: string; ordinal: number } }) {
  const { view, press } = useBench();
  const { state } = view;
  const place = findPiece(state.plan.rubric, asked);
  if (!place || !state.spot) return null;
  return (
    <Choice title={`What of ${place.label} cannot be measured?`}>
      <BenchKey onPress={() => press({ do: 'spoiled', scope: 'size' })} className="min-w-48">
        this {state.spot.axis}
      </BenchKey>
      <BenchKey
        onPress={() => press({ do: 'spoiled', scope: 'piece' })}
        className="min-w-48"
        note="what is read stays"
      >
        the whole piece
      </BenchKey>
    </Choice>
  );
}

export function FoundChoice({ asked }: { asked: Asked & { lineId: string; ordinal: number } }) {
  const { view, press } = useBench();
  const { state } = view;
  const place = findPiece(state.plan.rubric, asked);
  if (!place) return null;
  const word = pieceStateAt(recordOf(state), asked);
  return (
    <Choice title={`${place.label} is ${word}.`} back="leave it so">
      <BenchKey onPress={() => press({ do: 'found' })} kind="act" className="min-w-48">
        it is here
      </BenchKey>
    </Choice>
  );
}

export function FinishChoice({ asked }: { asked: AskedAbout<'finish'> }) {
  const { press } = useBench();
  const unread = asked.unread === 1 ? 'One size is unread' : `${asked.unread} sizes are unread`;
  const torn = asked.conflicts === 1 ? 'one has two readings' : `${asked.conflicts} have two readings`;
  const parts = [asked.unread > 0 ? unread : null, asked.conflicts > 0 ? torn : null]
    .filter(Boolean)
    .join(', ');
  return (
    <Choice
      title={`${parts.charAt(0).toUpperCase()}${parts.slice(1)}. The student has no score until that is settled.`}
    >
      <BenchKey onPress={() => press({ do: 'finish' })} className="min-w-48">
        finish all the same
      </BenchKey>
      {asked.unread > 0 ? (
        <BenchKey onPress={() => press({ do: 'rest-ok' })} className="min-w-48" note="gauges what is unread">
          rest OK
        </BenchKey>
      ) : null}
    </Choice>
  );
}

export function UnitChoice({ asked }: { asked: AskedAbout<'unit'> }) {
  const { press } = useBench();
  const name = { in: 'inches', mm: 'millimetres' };
  return (
    <Choice
      title={`The caliper shows ${asked.text}. Is it set to ${name[asked.other]}?`}
      back="measure again"
    >
      <BenchKey onPress={() => press({ do: 'answer-unit', yes: true })} kind="act" className="min-w-56">
        yes, {asked.text} {asked.other}
      </BenchKey>
      <BenchKey onPress={() => press({ do: 'answer-unit', yes: false })} className="min-w-56">
        no, {asked.text} {asked.unit}
      </BenchKey>
      <p className="max-w-[24rem] self-center text-lead text-ink-2">
        {asked.text} {asked.other} is{' '}
        <LengthText ticks={asked.ticks} unit={asked.unit} decimals={asked.unit === 'in' ? 3 : 2} />{' '}
        {asked.unit}. The answer holds from now on.
      </p>
    </Choice>
  );
}
