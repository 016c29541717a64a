'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { Refusal } from '@/components/ui/refusal';
import { Segmented } from '@/components/ui/segmented';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { createPracticalInput } from '@/lib/contracts/practicals';
import { createPracticalAction } from '../actions';

/** A practical from nothing: its title, and the unit it keeps. */
export function NewPracticalForm({ unit }: { unit: 'in' | 'mm' }) {
  const [reply, action] = useActionState(createPracticalAction, undefined);
  const [form, fields] = useForm({
    lastResult: reply,
    shouldValidate: 'onSubmit',
    onValidate: ({ formData }) => parseWithZod(formData, { schema: createPracticalInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} className="grid max-w-[28rem] gap-4">
      <input type="hidden" name="from" value="empty" />
      {form.errors ? <Refusal title={form.errors.join(' ')} /> : null}
      <TextField
        {...getInputProps(fields.title, { type: 'text' })}
        key={undefined}
        label="title"
        error={fields.title.errors}
      />
      <div>
        <Segmented
          name="unit"
          label="unit"
          showLabel
          defaultValue={unit}
          options={[
            { value: 'in', label: 'inches' },
            { value: 'mm', label: 'millimetres' },
          ]}
        />
        <p className="mt-1 text-label text-ink-2">
          A practical keeps its unit: bands in inches and in millimetres are never converted into each other.
        </p>
      </div>
      <div>
        <SubmitButton pendingLabel="making it …">make the practical</SubmitButton>
      </div>
    </form>
  );
}
