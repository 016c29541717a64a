'use client';

import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import { lengthParts } from '@/components/ui/length-parts';
import { parseLength } from '@/lib/length';
import { textAt, typeAt } from '@/lib/practicals/draft-paths';
import { fieldId, useEditor } from './editor-context';
import type { SizeRuleDesk } from './use-size-rule';

interface BandFieldProps {
  size: SizeRuleDesk;
  /** The field within the price: `over.bands.1.within`. */
  suffix: string;
  label: string;
  showLabel?: boolean;
  isLength?: boolean;
  placeholder?: string;
}

/** A figure of a price. It types into every size that is priced together with this one. */
export function BandField({ size, suffix, label, showLabel, isLength, placeholder }: BandFieldProps) {
  const { desk, unit, errorsAt, focused, setFocused } = useEditor();
  const path = `${size.base}.${suffix}`;
  const id = fieldId(path);
  const text = textAt(desk.draft, path);
  const errors = errorsAt(path);
  const read = isLength && text !== '' ? parseLength(text, unit) : null;
  const parts = focused !== path && read?.ok && read.unit === unit ? lengthParts(read.ticks, unit) : null;

  return (
    <div className="min-w-0">
      <label htmlFor={id} className={showLabel ? 'block text-label text-ink-2' : 'sr-only'}>
        {label}
      </label>
      <span className="relative block">
        <input
          id={id}
          type="text"
          autoComplete="off"
          spellCheck={false}
          placeholder={placeholder}
          aria-invalid={errors.length > 0 || undefined}
          aria-describedby={errors.length > 0 ? `${id}-error` : undefined}
          value={text}
          onChange={(event) => size.change((rule) => typeAt(rule, suffix, event.target.value))}
          onFocus={(event) => {
            setFocused(path);
            event.target.select();
          }}
          onBlur={() => setFocused(null)}
          className={classNames(
            'tnum block h-9 w-full min-w-0 border-b border-rule bg-plate px-2 py-0 text-lead leading-6 placeholder:text-label placeholder:text-ink-2',
            'hover:border-ink focus:border-b-edge focus:border-act',
            parts && 'text-transparent',
            errors.length > 0 && 'border-b-outline border-refuse bg-refuse-wash',
          )}
        />
        {parts ? (
          <span
            aria-hidden
            className="pointer-events-none absolute inset-0 block overflow-hidden px-2 text-lead leading-[35px] whitespace-nowrap"
          >
            <Fraction parts={parts} />
          </span>
        ) : null}
      </span>
      {errors.length > 0 ? (
        <div id={`${id}-error`} className="text-label font-[580] text-refuse">
          {errors.map((error) => (
            <p key={error}>{error}</p>
          ))}
        </div>
      ) : null}
    </div>
  );
}
