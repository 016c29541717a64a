import type { ReactNode } from 'react';
import { EntranceBoard } from './entrance-board';
import { Logo } from './mark';
import { SheetBorder } from './sheet-border';
import { TitleBlock, type TitleBlockCell } from './title-block';

interface EntranceShellProps {
  title: ReactNode;
  titleBlock?: readonly TitleBlockCell[];
  children: ReactNode;
}

/** The screens before anyone is known: sign-in, invitation, reset, class code. */
export function EntranceShell({ title, titleBlock, children }: EntranceShellProps) {
  return (
    <SheetBorder className="overflow-hidden">
      <div className="grid flex-1 grid-cols-[minmax(0,1fr)] gap-x-12 max-lg:grid-rows-[auto_1fr] lg:grid-cols-[minmax(0,1fr)_21rem]">
        <header className="relative pt-6 max-lg:pb-6 lg:pt-8">
          <p className="text-[2.75rem] lg:text-[5.4rem]">
            <Logo edge="always" />
            <span className="sr-only">, a grading station for woodworking</span>
          </p>
          <p className="mt-6 text-lead text-ink-2 lg:mt-12">A piece is tried, and marked.</p>
          <EntranceBoard className="absolute bottom-0 left-0 hidden h-[min(40rem,calc(100dvh-10.5rem))] w-auto lg:block" />
        </header>
        <div className="flex min-w-0 flex-col lg:pt-7">
          <main className="w-full max-w-[26rem] pb-8">
            <h1 className="mb-4 font-title text-title">{title}</h1>
            {children}
          </main>
          {titleBlock ? (
            <footer className="mt-auto">
              <TitleBlock
                cells={titleBlock}
                className="-mx-4 -mb-4 border-l-0 md:-mr-6 md:-mb-6 md:ml-auto md:w-[21rem] md:border-l"
              />
            </footer>
          ) : null}
        </div>
      </div>
    </SheetBorder>
  );
}
