'use client';

import { RadioField } from '@/components/ui/choice';
import { Heading } from '@/components/ui/titles';
import type { RosterChoice } from '@/lib/contracts/sections';
import type { RosterRowView } from '@/lib/data/sections/roster-preview';
import type { FieldErrors } from '@/lib/result';
import { sayName } from '../../../_components/words';
import { count, quoteName } from './row-groups';

interface ConflictRowsProps {
  rows: readonly RosterRowView[];
  choices: Readonly<Record<string, RosterChoice>>;
  refused: FieldErrors;
  choose: (line: number, choice: RosterChoice) => void;
}

/** Rows and records that say two things of one student: the teacher says which holds. */
export function ConflictRows({ rows, choices, refused, choose }: ConflictRowsProps) {
  if (rows.length === 0) return null;
  return (
    <section className="max-w-[64rem]">
      <Heading className="border-b-outline border-ink pb-2">
        {count(rows.length, 'one row needs your word', 'rows need your word')}
      </Heading>
      {rows.map((row) => (
        <fieldset
          key={row.line}
          aria-describedby={refused[`choices.${row.line}`] ? `choice-${row.line}-error` : undefined}
          className="grid gap-x-8 border-b border-hair py-3 md:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]"
        >
          <legend className="float-left w-full font-[520] md:w-[calc(50%-1rem)]">
            <span className="tnum mr-3 text-ink-2">line {row.line}</span>
            {sayConflict(row)}
          </legend>
          <div className="md:col-start-2">
            {row.choices.map((choice) => (
              <RadioField
                key={choice}
                name={`choice-${row.line}`}
                label={sayChoice(row, choice)}
                checked={choices[row.line] === choice}
                onChange={() => choose(row.line, choice)}
              />
            ))}
            {refused[`choices.${row.line}`]?.map((message) => (
              <p key={message} id={`choice-${row.line}-error`} className="text-label font-[580] text-refuse">
                {message}
              </p>
            ))}
          </div>
        </fieldset>
      ))}
    </section>
  );
}

function sayConflict({ kind, localId, known, ...row }: RosterRowView): string {
  if (!known) return sayName(row);
  return kind === 'name-conflict'
    ? `The ID ${localId} belongs to ${quoteName(known)}; this row says ${quoteName(row)}.`
    : `The roster has ${quoteName(known)} under ${known.localId ? `the ID ${known.localId}` : 'no ID'}; this row says ${localId}.`;
}

function sayChoice({ localId, known, ...row }: RosterRowView, choice: RosterChoice): string {
  switch (choice) {
    case 'keep':
      return known ? `the name stays ${quoteName(known)}` : 'the name stays';
    case 'rename':
      return `the name becomes ${quoteName(row)}`;
    case 'renumber':
      return `the same student, whose ID becomes ${localId}`;
    case 'add':
      return 'another student of the same name';
    case 'skip':
      return 'leave this row out';
  }
}
