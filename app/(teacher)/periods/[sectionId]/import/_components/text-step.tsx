'use client';

import { type FormEvent, useRef } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { Button } from '@/components/ui/button';
import { FileField } from '@/components/ui/file-field';
import { Segmented } from '@/components/ui/segmented';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { RosterImportState } from './use-roster-import';

const HINTS = {
  names: 'One name a line: “Abara, Chidi” or “Chidi Abara”.',
  csv: 'One student a row, such as “00417;Abara;Chidi”. A first row may name the columns; without one you are asked.',
};

interface TextStepProps {
  state: RosterImportState;
  madeIdRule: string;
}

/** The names as text: pasted, typed, or out of a file. */
export function TextStep({ state, madeIdRule }: TextStepProps) {
  const { kind, text, refused, pending } = state;
  const fileBox = useRef<HTMLInputElement>(null);

  function look(event: FormEvent) {
    event.preventDefault();
    const file = fileBox.current?.files?.[0];
    if (file) state.lookAtFile(file);
    else state.lookAtText({ kind, text });
  }

  return (
    <form onSubmit={look} noValidate className="grid max-w-[58rem] gap-6">
      <FormRefusal errors={refused['']} />
      <div className="grid gap-4">
        <Segmented
          label="how the names are written"
          className="max-w-[26rem]"
          options={[
            { value: 'names', label: 'names, one a line' },
            { value: 'csv', label: 'CSV, with columns' },
          ]}
          value={kind}
          onChange={(value) => state.setKind(value === 'csv' ? 'csv' : 'names')}
        />
        <TextAreaField
          label={kind === 'csv' ? 'rows' : 'names'}
          name="text"
          rows={12}
          spellCheck={false}
          value={text}
          onChange={(event) => state.setText(event.currentTarget.value)}
          hint={`${HINTS[kind]} ${madeIdRule}`}
          error={refused['roster.text']}
        />
      </div>
      <FileField
        ref={fileBox}
        label="or a CSV file"
        name="file"
        accept=".csv,.tsv,.txt,text/csv,text/plain"
        className="max-w-[34rem]"
        error={refused.file}
      />
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" kind="act" disabled={pending} aria-busy={pending}>
          {pending ? 'looking' : 'look at the rows'}
        </Button>
        <p className="text-label text-ink-2">Nothing is written yet.</p>
      </div>
    </form>
  );
}
