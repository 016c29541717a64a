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
        <ConflictRow
          key={row.line}
          row={row}
          chosen={choices[row.line]}
          refused={refused[`choices.${row.line}`]}
          choose={(choice) => choose(row.line, choice)}
        />
      ))}
    </section>
  );
}

interface ConflictRowProps {
  row: RosterRowView;
  chosen: RosterChoice | undefined;
  refused: string[] | undefined;
  choose: (choice: RosterChoice) => void;
}

function ConflictRow({ row, chosen, refused, choose }: ConflictRowProps) {
  const id = `conflict-${row.line}`;
  return (
    <fieldset
      aria-describedby={refused ? `${id}-said ${id}-error` : `${id}-said`}
      className="border-b border-hair py-3"
    >
      <legend className="sr-only">line {row.line}</legend>
      <div className="grid gap-x-12 gap-y-2 md:grid-cols-2">
        <div className="grid grid-cols-[4rem_minmax(0,1fr)] content-start py-2">
          <span className="tnum text-ink-2">line {row.line}</span>
          <p id={`${id}-said`} className="font-[520]">
            {sayConflict(row)}
          </p>
        </div>
        <div>
          {row.choices.map((choice) => (
            <RadioField
              key={choice}
              name={id}
              label={sayChoice(row, choice)}
              checked={chosen === choice}
              onChange={() => choose(choice)}
            />
          ))}
          {refused ? (
            <p id={`${id}-error`} className="text-label font-[580] text-refuse">
              {refused.join(' ')}
            </p>
          ) : null}
        </div>
      </div>
    </fieldset>
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
