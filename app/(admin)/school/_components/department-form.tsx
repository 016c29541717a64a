'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { addDepartmentInput } from '@/lib/contracts/school';
import { addDepartmentAction, renameDepartmentAction } from '../actions';

interface DepartmentFormProps {
  /** The department to rename; none to add one. */
  department?: { departmentId: string; name: string };
}

export function DepartmentForm({ department }: DepartmentFormProps) {
  const [lastResult, action] = useActionState(
    department ? renameDepartmentAction : addDepartmentAction,
    undefined,
  );
  const [form, fields] = useForm({
    id: 'department',
    lastResult,
    defaultValue: { name: department?.name },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: addDepartmentInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[30rem] gap-4">
      <FormRefusal errors={form.errors} />
      {department ? <input type="hidden" name="departmentId" value={department.departmentId} /> : null}
      <TextField
        label="name"
        {...getInputProps(fields.name, { type: 'text' })}
        key={fields.name.key}
        error={fields.name.errors}
      />
      <div>
        <SubmitButton pendingLabel="keeping it">{department ? 'keep it' : 'add the department'}</SubmitButton>
      </div>
    </form>
  );
}
