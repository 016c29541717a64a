import { classNames } from '@/components/ui/class-names';

/** The line by which a drawing is broken off: more lies beyond it on that side. */
export function BreakLine({ side }: { side: 'left' | 'right' }) {
  return (
    <span
      aria-hidden="true"
      className={classNames(
        'pointer-events-none absolute inset-y-0 z-2 flex w-4 flex-col items-center bg-sheet print:hidden',
        side === 'right' ? 'right-0' : 'left-0',
      )}
    >
      <span className="h-14 max-h-[40%] w-px bg-ink" />
      <svg aria-hidden="true" viewBox="0 0 16 28" className="h-7 w-4 shrink-0 fill-none stroke-ink">
        <path d="M8 0V5L2 10L14 18L8 23V28" strokeLinejoin="round" />
      </svg>
      <span className="w-px flex-1 bg-ink" />
    </span>
  );
}
