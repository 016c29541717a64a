'use client';

import { useId, useState } from 'react';
import { controlClass, describeField, Field, type FieldNotes } from '@/components/ui/field';

interface PasswordFieldProps extends FieldNotes {
  name: string;
  label: string;
  /** `current-password` for one that is known, `new-password` for one that is being chosen. */
  autoComplete: 'current-password' | 'new-password';
  id?: string;
  value?: string;
  onValue?: (text: string) => void;
  autoFocus?: boolean;
}

/** A password that can be looked at while it is typed. What was typed stays here, and is never sent back by a server. */
export function PasswordField(props: PasswordFieldProps) {
  const { name, label, autoComplete, hint, error, finding, value, onValue } = props;
  const made = useId();
  const id = props.id ?? made;
  const [typed, setTyped] = useState('');
  const [shown, setShown] = useState(false);
  const notes = { hint, error, finding };
  return (
    <Field id={id} label={label} {...notes}>
      <div className="relative">
        <input
          name={name}
          type={shown ? 'text' : 'password'}
          autoComplete={autoComplete}
          autoCapitalize="none"
          autoCorrect="off"
          spellCheck={false}
          maxLength={1024}
          value={value ?? typed}
          onChange={(event) => {
            setTyped(event.target.value);
            onValue?.(event.target.value);
          }}
          {...describeField(id, notes)}
          className={controlClass(notes, 'pr-16')}
        />
        <button
          type="button"
          aria-pressed={shown}
          aria-controls={id}
          onClick={() => setShown(!shown)}
          className="absolute inset-y-0 right-0 min-w-11 px-3 text-label text-act underline underline-offset-4"
        >
          {shown ? 'hide' : 'show'}
        </button>
      </div>
    </Field>
  );
}
