'use client';

import { useId, useState } from 'react';
import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import { lengthParts } from '@/components/ui/length-parts';
import { type Length, parseLength } from '@/lib/length';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import { useEditor } from './editor-context';

interface ReadingFieldProps {
  label: string;
  target: Length;
  deviation: Length;
  onRead(deviation: Length): void;
}

/** A reading typed as an instrument or a person gives it; at rest it is set as a fraction. */
export function ReadingField({ label, target, deviation, onRead }: ReadingFieldProps) {
  const { unit } = useEditor();
  const id = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const shown = typed ?? lengthAsTyped(target + deviation, unit);
  const read = parseLength(shown, unit);
  const bad =
    typed === null ? null : read.ok ? (read.ticks > 0 ? null : 'A size is more than 0.') : read.reason;
  return (
    <span className="relative block">
      <input
        type="text"
        autoComplete="off"
        spellCheck={false}
        aria-label={label}
        aria-invalid={bad !== null || undefined}
        aria-describedby={bad === null ? undefined : `${id}-bad`}
        value={shown}
        onFocus={(event) => {
          setTyped(shown);
          event.target.select();
        }}
        onChange={(event) => {
          const text = event.target.value;
          setTyped(text);
          const next = parseLength(text, unit);
          if (next.ok && next.ticks > 0) onRead(next.ticks - target);
        }}
        onBlur={() => setTyped(null)}
        className={classNames(
          'tnum block h-8 w-full min-w-0 border-b border-rule bg-plate px-1.5 py-0 text-text leading-6',
          'hover:border-ink focus:border-b-edge focus:border-act',
          typed === null && 'text-transparent',
          bad !== null && 'border-b-outline border-refuse bg-refuse-wash',
        )}
      />
      {typed === null ? (
        <span aria-hidden className="pointer-events-none absolute inset-0 px-1.5 leading-[31px]">
          <Fraction parts={lengthParts(target + deviation, unit)} />
        </span>
      ) : null}
      {bad === null ? null : (
        <span id={`${id}-bad`} className="block text-label font-[580] text-refuse">
          {bad}
        </span>
      )}
    </span>
  );
}
