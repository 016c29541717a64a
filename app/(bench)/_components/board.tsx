'use client';

import { type ReactNode, useState } from 'react';
import { pieceScale } from '@/components/part/piece-face';
import { classNames } from '@/components/ui/class-names';
import { listPieces } from '@/lib/round/pieces';
import { recordOf, valueAt } from '@/lib/round/record';
import { AXES, type Axis } from '@/lib/scoring';
import { useBench } from './bench-context';
import { PieceColumn } from './piece-column';
import { useWide } from './use-wide';

const PIECES_ON_A_TABLET = 9;
const PIECES_ON_A_PHONE = 3;

/** The student's pieces in cut-list order, three sizes and the checks under each; past nine, nine at a time. */
export function Board() {
  const { view } = useBench();
  const { state } = view;
  const pieces = listPieces(state.plan.rubric);
  const atOnce = useWide() ? PIECES_ON_A_TABLET : PIECES_ON_A_PHONE;
  const [turned, setTurned] = useState<{ at: number; spot: unknown } | null>(null);
  const { spot } = state;
  const cursor = pieces.findIndex(
    ({ line, ordinal }) => line.id === spot?.lineId && ordinal === spot.ordinal,
  );
  // Turning the page by hand holds until the cursor moves.
  const first =
    turned?.spot === spot && turned ? turned.at : Math.floor(Math.max(cursor, 0) / atOnce) * atOnce;
  const shown = pieces.slice(first, first + atOnce);
  const scale = pieceScale(
    pieces.map(({ line }) => line.target),
    { height: 74, columnWidth: 58 },
  );
  return (
    <section aria-label="pieces" className="min-w-0">
      <div className="flex">
        <AxisLabels axis={spot?.axis ?? null}>
          {pieces.length > atOnce ? (
            <Pager of={pieces.length} first={first} atOnce={atOnce} turn={(at) => setTurned({ at, spot })} />
          ) : null}
        </AxisLabels>
        {shown.map((place) => (
          <PieceColumn
            key={`${place.line.id}/${place.ordinal}`}
            place={place}
            scale={scale}
            startsLine={place.ordinal === 1 || place === shown[0]}
          />
        ))}
      </div>
    </section>
  );
}

function AxisLabels({ axis, children }: { axis: Axis | null; children: ReactNode }) {
  return (
    <div className="w-[78px] shrink-0">
      <div className="h-[108px]">{children}</div>
      {AXES.map((each) => (
        <p
          key={each}
          className={classNames(
            'narrow flex h-touch items-center justify-end pr-2 text-text',
            each === axis ? 'font-[680] text-act' : 'text-ink-2',
          )}
        >
          {each}
        </p>
      ))}
      <WorkKey />
    </div>
  );
}

/** The checks of the whole work stand at the head of the row of checks. */
function WorkKey() {
  const { view, press } = useBench();
  const { state } = view;
  const { workChecks } = state.plan.rubric;
  const record = recordOf(state);
  if (workChecks.length === 0) {
    return <p className="narrow flex h-12 items-center justify-end pr-2 text-text text-ink-2">checks</p>;
  }
  const values = workChecks.map((check) => ({
    check,
    value: valueAt(record, { lineId: '', ordinal: 0, what: check.id }),
  }));
  const torn = values.some(({ value }) => value === 'conflict');
  const failed = values.some(
    ({ value }) => value !== null && value !== 'conflict' && value.kind === 'level' && value.level > 0,
  );
  const open = values.filter(({ check, value }) => value === null && check.assume === null).length;
  const unset = values.some(({ value }) => value === null);
  const word = torn ? 'two readings' : failed ? 'not all' : open > 0 ? 'to see' : unset ? 'assumed' : 'good';
  return (
    <button
      type="button"
      onClick={() => press({ do: 'ask', about: 'work' })}
      aria-expanded={state.asked?.about === 'work'}
      aria-label={`checks of the whole work: ${word}`}
      className={classNames(
        'narrow flex h-12 w-full flex-col items-end justify-center pr-2 text-right leading-[18px] select-none active:bg-ink active:text-sheet',
        state.asked?.about === 'work' && 'bg-act-wash',
      )}
    >
      <span className="text-text font-[620] underline decoration-[1.5px] underline-offset-3">work</span>
      <span className={classNames('text-label', open > 0 || failed || torn ? 'font-[660]' : 'text-ink-2')}>
        {word}
      </span>
    </button>
  );
}

interface PagerProps {
  of: number;
  first: number;
  atOnce: number;
  turn: (at: number) => void;
}

function Pager({ of, first, atOnce, turn }: PagerProps) {
  const last = Math.min(first + atOnce, of);
  return (
    <nav aria-label="pieces shown" className="flex h-full flex-col items-end gap-0.5 pr-2">
      <p className="narrow tnum text-label whitespace-nowrap text-ink-2">
        {first + 1}–{last} of {of}
      </p>
      <TurnKey onPress={() => turn(first - atOnce)} disabled={first === 0}>
        before
      </TurnKey>
      <TurnKey onPress={() => turn(last)} disabled={last >= of}>
        after
      </TurnKey>
    </nav>
  );
}

function TurnKey(props: { onPress: () => void; disabled: boolean; children: string }) {
  return (
    <button
      type="button"
      onClick={props.onPress}
      disabled={props.disabled}
      className="narrow h-10 w-full border border-ink bg-plate text-text font-[620] active:bg-ink active:text-sheet disabled:border-dashed disabled:border-rule disabled:text-ink-2"
    >
      {props.children}
    </button>
  );
}
