'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import Link from 'next/link';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { PasswordField } from '@/components/account/password-field';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { signInStaffInput } from '@/lib/contracts/account';
import { signInStaffAction } from '../actions';

export function SignInStaff() {
  const [lastResult, action] = useActionState(signInStaffAction, undefined);
  const [form, fields] = useForm({
    id: 'staff',
    lastResult,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: signInStaffInput }),
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
      <PasswordField
        label="password"
        name={fields.password.name}
        id={fields.password.id}
        autoComplete="current-password"
        error={fields.password.errors}
      />
      <SubmitButton className="mt-2 min-h-14 text-heading md:min-h-14" pendingLabel="signing in">
        sign in
      </SubmitButton>
      <p>
        <Link className="link" href="/reset">
          forgotten password
        </Link>
      </p>
    </form>
  );
}
