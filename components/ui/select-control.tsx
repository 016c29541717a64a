import type { ComponentProps } from 'react';
import { classNames } from './class-names';

/** A choice from a list with our own arrow; `className` is that of the control, not of its place. */
export function SelectControl({ className, children, ...select }: ComponentProps<'select'>) {
  return (
    <span className="relative block min-w-0">
      <select {...select} className={classNames('w-full appearance-none pr-8 text-ellipsis', className)}>
        {children}
      </select>
      <svg
        aria-hidden="true"
        viewBox="0 0 12 8"
        className="pointer-events-none absolute top-1/2 right-3 w-3 -translate-y-1/2 fill-none stroke-current stroke-[1.75]"
      >
        <path d="M1 1.5L6 6.5L11 1.5" />
      </svg>
    </span>
  );
}
