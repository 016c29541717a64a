import type { ReactNode } from 'react';

/** The head of a column, again beside the cell where the lines are stacked. */
export function CellLabel({ children }: { children: ReactNode }) {
  return (
    <span aria-hidden className="block text-small text-ink-2 lg:hidden">
      {children}
    </span>
  );
}
