'use client';

import { getFormProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { PasswordField } from '@/components/account/password-field';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { changePasswordInput } from '@/lib/contracts/account';
import { changePasswordAction } from '../actions';

/** `word`: what the person calls it, a password or a passphrase. */
export function ChangePassword({ word, signsInAs }: { word: 'password' | 'passphrase'; signsInAs: string }) {
  const [lastResult, action] = useActionState(changePasswordAction, undefined);
  const [form, fields] = useForm({
    id: 'change-password',
    lastResult,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: changePasswordInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[26rem] gap-4">
      <FormRefusal errors={form.errors} />
      <input type="hidden" name="username" autoComplete="username" defaultValue={signsInAs} />
      <PasswordField
        label={`${word} you use now`}
        name={fields.current.name}
        id={fields.current.id}
        autoComplete="current-password"
        error={fields.current.errors}
      />
      <PasswordField
        label={`new ${word}`}
        name={fields.password.name}
        id={fields.password.id}
        autoComplete="new-password"
        hint="15 characters or more. A short sentence of your own is easiest to keep in mind."
        error={fields.password.errors}
      />
      <p className="text-label text-ink-2">
        Wherever else you are signed in, you will have to sign in again.
      </p>
      <div>
        <SubmitButton pendingLabel="changing it">change the {word}</SubmitButton>
      </div>
    </form>
  );
}
