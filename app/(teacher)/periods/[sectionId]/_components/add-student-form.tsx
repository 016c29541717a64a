'use client';

import { getFormProps, getInputProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { addStudentInput } from '@/lib/contracts/sections';
import { sayName } from '../../_components/words';
import { addStudentAction } from '../actions';

/** Stays open with empty fields once somebody is added, for the next. */
export function AddStudentForm({ sectionId }: { sectionId: string }) {
  const [{ reply, added }, action] = useActionState(addStudentAction, { reply: undefined, added: null });
  const [form, fields] = useForm({
    id: 'student',
    lastResult: reply,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: addStudentInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid gap-4">
      <FormRefusal errors={form.errors} />
      <input type="hidden" name="sectionId" value={sectionId} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField
          label="family name"
          {...getInputProps(fields.familyName, { type: 'text' })}
          key={fields.familyName.key}
          autoComplete="off"
          error={fields.familyName.errors}
        />
        <TextField
          label="given name"
          {...getInputProps(fields.givenName, { type: 'text' })}
          key={fields.givenName.key}
          autoComplete="off"
          error={fields.givenName.errors}
        />
      </div>
      <TextField
        label="ID"
        optional
        hint="From the school’s list; zeros in front are kept. Left empty, one is made."
        {...getInputProps(fields.localId, { type: 'text' })}
        key={fields.localId.key}
        autoComplete="off"
        error={fields.localId.errors}
      />
      <div className="flex flex-wrap items-center gap-4">
        <SubmitButton pendingLabel="adding">add the student</SubmitButton>
        <p role="status" className="min-w-0 flex-1">
          {added && !form.errors ? `${sayName(added)} is on the roster, ID ${added.localId}.` : null}
        </p>
      </div>
    </form>
  );
}
