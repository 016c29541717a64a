import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface ButtonRowProps {
  children: ReactNode;
  /** Joined buttons share their edges, as the bench's action groups do. */
  joined?: boolean;
  label?: string;
  className?: string;
}

export function ButtonRow({ children, joined = false, label, className }: ButtonRowProps) {
  const style = classNames(
    'flex flex-wrap',
    joined ? 'gap-0 [&>*]:-ml-px [&>*:first-child]:ml-0' : 'gap-2',
    className,
  );
  if (label) {
    return (
      <fieldset aria-label={label} className={style}>
        {children}
      </fieldset>
    );
  }
  return <div className={style}>{children}</div>;
}
