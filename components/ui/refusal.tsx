import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface RefusalProps {
  /** What happened. */
  title: ReactNode;
  /** That nothing was lost, if so, and what to do. */
  children?: ReactNode;
  action?: ReactNode;
  className?: string;
}

/** Something was refused or failed. Announced at once. */
export function Refusal({ title, children, action, className }: RefusalProps) {
  return (
    <div role="alert" className={classNames('border-t-edge border-refuse pt-2', className)}>
      <p className="font-[660] text-refuse">{title}</p>
      {children ? <div className="mt-1 max-w-[62ch]">{children}</div> : null}
      {action ? <div className="mt-3">{action}</div> : null}
    </div>
  );
}

/** The usual triangle, for cautions at machines. */
export function HazardSign({ className }: { className?: string }) {
  return (
    <svg
      viewBox="0 0 22 20"
      role="img"
      aria-label="caution"
      className={classNames(
        'inline-block h-[1.1em] w-auto fill-none stroke-refuse align-[-0.15em]',
        className,
      )}
    >
      <path d="M11 1.5L21 18.5H1Z" strokeWidth="1.75" />
      <path d="M11 7V12.5M11 14.5V16.5" strokeWidth="2" />
    </svg>
  );
}
