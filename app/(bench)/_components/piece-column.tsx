'use client';

import { PieceFace, type PieceFaceState } from '@/components/part/piece-face';
import { cellInWords } from '@/components/rule/cell-state';
import { SizeCell } from '@/components/rule/size-cell';
import { classNames } from '@/components/ui/class-names';
import type { PiecePlace } from '@/lib/round/pieces';
import { type BenchRecord, pieceStateAt, recordOf, sheetOf, valueAt } from '@/lib/round/record';
import { AXES, type Axis } from '@/lib/scoring';
import { useBench } from './bench-context';
import { cellStateAt } from './cell-state-at';
import { ChecksCell } from './checks-cell';

interface PieceColumnProps {
  place: PiecePlace;
  scale: number;
  startsLine: boolean;
}

/** One piece: how it stands, its name, its three sizes, its checks. */
export function PieceColumn({ place, scale, startsLine }: PieceColumnProps) {
  const { view, press } = useBench();
  const { state } = view;
  const { line, ordinal, label } = place;
  const at = { lineId: line.id, ordinal };
  const record = recordOf(state);
  const here = state.spot?.lineId === line.id && state.spot.ordinal === ordinal;
  const piece = pieceStateAt(record, at);
  return (
    <div className="w-touch shrink-0">
      <button
        type="button"
        onClick={() => press({ do: 'point', ...at, what: 'piece' })}
        className={classNames(
          'flex h-[108px] w-full flex-col items-center justify-end select-none',
          here && 'text-act',
        )}
      >
        <PieceFace size={line.target} scale={scale} state={faceOf(record, place, here)} />
        <span className="block w-full border-t-outline border-ink" />
        <span
          className={classNames(
            'narrow flex h-[30px] w-full items-center justify-center overflow-hidden text-center text-text leading-[15px]',
            here ? 'font-[680]' : 'font-[520]',
          )}
        >
          {label}
        </span>
      </button>
      <div
        className={classNames(
          'border-t-outline border-r border-b-outline border-rule border-t-ink border-b-ink',
          startsLine && 'border-l-outline border-l-ink',
        )}
      >
        {piece === 'present' ? (
          AXES.map((axis) => <Size key={axis} place={place} axis={axis} record={record} here={here} />)
        ) : (
          <SetAside place={place} record={record} />
        )}
      </div>
      <ChecksCell place={place} record={record} present={piece === 'present'} startsLine={startsLine} />
    </div>
  );
}

interface SizeProps {
  place: PiecePlace;
  axis: Axis;
  record: BenchRecord;
  here: boolean;
}

function Size({ place, axis, record, here }: SizeProps) {
  const { view, press } = useBench();
  const { state } = view;
  const { line, ordinal, label } = place;
  const { rubric } = state.plan;
  const target = line.target[axis];
  const cell = cellStateAt(record, sheetOf(rubric, record), place, axis);
  const cursor = here && state.spot?.axis === axis;
  return (
    <button
      type="button"
      onClick={() => press({ do: 'point', lineId: line.id, ordinal, what: axis })}
      aria-current={cursor ? 'true' : undefined}
      aria-label={`${label}, ${axis}: ${cellInWords(cell, target, rubric.unit)}`}
      data-cell={`${line.id}/${ordinal}/${axis}`}
      className="block size-touch touch-manipulation border-b border-rule select-none last:border-b-0 focus-visible:relative focus-visible:z-10"
    >
      <SizeCell state={cell} target={target} unit={rubric.unit} cursor={cursor} silent />
    </button>
  );
}

/** A piece that is not there to be measured: one tall cell that says why, and opens the way back. */
function SetAside({ place, record }: { place: PiecePlace; record: BenchRecord }) {
  const { press } = useBench();
  const { line, ordinal, label } = place;
  const state = pieceStateAt(record, { lineId: line.id, ordinal });
  const value = valueAt(record, { lineId: line.id, ordinal, what: 'piece' });
  const note = value !== null && value !== 'conflict' && value.kind === 'state' ? value.note : undefined;
  const word = state === 'conflict' ? 'two readings' : state;
  return (
    <button
      type="button"
      onClick={() => press({ do: 'point', lineId: line.id, ordinal, what: 'piece' })}
      aria-label={`${label}: ${word}${note ? `, ${note}` : ''}`}
      data-cell={`${line.id}/${ordinal}/piece`}
      className={classNames(
        'relative flex h-[234px] w-full items-center justify-center select-none focus-visible:z-10',
        state === 'conflict' ? 'bg-plate' : 'bg-sheet',
      )}
    >
      {state === 'missing' || state === 'conflict' ? (
        <svg
          aria-hidden="true"
          viewBox="0 0 78 234"
          preserveAspectRatio="none"
          className="absolute inset-0 size-full"
        >
          <path
            d={state === 'missing' ? 'M0 0L78 234M78 0L0 234' : 'M78 0L0 234'}
            className="stroke-rule [stroke-width:var(--pen-inside)]"
          />
        </svg>
      ) : null}
      <span
        className={classNames(
          'narrow relative rotate-180 px-1 py-2 text-left [writing-mode:vertical-rl]',
          state === 'conflict' ? 'bg-plate' : 'bg-sheet',
        )}
      >
        <span className="block text-[27px] leading-8 font-[660]">{word}</span>
        {note ? <span className="block text-text text-ink-2">{note}</span> : null}
      </span>
    </button>
  );
}

function faceOf(record: BenchRecord, { line, ordinal }: PiecePlace, here: boolean): PieceFaceState {
  const state = pieceStateAt(record, { lineId: line.id, ordinal });
  if (state === 'missing' || state === 'held') return state;
  if (here) return 'cursor';
  const spoiled = AXES.some((axis) => {
    const value = valueAt(record, { lineId: line.id, ordinal, what: axis });
    return value !== null && value !== 'conflict' && value.kind === 'spoiled';
  });
  return spoiled ? 'spoiled' : 'present';
}
