'use client';

import { getFormProps, getInputProps, getSelectProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { LinkButton } from '@/components/ui/link-button';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { createSectionInput, NEW_TERM } from '@/lib/contracts/sections';
import type { SectionChoicesView } from '@/lib/data/sections/read-section-choices';
import { createSectionAction } from '../../actions';
import { TermChoice } from './term-choice';

export function SectionForm({ choices }: { choices: SectionChoicesView }) {
  const { departments, terms, currentTermId, proposedTerm } = choices;
  const [lastResult, action] = useActionState(createSectionAction, undefined);
  const [only, ...others] = departments;
  const [form, fields] = useForm({
    id: 'section',
    lastResult,
    defaultValue: {
      departmentId: only && others.length === 0 ? only.departmentId : undefined,
      termId: currentTermId ?? (terms.length === 0 ? NEW_TERM : undefined),
      termName: terms.length === 0 ? proposedTerm.name : undefined,
      startsOn: terms.length === 0 ? proposedTerm.startsOn : undefined,
      endsOn: terms.length === 0 ? proposedTerm.endsOn : undefined,
    },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: createSectionInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[34rem] gap-4">
      <FormRefusal errors={form.errors} />
      <div className="grid gap-4 sm:grid-cols-[minmax(0,1fr)_9rem]">
        <TextField
          label="section"
          hint={fields.name.errors ? undefined : 'As your school calls it: Woods 2.'}
          {...getInputProps(fields.name, { type: 'text' })}
          key={fields.name.key}
          autoComplete="off"
          error={fields.name.errors}
        />
        <TextField
          label="period"
          hint={fields.period.errors ? undefined : 'Such as 3.'}
          {...getInputProps(fields.period, { type: 'text' })}
          key={fields.period.key}
          autoComplete="off"
          error={fields.period.errors}
        />
      </div>
      <TermChoice fields={fields} terms={terms} />
      {departments.length > 1 ? (
        <SelectField
          label="department"
          placeholder="choose a department"
          options={departments.map(({ departmentId, name }) => ({ value: departmentId, label: name }))}
          {...getSelectProps(fields.departmentId)}
          key={fields.departmentId.key}
          error={fields.departmentId.errors}
        />
      ) : (
        <input type="hidden" name={fields.departmentId.name} value={only?.departmentId ?? ''} />
      )}
      <div className="mt-2 flex flex-wrap gap-2">
        <SubmitButton pendingLabel="making it">make the period</SubmitButton>
        <LinkButton href="/periods">leave it</LinkButton>
      </div>
    </form>
  );
}
