import { type ComponentProps, type ReactNode, useId } from 'react';
import { controlClass, describeField, Field, type FieldNotes } from './field';
import { SelectControl } from './select-control';

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
      <SelectControl
        key={String(select.defaultValue)}
        {...select}
        {...describeField(id, notes)}
        className={controlClass(notes, 'pr-8')}
      >
        {placeholder === undefined ? null : <option value="">{placeholder}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </SelectControl>
    </Field>
  );
}
