'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { PasswordField } from '@/components/account/password-field';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { signInStudentInput } from '@/lib/contracts/account';
import { signInStudentAction } from '../actions';

const PLAIN_TEXT = { autoCapitalize: 'none', autoCorrect: 'off', spellCheck: false } as const;

export function SignInStudent({ schoolCode }: { schoolCode: string }) {
  const [lastResult, action] = useActionState(signInStudentAction, undefined);
  const [form, fields] = useForm({
    id: 'student',
    lastResult,
    defaultValue: { schoolCode },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: signInStudentInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid gap-4">
      <FormRefusal errors={form.errors} />
      <TextField
        label="school code"
        {...getInputProps(fields.schoolCode, { type: 'text' })}
        key={fields.schoolCode.key}
        {...PLAIN_TEXT}
        autoComplete="organization"
        error={fields.schoolCode.errors}
      />
      <TextField
        label="your ID"
        {...getInputProps(fields.localId, { type: 'text' })}
        key={fields.localId.key}
        {...PLAIN_TEXT}
        autoComplete="username"
        error={fields.localId.errors}
      />
      <PasswordField
        label="passphrase"
        name={fields.passphrase.name}
        id={fields.passphrase.id}
        autoComplete="current-password"
        error={fields.passphrase.errors}
      />
      <SubmitButton className="mt-2 min-h-14 text-heading md:min-h-14" pendingLabel="signing in">
        sign in
      </SubmitButton>
      <p className="text-label text-ink-2">
        Words forgotten? Your teacher can give you new ones at the bench. No code? It stands on your slip.
      </p>
    </form>
  );
}
