import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface EmptyStateProps {
  title: ReactNode;
  /** What to do next, in a sentence or two. */
  children: ReactNode;
  action?: ReactNode;
  className?: string;
}

/** Nothing here yet, drawn as a piece not yet cut, and the next step. */
export function EmptyState({ title, children, action, className }: EmptyStateProps) {
  return (
    <div className={classNames('flex flex-wrap items-start gap-x-6 gap-y-3 py-6', className)}>
      <svg aria-hidden="true" viewBox="0 0 96 64" className="h-16 w-24 shrink-0 fill-none stroke-ink-2">
        <path
          strokeDasharray="5 4"
          strokeWidth="1.75"
          d="M2 30L56 2L94 20V36L40 62L2 46ZM2 30L40 47L94 20M40 47V62"
        />
      </svg>
      <div className="min-w-0 flex-1 basis-64">
        <h2 className="text-heading">{title}</h2>
        <div className="mt-1 max-w-[56ch]">{children}</div>
        {action ? <div className="mt-4 flex flex-wrap gap-2">{action}</div> : null}
      </div>
    </div>
  );
}
