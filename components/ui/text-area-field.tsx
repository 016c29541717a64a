import { type ComponentProps, type ReactNode, useId } from 'react';
import { controlClass, describeField, Field, type FieldNotes } from './field';

interface TextAreaFieldProps extends ComponentProps<'textarea'>, FieldNotes {
  label: ReactNode;
  hideLabel?: boolean;
  optional?: boolean;
}

export function TextAreaField(props: TextAreaFieldProps) {
  const { label, hideLabel, optional, hint, error, finding, className, ...area } = props;
  const made = useId();
  const id = area.id ?? made;
  const notes = { hint, error, finding };
  return (
    <Field id={id} label={label} hideLabel={hideLabel} optional={optional} className={className} {...notes}>
      <textarea
        rows={4}
        {...area}
        {...describeField(id, notes)}
        className={controlClass(notes, 'text-text')}
      />
    </Field>
  );
}
