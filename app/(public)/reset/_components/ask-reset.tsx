'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { askResetInput } from '@/lib/contracts/account';
import { askResetAction } from '../actions';

export function AskReset() {
  const [lastResult, action] = useActionState(askResetAction, undefined);
  const [form, fields] = useForm({
    id: 'ask-reset',
    lastResult,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: askResetInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid gap-4">
      <FormRefusal errors={form.errors} />
      <TextField
        label="email"
        {...getInputProps(fields.email, { type: 'email' })}
        key={fields.email.key}
        autoComplete="username"
        error={fields.email.errors}
      />
      <SubmitButton pendingLabel="sending">send me a link</SubmitButton>
    </form>
  );
}
