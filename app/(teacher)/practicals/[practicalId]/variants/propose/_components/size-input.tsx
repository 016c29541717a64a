'use client';

import { useId, useState } from 'react';
import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import { lengthParts } from '@/components/ui/length-parts';
import { parseLength, type Unit } from '@/lib/length';

interface SizeInputProps {
  label: string;
  text: string;
  unit: Unit;
  isMoved: boolean;
  error: string | undefined;
  onType(text: string): void;
}

/** A size on a line to write on; at rest it is set as a fraction, and one that has moved stands out. */
export function SizeInput({ label, text, unit, isMoved, error, onType }: SizeInputProps) {
  const id = useId();
  const [inHand, setInHand] = useState(false);
  const read = inHand ? null : parseLength(text, unit);
  const parts = read?.ok && read.unit === unit ? lengthParts(read.ticks, unit) : null;
  const weight = isMoved ? 'font-[720]' : 'text-ink-2';
  return (
    <span className="relative block">
      <input
        type="text"
        aria-label={label}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? id : undefined}
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
        maxLength={64}
        value={text}
        onChange={(event) => onType(event.target.value)}
        onFocus={(event) => {
          setInHand(true);
          event.target.select();
        }}
        onBlur={() => setInHand(false)}
        className={classNames(
          'tnum block h-9 w-full min-w-0 border-b border-rule bg-transparent px-1 text-lead',
          'hover:border-ink focus:border-b-edge focus:border-act focus:bg-plate focus:text-ink',
          weight,
          parts && 'text-transparent',
          error && 'border-b-outline border-refuse bg-refuse-wash',
        )}
      />
      {parts ? (
        <span
          aria-hidden
          className={classNames(
            'pointer-events-none absolute inset-x-0 top-0 flex h-9 items-center px-1 text-lead',
            weight,
          )}
        >
          <Fraction parts={parts} />
        </span>
      ) : null}
      {error ? (
        <span id={id} className="mt-1 block text-label font-[580] text-refuse">
          {error}
        </span>
      ) : null}
    </span>
  );
}
