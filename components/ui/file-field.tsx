'use client';

import { type ComponentProps, type ReactNode, useEffect, useId, useRef, useState } from 'react';
import { classNames } from './class-names';
import { controlClass, describeField, Field, type FieldNotes } from './field';

interface FileFieldProps extends Omit<ComponentProps<'input'>, 'type'>, FieldNotes {
  label: ReactNode;
  optional?: boolean;
}

/** A file to hand in: our own key and words; the browser's control lies invisibly over them. */
export function FileField(props: FileFieldProps) {
  const { label, optional, hint, error, finding, className, onChange, ref, ...input } = props;
  const [name, setName] = useState<string | null>(null);
  const control = useRef<HTMLInputElement | null>(null);
  useEffect(() => {
    const form = control.current?.form;
    // A form empties its fields only once everybody has heard of it.
    const look = () => setTimeout(() => setName(namesOf(control.current)));
    form?.addEventListener('reset', look);
    return () => form?.removeEventListener('reset', look);
  }, []);
  const made = useId();
  const id = input.id ?? made;
  const notes = { hint, error, finding };
  return (
    <Field id={id} label={label} optional={optional} className={className} {...notes}>
      <span className={controlClass(notes, 'relative flex items-center gap-3 py-1.5 text-text')}>
        <input
          {...input}
          {...describeField(id, notes)}
          ref={(element) => {
            control.current = element;
            if (typeof ref === 'function') ref(element);
            else if (ref) ref.current = element;
          }}
          type="file"
          onChange={(event) => {
            setName(namesOf(event.target));
            onChange?.(event);
          }}
          className="peer absolute inset-0 cursor-pointer opacity-0 disabled:cursor-default"
        />
        <span
          aria-hidden="true"
          className="shrink-0 border border-ink bg-plate px-3 py-1 font-[620] peer-focus-visible:outline-3 peer-focus-visible:outline-offset-2 peer-focus-visible:outline-act peer-active:bg-ink peer-active:text-sheet peer-disabled:border-dashed peer-disabled:border-rule peer-disabled:text-ink-2"
        >
          {name === null ? 'choose a file' : 'choose another'}
        </span>
        <span aria-hidden="true" className={classNames('min-w-0 truncate', name === null && 'text-ink-2')}>
          {name ?? 'none chosen'}
        </span>
      </span>
    </Field>
  );
}

function namesOf(control: HTMLInputElement | null): string | null {
  const names = [...(control?.files ?? [])].map(({ name }) => name);
  return names.length > 0 ? names.join(', ') : null;
}
