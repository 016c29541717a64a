'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { LinkButton } from '@/components/ui/link-button';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { invitePersonInput } from '@/lib/contracts/school';
import { invitePersonAction } from '../actions';
import { RoleFields } from './role-fields';

export function InviteForm({ departments }: { departments: { departmentId: string; name: string }[] }) {
  const [lastResult, action] = useActionState(invitePersonAction, undefined);
  const [form, fields] = useForm({
    id: 'invite',
    lastResult,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: invitePersonInput }),
  });
  const [only, ...others] = departments;
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[34rem] gap-4">
      <FormRefusal errors={form.errors} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField
          label="given name"
          {...getInputProps(fields.givenName, { type: 'text' })}
          key={fields.givenName.key}
          autoComplete="off"
          error={fields.givenName.errors}
        />
        <TextField
          label="family name"
          {...getInputProps(fields.familyName, { type: 'text' })}
          key={fields.familyName.key}
          autoComplete="off"
          error={fields.familyName.errors}
        />
      </div>
      <TextField
        label="email"
        {...getInputProps(fields.email, { type: 'email' })}
        key={fields.email.key}
        autoComplete="off"
        error={fields.email.errors}
      />
      <RoleFields
        roles={['teacher']}
        departmentId={only && others.length === 0 ? only.departmentId : ''}
        departments={departments}
        errors={{ roles: fields.roles.errors, departmentId: fields.departmentId.errors }}
      />
      <div className="mt-2 flex flex-wrap gap-2">
        <SubmitButton pendingLabel="sending">send the invitation</SubmitButton>
        <LinkButton href="/school/people">leave it</LinkButton>
      </div>
    </form>
  );
}
