'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { moveStudentInput } from '@/lib/contracts/sections';
import { markLeftAction } from '../../../actions';

interface LeaveFormProps {
  sectionId: string;
  studentId: string;
  today: string;
}

export function LeaveForm({ sectionId, studentId, today }: LeaveFormProps) {
  const [lastResult, action] = useActionState(markLeftAction, undefined);
  const [form, fields] = useForm({
    id: 'leave',
    lastResult,
    defaultValue: { leftOn: today },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: moveStudentInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid gap-3">
      <FormRefusal errors={form.errors} />
      <input type="hidden" name="sectionId" value={sectionId} />
      <input type="hidden" name="studentId" value={studentId} />
      <TextField
        label="left on"
        hint="From this day on they are not in the section. What they made and earned is kept, and this can be taken back."
        className="max-w-[22rem]"
        {...getInputProps(fields.leftOn, { type: 'date' })}
        key={fields.leftOn.key}
        error={fields.leftOn.errors}
      />
      <div>
        <SubmitButton kind="plain" pendingLabel="marking">
          mark as left
        </SubmitButton>
      </div>
    </form>
  );
}
