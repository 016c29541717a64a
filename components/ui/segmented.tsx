'use client';

import { useId } from 'react';
import { classNames } from './class-names';

export interface SegmentedOption {
  value: string;
  label: string;
}

interface SegmentedProps {
  label: string;
  showLabel?: boolean;
  name?: string;
  options: readonly SegmentedOption[];
  value?: string;
  defaultValue?: string;
  onChange?: (value: string) => void;
  /** `ink` for a setting, `act` for what is in use now, as on the bench. */
  tone?: 'ink' | 'act';
  size?: 'desk' | 'bench';
  className?: string;
}

const SIZE = { desk: 'min-h-11 px-3 text-text md:min-h-10', bench: 'min-h-16 min-w-touch px-3 text-lead' };
const TONE = {
  ink: 'has-checked:bg-ink has-checked:text-sheet has-checked:border-ink',
  act: 'has-checked:bg-act has-checked:text-on-act has-checked:border-act',
};

/** One of a few, all in sight: radio buttons drawn as joined keys. */
export function Segmented(props: SegmentedProps) {
  const { label, showLabel, options, value, defaultValue, onChange, tone = 'ink', size = 'desk' } = props;
  const id = useId();
  const name = props.name ?? id;
  return (
    <fieldset className={classNames('min-w-0', props.className)}>
      <legend className={showLabel ? 'mb-1 text-label text-ink-2' : 'sr-only'}>{label}</legend>
      <div className="flex flex-wrap">
        {options.map((option) => (
          <label
            key={option.value}
            className={classNames(
              'relative -ml-px inline-flex flex-auto cursor-pointer items-center justify-center border border-ink bg-plate text-center font-[620] select-none first:ml-0',
              'has-focus-visible:z-1 has-focus-visible:outline-3 has-focus-visible:outline-act has-focus-visible:outline-offset-2',
              SIZE[size],
              TONE[tone],
            )}
          >
            <input
              type="radio"
              className="absolute inset-0 cursor-pointer opacity-0"
              name={name}
              value={option.value}
              {...(value === undefined
                ? { defaultChecked: option.value === defaultValue }
                : { checked: option.value === value })}
              onChange={() => onChange?.(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
