import { type ComponentProps, type ReactNode, useId } from 'react';
import { controlClass, describeField, Field, type FieldNotes } from './field';

interface FileFieldProps extends Omit<ComponentProps<'input'>, 'type'>, FieldNotes {
  label: ReactNode;
  optional?: boolean;
}

const KEY =
  'file:mr-3 file:cursor-pointer file:border file:border-solid file:border-ink file:bg-plate file:px-3 file:py-1 file:font-[620] file:text-ink';

export function FileField({ label, optional, hint, error, finding, className, ...input }: FileFieldProps) {
  const made = useId();
  const id = input.id ?? made;
  const notes = { hint, error, finding };
  return (
    <Field id={id} label={label} optional={optional} className={className} {...notes}>
      <input
        {...input}
        {...describeField(id, notes)}
        type="file"
        className={controlClass(notes, `text-text ${KEY}`)}
      />
    </Field>
  );
}
