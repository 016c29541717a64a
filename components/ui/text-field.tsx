import { type ComponentProps, type ReactNode, useId } from 'react';
import { classNames } from './class-names';
import { controlClass, describeField, Field, type FieldNotes } from './field';

export interface TextFieldProps extends ComponentProps<'input'>, FieldNotes {
  label: ReactNode;
  hideLabel?: boolean;
  optional?: boolean;
  inputClassName?: string;
}

export function TextField(props: TextFieldProps) {
  const { label, hideLabel, optional, hint, error, finding, className, inputClassName, ...input } = props;
  const made = useId();
  const id = input.id ?? made;
  const notes = { hint, error, finding };
  const isDate = input.type === 'date';
  return (
    <Field id={id} label={label} hideLabel={hideLabel} optional={optional} className={className} {...notes}>
      <span className="relative block">
        <input
          type="text"
          {...input}
          {...describeField(id, notes)}
          className={controlClass(notes, classNames(isDate && DATE, inputClassName))}
        />
        {isDate ? <DaySign /> : null}
      </span>
    </Field>
  );
}

/** The browser's own sign stays where it is and can be pressed; ours is seen. */
const DATE =
  'tnum pr-2 [&::-webkit-calendar-picker-indicator]:size-6 [&::-webkit-calendar-picker-indicator]:cursor-pointer [&::-webkit-calendar-picker-indicator]:opacity-0';

/** A leaf of a wall calendar. */
function DaySign() {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 20 20"
      className="pointer-events-none absolute top-1/2 right-2.5 size-5 -translate-y-1/2 fill-none stroke-current stroke-[1.5]"
    >
      <path d="M2 3.5H18V18H2ZM2 7.5H18M6.5 1V5M13.5 1V5" />
      <path d="M11 11H15V15H11Z" className="fill-current stroke-none" />
    </svg>
  );
}
