'use client';

import { getFormProps, getInputProps, getSelectProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState, useState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { LinkButton } from '@/components/ui/link-button';
import { Segmented } from '@/components/ui/segmented';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { changeSchoolInput } from '@/lib/contracts/school';
import { changeSchoolAction } from '../actions';

interface SchoolFormProps {
  school: { name: string; timeZone: string; unit: 'in' | 'mm' };
  zones: readonly string[];
}

export function SchoolForm({ school, zones }: SchoolFormProps) {
  const [lastResult, action] = useActionState(changeSchoolAction, undefined);
  const [unit, setUnit] = useState<string>(school.unit);
  const [form, fields] = useForm({
    id: 'school',
    lastResult,
    defaultValue: { name: school.name, timeZone: school.timeZone },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: changeSchoolInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[30rem] gap-4">
      <FormRefusal errors={form.errors} />
      <TextField
        label="name"
        {...getInputProps(fields.name, { type: 'text' })}
        key={fields.name.key}
        error={fields.name.errors}
      />
      <SelectField
        label="time zone"
        options={zones.map((zone) => ({ value: zone, label: zone.replaceAll('_', ' ') }))}
        {...getSelectProps(fields.timeZone)}
        key={fields.timeZone.key}
        error={fields.timeZone.errors}
      />
      <Segmented
        label="lengths of new practicals in"
        showLabel
        name={fields.unit.name}
        value={unit}
        onChange={setUnit}
        options={[
          { value: 'in', label: 'inches' },
          { value: 'mm', label: 'millimetres' },
        ]}
      />
      <div className="mt-2 flex flex-wrap gap-2">
        <SubmitButton pendingLabel="keeping it">keep it</SubmitButton>
        <LinkButton href="/school">leave it</LinkButton>
      </div>
    </form>
  );
}
