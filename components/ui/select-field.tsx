import { type ComponentProps, type ReactNode, useId } from 'react';
import { controlClass, describeField, Field, type FieldNotes } from './field';

export interface SelectOption {
  value: string;
  label: string;
}

interface SelectFieldProps extends ComponentProps<'select'>, FieldNotes {
  label: ReactNode;
  hideLabel?: boolean;
  optional?: boolean;
  options: readonly SelectOption[];
  /** The first, empty choice: what to choose. */
  placeholder?: string;
}

export function SelectField(props: SelectFieldProps) {
  const { label, hideLabel, optional, hint, error, finding, className, options, placeholder, ...select } =
    props;
  const made = useId();
  const id = select.id ?? made;
  const notes = { hint, error, finding };
  return (
    <Field id={id} label={label} hideLabel={hideLabel} optional={optional} className={className} {...notes}>
      <div className="relative">
        <select
          key={String(select.defaultValue)}
          {...select}
          {...describeField(id, notes)}
          className={controlClass(notes, 'appearance-none pr-8 text-ellipsis')}
        >
          {placeholder === undefined ? null : <option value="">{placeholder}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <svg
          aria-hidden="true"
          viewBox="0 0 12 8"
          className="pointer-events-none absolute top-1/2 right-3 w-3 -translate-y-1/2 fill-none stroke-current stroke-[1.75]"
        >
          <path d="M1 1.5L6 6.5L11 1.5" />
        </svg>
      </div>
    </Field>
  );
}
