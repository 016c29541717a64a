import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';

const TICK = 'absolute bg-ink print:hidden';

/** The drawing sheet: a border with centring ticks from the tablet up, the plain sheet on a phone. */
export function SheetBorder({ children, className }: { children: ReactNode; className?: string }) {
  return (
    <div className="flex min-h-dvh flex-col md:p-inset print:min-h-0 print:p-0">
      <div
        className={classNames(
          'relative flex min-w-0 flex-1 flex-col px-4 pb-4 md:border md:border-ink md:px-6 md:pb-6 print:border-0 print:p-0',
          className,
        )}
      >
        <span aria-hidden className="hidden md:block">
          <span className={`${TICK} -top-[7px] left-1/2 h-[14px] w-[2px]`} />
          <span className={`${TICK} -bottom-[7px] left-1/2 h-[14px] w-[2px]`} />
          <span className={`${TICK} top-1/2 -left-[7px] h-[2px] w-[14px]`} />
          <span className={`${TICK} top-1/2 -right-[7px] h-[2px] w-[14px]`} />
        </span>
        {children}
      </div>
    </div>
  );
}
