'use client';

import type { ClipboardEvent, KeyboardEvent } from 'react';
import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import { lengthParts } from '@/components/ui/length-parts';
import { parseLength, type Unit } from '@/lib/length';
import { MOST_TYPED } from '@/lib/practicals/draft';
import { fieldId } from './editor-context';

export interface CellInputProps {
  path: string;
  label: string;
  text: string;
  /** The unit of a size: set as a fraction while it is not in hand. */
  sizeIn?: Unit | null;
  inHand: boolean;
  refused: boolean;
  found: boolean;
  /** Something is said below the row about this cell. */
  noted?: boolean;
  placeholder?: string;
  /** A running text, set smaller. */
  isNote?: boolean;
  onType(text: string): void;
  onFocus(): void;
  onBlur(): void;
  onKeyDown?: (event: KeyboardEvent<HTMLInputElement>) => void;
  onPaste?: (event: ClipboardEvent<HTMLInputElement>) => void;
}

/** A cell of the sheet: a line to write on. What was typed stays as it is; at rest a size is set as a fraction. */
export function CellInput(props: CellInputProps) {
  const {
    path,
    label,
    text,
    sizeIn,
    inHand,
    refused,
    found,
    noted,
    placeholder,
    isNote,
    onType,
    onFocus,
    ...rest
  } = props;
  const id = fieldId(path);
  const read = sizeIn && !inHand && text !== '' ? parseLength(text, sizeIn) : null;
  const parts = read?.ok && sizeIn && read.unit === sizeIn ? lengthParts(read.ticks, sizeIn) : null;
  return (
    <span className="relative block min-w-0">
      <input
        id={id}
        type="text"
        aria-label={label}
        aria-invalid={refused || undefined}
        aria-describedby={refused || found || noted ? `${id}-note` : undefined}
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
        placeholder={placeholder}
        maxLength={isNote ? MOST_TYPED.note : MOST_TYPED.cell}
        value={text}
        onChange={(event) => onType(event.target.value)}
        onFocus={(event) => {
          onFocus();
          event.target.select();
        }}
        className={classNames(
          'tnum block h-9 w-full min-w-0 scroll-mt-16 border-b border-rule bg-transparent px-1 py-0 text-lead leading-6 placeholder:text-label placeholder:text-ink-2',
          'hover:border-ink focus:border-b-edge focus:border-act focus:bg-plate',
          isNote && 'h-7 border-transparent text-label placeholder-shown:border-hair',
          parts && 'text-transparent',
          found && !refused && 'border-b-edge border-ink bg-plate',
          refused && 'border-b-outline border-refuse bg-refuse-wash',
        )}
        {...rest}
      />
      {parts ? (
        <span
          aria-hidden
          className="pointer-events-none absolute inset-0 flex items-center overflow-hidden border-b border-transparent px-1 text-lead leading-6"
        >
          <Fraction parts={parts} />
        </span>
      ) : null}
    </span>
  );
}
