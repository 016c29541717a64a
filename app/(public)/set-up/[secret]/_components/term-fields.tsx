'use client';

import { getInputProps } from '@conform-to/react';
import { TextField } from '@/components/ui/text-field';
import { Heading } from '@/components/ui/titles';
import type { SetUpFields } from './set-up-fields';

export function TermFields({ fields }: { fields: SetUpFields }) {
  return (
    <section className="grid gap-4">
      <Heading className="border-b border-ink pb-1">department and term</Heading>
      <TextField
        label="department"
        {...getInputProps(fields.departmentName, { type: 'text' })}
        key={fields.departmentName.key}
        hint="More can be added later."
        error={fields.departmentName.errors}
      />
      <TextField
        label="this term"
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
    </section>
  );
}
