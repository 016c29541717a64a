'use client';

import { type FieldMetadata, getInputProps, getSelectProps } from '@conform-to/react';
import { useState } from 'react';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { NEW_TERM } from '@/lib/contracts/sections';

interface TermChoiceProps {
  fields: { termId: FieldMetadata<string> } & Record<
    'termName' | 'startsOn' | 'endsOn',
    FieldMetadata<unknown>
  >;
  terms: { termId: string; name: string }[];
}

/** One of the school's terms, or a new one; a school without any starts with a new one. */
export function TermChoice({ fields, terms }: TermChoiceProps) {
  const [chosen, setChosen] = useState(fields.termId.initialValue ?? '');
  return (
    <>
      {terms.length === 0 ? (
        <input type="hidden" name={fields.termId.name} value={NEW_TERM} />
      ) : (
        <SelectField
          label="term"
          placeholder="choose a term"
          options={[
            ...terms.map(({ termId, name }) => ({ value: termId, label: name })),
            { value: NEW_TERM, label: 'a new term' },
          ]}
          {...getSelectProps(fields.termId)}
          key={fields.termId.key}
          onChange={(event) => setChosen(event.currentTarget.value)}
          error={fields.termId.errors}
        />
      )}
      {chosen === NEW_TERM ? (
        <fieldset className="grid gap-4 border-l-edge border-ink pl-4 sm:grid-cols-2">
          <legend className="sr-only">the new term</legend>
          <TextField
            label="name of the term"
            className="sm:col-span-2"
            {...getInputProps(fields.termName, { type: 'text' })}
            key={fields.termName.key}
            autoComplete="off"
            error={fields.termName.errors}
          />
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
        </fieldset>
      ) : null}
    </>
  );
}
