'use client';

import { useEffect, useId, useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import type { Unit } from '@/lib/length';
import type { OwnRecord } from '@/lib/practicals/own-record';
import { headsAt, pieceStateAt, valueAt } from '@/lib/round/record';
import type { MeasuringState } from './use-measuring';

interface ReadingFieldProps {
  measuring: MeasuringState;
  record: OwnRecord;
  unit: Unit;
}

/** What was read, as it is typed: by the keys below, or by a keyboard. */
export function ReadingField({ measuring, record, unit }: ReadingFieldProps) {
  const { spot, place, text, told, type, keep } = measuring;
  const [ownKeyboard, setOwnKeyboard] = useState(false);
  const input = useRef<HTMLInputElement>(null);
  const id = useId();

  useEffect(() => {
    if (spot) input.current?.focus({ preventScroll: true });
  }, [spot]);

  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        void keep();
      }}
    >
      <div className="flex items-baseline justify-between">
        <label htmlFor={id} className="text-heading">
          {place?.label}, <span className="text-act">{spot?.axis}</span>
        </label>
        <Button
          size="small"
          kind="quiet"
          onClick={() => setOwnKeyboard(!ownKeyboard)}
          aria-pressed={ownKeyboard}
        >
          {ownKeyboard ? 'these keys' : 'keyboard'}
        </Button>
      </div>
      <div className="flex items-center border-b-edge border-act bg-plate px-3 has-focus-visible:outline-3 has-focus-visible:outline-act">
        <input
          ref={input}
          id={id}
          value={text}
          onChange={(event) => type(event.target.value)}
          inputMode={ownKeyboard ? 'text' : 'none'}
          enterKeyHint="done"
          autoComplete="off"
          autoCapitalize="none"
          maxLength={64}
          aria-describedby={`${id}-told`}
          aria-invalid={told?.kind === 'refused' || undefined}
          className="narrow h-13 min-w-0 flex-1 bg-transparent text-[34px] font-[620] outline-none"
        />
        <span className="text-lead text-ink-2">{measuring.unit}</span>
      </div>
      <Told id={`${id}-told`} measuring={measuring} record={record} unit={unit} />
    </form>
  );
}

function Told({ id, measuring, record, unit }: ReadingFieldProps & { id: string }) {
  const { told } = measuring;
  return (
    <p
      id={id}
      role={told?.kind === 'refused' || told?.kind === 'asked' ? 'alert' : 'status'}
      className={classNames(
        'min-h-11 py-1 text-label leading-[1.15rem]',
        told?.kind === 'refused'
          ? 'font-[580] text-refuse'
          : told?.kind === 'asked'
            ? 'font-[580]'
            : 'text-ink-2',
      )}
    >
      {told && told.kind !== 'kept' ? (
        told.text
      ) : (
        <Standing measuring={measuring} record={record} unit={unit} />
      )}
      {told?.kind === 'kept' ? <span className="block">Kept: {told.text}.</span> : null}
    </p>
  );
}

/** What the cell under the cursor already holds. */
function Standing({ measuring, record, unit }: ReadingFieldProps) {
  const { cell, spot, mark } = measuring;
  if (!cell || !spot) return null;
  if (pieceStateAt(record, spot) === 'missing') return 'You marked this piece as missing.';
  const value = valueAt(record, cell);
  if (value === null) return null;
  if (value === 'conflict') return 'Two readings stand here, from two devices. Measure it again.';
  const takeBack = (
    <button type="button" className="link" onClick={() => void mark({ kind: 'cleared' }, 'taken back')}>
      take it back
    </button>
  );
  if (value.kind === 'value') {
    const typed = headsAt(record, cell)[0]?.typed;
    return (
      <>
        You read {typed ?? <LengthText ticks={value.ticks} unit={unit} />} here. Another reading replaces it,
        or {takeBack}.
      </>
    );
  }
  const word = value.kind === 'spoiled' ? 'spoiled' : 'couldn’t read';
  return (
    <>
      Marked “{word}”. A reading replaces it, or {takeBack}.
    </>
  );
}
