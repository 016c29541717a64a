import type { ComponentProps, ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import { ScrollRegion } from './scroll-region';

interface TableProps extends ComponentProps<'table'> {
  caption: ReactNode;
  showCaption?: boolean;
}

/** A table of hair lines and tabular figures. Wider than its place, it scrolls by itself. */
export function Table({ caption, showCaption = false, className, children, ...props }: TableProps) {
  return (
    <ScrollRegion>
      <table {...props} className={classNames('tnum w-full border-collapse text-left text-text', className)}>
        <caption className={showCaption ? 'pb-2 text-left text-heading' : 'sr-only'}>{caption}</caption>
        {children}
      </table>
    </ScrollRegion>
  );
}

export function TableHead({ className, ...props }: ComponentProps<'thead'>) {
  return <thead {...props} className={classNames('border-b-outline border-ink', className)} />;
}

/** `fives` sets a heavier line under every fifth row, as an eye needs in a long list. */
export function TableBody({ fives, className, ...props }: ComponentProps<'tbody'> & { fives?: boolean }) {
  return (
    <tbody
      {...props}
      className={classNames(
        '[&>tr]:border-b [&>tr]:border-hair',
        fives && '[&>tr:nth-child(5n)]:border-rule',
        className,
      )}
    />
  );
}

export function TableFoot({ className, ...props }: ComponentProps<'tfoot'>) {
  return <tfoot {...props} className={classNames('border-t border-ink', className)} />;
}

interface CellAlign {
  align?: 'left' | 'right';
}

const PAD = 'px-2 py-2 first:pl-0 last:pr-0 align-baseline';

export function HeadCell({ align, className, ...props }: ComponentProps<'th'> & CellAlign) {
  return (
    <th
      scope="col"
      {...props}
      className={classNames(
        PAD,
        'text-label font-[480] text-ink-2 align-bottom',
        align === 'right' && 'text-right',
        className,
      )}
    />
  );
}

/** The cell that names its row. */
export function RowHead({ className, ...props }: ComponentProps<'th'>) {
  return <th scope="row" {...props} className={classNames(PAD, 'font-[520]', className)} />;
}

export function Cell({ align, className, ...props }: ComponentProps<'td'> & CellAlign) {
  return <td {...props} className={classNames(PAD, align === 'right' && 'text-right', className)} />;
}
