import { classNames } from '@/components/ui/class-names';
import { MARK_PATH } from './mark-path';

/** The product's mark. Its tail is made to stand on a true edge: set it so that its foot meets a line. */
export function Mark({ className }: { className?: string }) {
  return (
    <svg aria-hidden="true" viewBox="6 4 92 96" className={className} fill="currentColor">
      <path d={MARK_PATH} />
    </svg>
  );
}

const EDGE = 'border-b-[0.06em] border-current pr-[0.06em] pl-[0.12em]';

interface LogoProps {
  /** Draw the edge it stands on: always, where the header has two rows, or not where a line of the sheet is that edge. */
  edge?: 'always' | 'narrow' | 'never';
}

/** Mark and wordmark on one true edge. Sized by the font size of its place. */
export function Logo({ edge = 'never' }: LogoProps) {
  return (
    <span
      className={classNames(
        'inline-flex items-end leading-none',
        edge !== 'never' && EDGE,
        edge === 'narrow' && 'lg:border-b-0 lg:p-0',
      )}
    >
      <Mark className="mr-[0.34em] h-[0.84em] w-auto shrink-0" />
      <span className="-mb-[0.09em] font-title font-[640]">Trymark</span>
    </span>
  );
}
