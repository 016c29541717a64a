import { type ReactNode, useId } from 'react';
import { classNames } from './class-names';

interface ProgressProps {
  label: ReactNode;
  /** Done so far; null while the amount is not known. */
  value: number | null;
  max: number;
  /** How it is put in words: "312 of 810 readings". */
  text?: string;
  /** A button or form that stops the job. */
  cancel?: ReactNode;
  className?: string;
}

const TENTHS = [1, 2, 3, 4, 5, 6, 7, 8, 9];

/** A long job as a rule filling from the left. */
export function Progress({ label, value, max, text, cancel, className }: ProgressProps) {
  const id = useId();
  const share = value === null || max <= 0 ? 0 : Math.min(1, Math.max(0, value / max));
  return (
    <div className={classNames('flex flex-wrap items-end gap-4', className)}>
      <div className="min-w-0 flex-1 basis-56">
        <div className="mb-1 flex flex-wrap justify-between gap-x-4 text-label">
          <span id={id}>{label}</span>
          <span className="tnum text-ink-2">
            {text ?? (value === null ? 'starting' : `${value} of ${max}`)}
          </span>
        </div>
        <div
          role="progressbar"
          aria-labelledby={id}
          aria-valuemin={0}
          aria-valuemax={max}
          aria-valuenow={value ?? undefined}
          aria-valuetext={text}
          className="relative h-6 border border-t-edge border-ink bg-plate"
        >
          <div className="absolute inset-y-0 left-0 bg-act" style={{ width: `${share * 100}%` }} />
          {TENTHS.map((tenth) => (
            <span
              key={tenth}
              aria-hidden
              className={classNames('absolute top-0 w-px bg-ink', tenth === 5 ? 'h-3.5' : 'h-2')}
              style={{ left: `${tenth * 10}%` }}
            />
          ))}
        </div>
      </div>
      {cancel}
    </div>
  );
}
