'use client';

import { useId, useState } from 'react';
import { type Length, parseLength, type Unit } from '@/lib/length';
import { controlClass, describeField, Field } from './field';
import { LengthText } from './fraction';
import type { TextFieldProps } from './text-field';

interface LengthFieldProps extends Omit<TextFieldProps, 'onChange' | 'value' | 'defaultValue'> {
  unit: Unit;
  /** What was typed, as typed. */
  defaultValue?: string;
  /** Deviations and offsets may be below zero; sizes may not. */
  allowNegative?: boolean;
  /** Called with the ticks, or null while the text is no length. */
  onLength?: (ticks: Length | null, text: string) => void;
}

function readLength(text: string, unit: Unit, allowNegative: boolean) {
  const read = parseLength(text, unit);
  if (read.ok && read.ticks < 0 && !allowNegative) {
    return { ok: false as const, reason: 'A size is not below zero. Kept as typed.' };
  }
  return read;
}

/** A length typed as people write it. What was typed stays; how it was read stands below. */
export function LengthField(props: LengthFieldProps) {
  const { unit, defaultValue = '', allowNegative = false, onLength, onBlur, ...rest } = props;
  const { label, hideLabel, optional, hint, error, finding, className, inputClassName, ...input } = rest;
  const made = useId();
  const id = input.id ?? made;
  const [text, setText] = useState(defaultValue);
  const [left, setLeft] = useState(false);
  const read = text.trim() === '' ? null : readLength(text, unit, allowNegative);
  const own = read && !read.ok && left ? read.reason : null;
  const notes = { hint, error: own ?? error, finding };
  const asIs = read?.ok && read.unit === unit ? null : read;

  return (
    <Field id={id} label={label} hideLabel={hideLabel} optional={optional} className={className} {...notes}>
      <input
        type="text"
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
        {...input}
        {...describeField(id, notes)}
        value={text}
        onChange={(event) => {
          const next = event.target.value;
          setText(next);
          const parsed = next.trim() === '' ? null : readLength(next, unit, allowNegative);
          onLength?.(parsed?.ok ? parsed.ticks : null, next);
        }}
        onFocus={() => setLeft(false)}
        onBlur={(event) => {
          setLeft(true);
          onBlur?.(event);
        }}
        className={controlClass(notes, inputClassName)}
      />
      <output htmlFor={id} className="block text-label text-ink-2 not-empty:mt-1">
        {read?.ok ? (
          <>
            = <LengthText ticks={read.ticks} unit={unit} withUnit />
            {asIs?.ok ? <span> (typed in {asIs.unit})</span> : null}
          </>
        ) : null}
      </output>
    </Field>
  );
}
