'use client';

import { getFormProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { SubmitButton } from '@/components/ui/submit-button';
import { setUpSchoolInput } from '@/lib/contracts/school';
import { setUpSchoolAction } from '../actions';
import { SchoolFields } from './school-fields';
import { TermFields } from './term-fields';
import { YourFields } from './your-fields';

interface SetUpFormProps {
  secret: string;
  term: { name: string; startsOn: string; endsOn: string };
  zones: readonly string[];
}

export function SetUpForm({ secret, term, zones }: SetUpFormProps) {
  const [lastResult, action] = useActionState(setUpSchoolAction, undefined);
  const [form, fields] = useForm({
    id: 'set-up',
    lastResult,
    defaultValue: {
      unit: 'in',
      departmentName: 'Wood and design',
      termName: term.name,
      startsOn: term.startsOn,
      endsOn: term.endsOn,
      teaches: 'on',
    },
    shouldRevalidate: 'onInput',
    onValidate: ({ formData }) => parseWithZod(formData, { schema: setUpSchoolInput }),
  });
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="flex flex-1 flex-col">
      <FormRefusal errors={form.errors} />
      <FormRefusal errors={fields.secret.errors} />
      <input type="hidden" name="secret" value={secret} />
      <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-3">
        <SchoolFields fields={fields} zones={zones} />
        <TermFields fields={fields} />
        <YourFields fields={fields} />
      </div>
      <div className="mt-8 flex justify-end max-md:justify-stretch">
        <SubmitButton className="max-md:w-full" pendingLabel="making the school">
          make the school and go in
        </SubmitButton>
      </div>
    </form>
  );
}
