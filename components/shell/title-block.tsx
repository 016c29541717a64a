import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';

export interface TitleBlockCell {
  label: ReactNode;
  value: ReactNode;
  /** Takes the whole row. */
  wide?: boolean;
}

/** The block in the sheet's lower right corner: what this sheet is about. */
export function TitleBlock({ cells, className }: { cells: readonly TitleBlockCell[]; className?: string }) {
  return (
    <dl
      className={classNames(
        'grid grid-cols-2 overflow-hidden border-t border-l border-ink text-label print:break-inside-avoid',
        className,
      )}
    >
      {cells.map((cell, index) => (
        <div
          key={index.toString()}
          className={classNames(
            '-mt-px -ml-px min-w-0 border-t border-l border-rule px-3 py-1.5',
            cell.wide && 'col-span-2',
          )}
        >
          <dt className="text-small text-ink-2">{cell.label}</dt>
          <dd className="font-[660] break-words">{cell.value}</dd>
        </div>
      ))}
    </dl>
  );
}
