import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface NoticeProps {
  title: ReactNode;
  children?: ReactNode;
  /** A link or a button that settles the finding. */
  action?: ReactNode;
  className?: string;
}

/** A finding: ink, a heavy line, a dot and a leader to what it says. */
export function Notice({ title, children, action, className }: NoticeProps) {
  return (
    <div className={classNames('relative border-t-edge border-ink pt-3 pl-8', className)}>
      <span aria-hidden className="absolute -top-[5px] left-2 size-[9px] rounded-[50%] bg-ink" />
      <span aria-hidden className="absolute top-0 left-3 h-6 w-4 border-b border-l border-ink" />
      <p className="max-w-[62ch] text-text">
        <strong>{title}</strong> {children} {action}
      </p>
    </div>
  );
}
