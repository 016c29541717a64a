'use client';

import { getFormProps, useForm } from '@conform-to/react';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { PasswordField } from '@/components/account/password-field';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import type { FormReply } from '@/lib/transport/form';

interface ChoosePasswordProps {
  secret: string;
  email: string | null;
  submit: string;
  action: (reply: FormReply, data: FormData) => Promise<FormReply>;
}

/** The one form behind every link that sets a password. */
export function ChoosePassword({ secret, email, submit, action }: ChoosePasswordProps) {
  const [lastResult, send] = useActionState(action, undefined);
  const [form, fields] = useForm<{ password: string }>({ id: 'choose-password', lastResult });
  return (
    <form {...getFormProps(form)} action={send} onReset={keepTyped} className="grid gap-4">
      <FormRefusal errors={form.errors} />
      <input type="hidden" name="secret" value={secret} />
      <input type="hidden" name="username" autoComplete="username" defaultValue={email ?? ''} />
      <PasswordField
        label="new password"
        name={fields.password.name}
        id={fields.password.id}
        autoComplete="new-password"
        hint="15 characters or more. A short sentence of your own is easiest to keep in mind."
        error={fields.password.errors}
      />
      <SubmitButton className="mt-2" pendingLabel="keeping it">
        {submit}
      </SubmitButton>
    </form>
  );
}
