import type { ReactNode } from 'react';

/** What the thumb reaches: one to three keys along the foot of the screen. */
export function PhoneActions({ children }: { children: ReactNode }) {
  return (
    <div className="sticky bottom-0 z-10 -mx-4 mt-auto -mb-6 flex border-t border-ink bg-plate print:hidden [&>*]:min-h-16 [&>*]:flex-1 [&>*]:border-0 [&>*+*]:border-l">
      {children}
    </div>
  );
}
