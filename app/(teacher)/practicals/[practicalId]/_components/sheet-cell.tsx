'use client';

import type { ClipboardEvent, KeyboardEvent } from 'react';
import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import { lengthParts } from '@/components/ui/length-parts';
import { parseLength } from '@/lib/length';
import { textAt, typeAt } from '@/lib/practicals/draft-paths';
import { fieldId, useEditor } from './editor-context';

interface SheetCellProps {
  path: string;
  label: string;
  /** A size: set as a fraction while it is not in hand. */
  isLength?: boolean;
  placeholder?: string;
  strong?: boolean;
  className?: string;
  onKeyDown?: (event: KeyboardEvent<HTMLInputElement>) => void;
  onPaste?: (event: ClipboardEvent<HTMLInputElement>) => void;
}

/** A cell of the sheet: a line to write on. What was typed stays as it is; at rest a size is set as a fraction. */
export function SheetCell(props: SheetCellProps) {
  const { path, label, isLength = false, placeholder, strong, className, ...handlers } = props;
  const { desk, unit, errorsAt, findings, focused, setFocused } = useEditor();
  const text = textAt(desk.draft, path);
  const id = fieldId(path);
  const refused = errorsAt(path).length > 0;
  const found = findings.some((each) => each.path === path);
  const read = isLength && text !== '' ? parseLength(text, unit) : null;
  const parts = focused !== path && read?.ok && read.unit === unit ? lengthParts(read.ticks, unit) : null;
  return (
    <span className={classNames('relative block min-w-0', className)}>
      <input
        id={id}
        type="text"
        aria-label={label}
        aria-invalid={refused || undefined}
        aria-describedby={refused || found ? `${id}-note` : undefined}
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
        placeholder={placeholder}
        value={text}
        onChange={(event) => desk.edit((draft) => typeAt(draft, path, event.target.value))}
        onFocus={(event) => {
          setFocused(path);
          event.target.select();
        }}
        onBlur={() => setFocused(null)}
        className={classNames(
          'tnum block h-9 w-full min-w-0 border-b border-rule bg-transparent py-0 placeholder:text-label placeholder:text-ink-2',
          'hover:border-ink focus:border-b-edge focus:border-act focus:bg-plate',
          'px-1 text-lead leading-6',
          strong && 'font-[640]',
          parts && 'text-transparent',
          found && !refused && 'border-b-edge border-ink bg-plate',
          refused && 'border-b-outline border-refuse bg-refuse-wash',
        )}
        {...handlers}
      />
      {parts ? (
        <span
          aria-hidden
          className={classNames(
            'pointer-events-none absolute inset-0 flex items-center overflow-hidden border-b border-transparent',
            'px-1 text-lead leading-6',
            strong && 'font-[640]',
          )}
        >
          <Fraction parts={parts} />
        </span>
      ) : null}
    </span>
  );
}
