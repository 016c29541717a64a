import { type ComponentProps, type ReactNode, useId } from 'react';
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
  return (
    <Field id={id} label={label} hideLabel={hideLabel} optional={optional} className={className} {...notes}>
      <input
        type="text"
        {...input}
        {...describeField(id, notes)}
        className={controlClass(notes, inputClassName)}
      />
    </Field>
  );
}
