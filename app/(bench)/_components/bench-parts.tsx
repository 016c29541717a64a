'use client';

import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';

interface KeyProps {
  children: ReactNode;
  /** The small line under the word: what the key would do now. */
  note?: ReactNode;
  onPress: () => void;
  kind?: 'plain' | 'act' | 'open';
  /** Why it does nothing now; it stays pressable and says so. */
  idle?: boolean;
  label?: string;
  className?: string;
}

const KINDS = {
  plain: 'border-ink bg-plate text-ink',
  act: 'border-act bg-act text-on-act',
  open: 'border-ink bg-ink text-sheet',
};

/** A key of the bench: at least 78 px high, its word large, what it would do now beneath it. */
export function BenchKey({ children, note, onPress, kind = 'plain', idle, label, className }: KeyProps) {
  return (
    <button
      type="button"
      onClick={onPress}
      aria-label={label}
      className={classNames(
        'flex min-h-touch min-w-0 touch-manipulation flex-col justify-center border-outline px-3 text-left select-none active:border-ink active:bg-ink active:text-sheet focus-visible:relative focus-visible:z-10',
        KINDS[kind],
        idle && kind === 'plain' && 'border-dashed border-rule text-ink-2',
        className,
      )}
    >
      <span className="narrow text-key leading-7 whitespace-nowrap">{children}</span>
      {note === undefined ? null : (
        <span className="narrow block max-w-full overflow-hidden text-label leading-5 text-ellipsis whitespace-nowrap">
          {note}
        </span>
      )}
    </button>
  );
}

/** Keys of one kind, drawn as one row with shared lines. */
export function KeyGroup({
  label,
  children,
  className,
}: {
  label: string;
  children: ReactNode;
  className?: string;
}) {
  return (
    <fieldset
      aria-label={label}
      className={classNames('flex min-w-0 *:-ml-[1.75px] first:*:ml-0', className)}
    >
      {children}
    </fieldset>
  );
}
