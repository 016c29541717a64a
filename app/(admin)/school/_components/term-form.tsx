'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { addTermInput, changeTermInput } from '@/lib/contracts/school';
import { addTermAction, changeTermAction } from '../actions';

interface TermFormProps {
  /** The term to change; none to add one. */
  term?: { termId: string; name: string; startsOn: string; endsOn: string };
}

export function TermForm({ term }: TermFormProps) {
  const [lastResult, action] = useActionState(term ? changeTermAction : addTermAction, undefined);
  const [form, fields] = useForm({
    id: 'term',
    lastResult,
    defaultValue: { termName: term?.name, startsOn: term?.startsOn, endsOn: term?.endsOn },
    onValidate: ({ formData }) =>
      term
        ? parseWithZod(formData, { schema: changeTermInput })
        : parseWithZod(formData, { schema: addTermInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[30rem] gap-4">
      <FormRefusal errors={form.errors} />
      {term ? <input type="hidden" name="termId" value={term.termId} /> : null}
      <TextField
        label="name"
        {...getInputProps(fields.termName, { type: 'text' })}
        key={fields.termName.key}
        error={fields.termName.errors}
      />
      <div className="grid grid-cols-2 gap-4">
        <TextField
          label="first day"
          {...getInputProps(fields.startsOn, { type: 'date' })}
          key={fields.startsOn.key}
          error={fields.startsOn.errors}
        />
        <TextField
          label="last day"
          {...getInputProps(fields.endsOn, { type: 'date' })}
          key={fields.endsOn.key}
          error={fields.endsOn.errors}
        />
      </div>
      <div>
        <SubmitButton pendingLabel="keeping it">{term ? 'keep it' : 'add the term'}</SubmitButton>
      </div>
    </form>
  );
}
