import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';

interface SortButtonProps {
  sorted: false | 'asc' | 'desc';
  onSort: () => void;
  label: string;
  align?: 'left' | 'right';
  children: ReactNode;
}

/** The head of a column as a key; an arrow tells which way it is sorted. */
export function SortButton({ sorted, onSort, label, align = 'left', children }: SortButtonProps) {
  return (
    <button
      type="button"
      onClick={onSort}
      title={`sort by ${label}`}
      className={classNames(
        'group relative flex h-full min-h-6 w-full items-end gap-1 text-left text-label font-[480] text-ink-2',
        align === 'right' && 'justify-end text-right',
      )}
    >
      <span className={classNames('min-w-0', align === 'left' && 'h-full flex-1')}>{children}</span>
      <svg
        aria-hidden
        viewBox="0 0 10 12"
        className={classNames(
          'mb-1 h-2.5 w-2 shrink-0 fill-none stroke-ink stroke-[1.75]',
          sorted === false && 'opacity-0 group-hover:opacity-40',
          sorted === 'desc' && 'rotate-180',
        )}
      >
        <path d="M5 11V1M1.5 5L5 1L8.5 5" />
      </svg>
    </button>
  );
}
