'use client';

import { getFormProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { changeRolesInput } from '@/lib/contracts/school';
import { changeRolesAction } from '../actions';
import { RoleFields } from './role-fields';

interface RolesFormProps {
  personId: string;
  roles: string[];
  departmentId: string;
  departments: { departmentId: string; name: string }[];
}

export function RolesForm({ personId, roles, departmentId, departments }: RolesFormProps) {
  const [lastResult, action] = useActionState(changeRolesAction, undefined);
  const [form, fields] = useForm({
    id: 'roles',
    lastResult,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: changeRolesInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[34rem] gap-4">
      <FormRefusal errors={form.errors} />
      <input type="hidden" name="personId" value={personId} />
      <RoleFields
        roles={roles}
        departmentId={departmentId}
        departments={departments}
        errors={{ roles: fields.roles.errors, departmentId: fields.departmentId.errors }}
      />
      <div>
        <SubmitButton pendingLabel="keeping them">keep the roles</SubmitButton>
      </div>
    </form>
  );
}
