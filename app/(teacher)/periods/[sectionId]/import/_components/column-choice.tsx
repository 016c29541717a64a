'use client';

import { useState } from 'react';
import { Cell, HeadCell, Table, TableBody, TableHead } from '@/components/table/table';
import { Button } from '@/components/ui/button';
import { CheckboxField } from '@/components/ui/choice';
import { Refusal } from '@/components/ui/refusal';
import { SelectField } from '@/components/ui/select-field';
import { hasTwice, holdsNames, ROSTER_COLUMNS, type RosterColumn } from '@/lib/csv/roster-columns';
import type { LookedAt } from '../actions';
import type { RosterImportState } from './use-roster-import';

const COLUMN_WORDS: Record<RosterColumn, string> = {
  localId: 'ID',
  familyName: 'family name',
  givenName: 'given name',
  fullName: 'whole name',
  none: 'not read',
};

const OPTIONS = ROSTER_COLUMNS.map((value) => ({ value, label: COLUMN_WORDS[value] }));

interface ColumnChoiceProps {
  state: RosterImportState;
  looked: LookedAt;
}

/** Which column holds what, over the first rows as they stand; open while that is not certain. */
export function ColumnChoice({ state, looked: { roster, preview } }: ColumnChoiceProps) {
  const { layout, first } = preview;
  const [columns, setColumns] = useState<readonly RosterColumn[]>(layout.columns);
  const [header, setHeader] = useState(layout.header);
  const why = whyNot(columns);
  const read = layout.columns.map((column) => COLUMN_WORDS[column]).join(', ');
  const choose = (index: number, chosen: string) =>
    setColumns(columns.map((column, at) => (at === index ? columnOf(chosen) : column)));
  return (
    <details open={!layout.sure} className="max-w-[64rem]">
      <summary className="py-2 marker:text-ink-2">
        <span className="link font-[620]">columns</span> read as {read}
      </summary>
      <div className="mt-2 grid gap-3">
        {state.refused['roster.layout'] ? <Refusal title={state.refused['roster.layout']} /> : null}
        <Table caption="the first rows, with what each column holds">
          <TableHead>
            <tr>
              {columns.map((column, index) => (
                <HeadCell key={index.toString()} className="min-w-40">
                  <SelectField
                    label={`column ${index + 1}`}
                    options={OPTIONS}
                    value={column}
                    onChange={(event) => choose(index, event.currentTarget.value)}
                  />
                </HeadCell>
              ))}
            </tr>
          </TableHead>
          <TableBody>
            {first.map(({ line, fields }, at) => (
              <tr key={line} className={header && at === 0 ? 'text-ink-2 line-through' : undefined}>
                {columns.map((column, index) => (
                  <Cell key={index.toString()} className={column === 'none' ? 'text-ink-2' : undefined}>
                    {fields[index]}
                  </Cell>
                ))}
              </tr>
            ))}
          </TableBody>
        </Table>
        <CheckboxField
          label="the first row names the columns and is not a student"
          checked={header}
          onChange={(event) => setHeader(event.currentTarget.checked)}
        />
        <div>
          <Button
            kind={layout.sure ? 'plain' : 'act'}
            notYet={why}
            onClick={() => state.lookAtText({ ...roster, layout: { header, columns } })}
          >
            read it so
          </Button>
          {why ? <p className="mt-1 text-label text-ink-2">{why}</p> : null}
        </div>
      </div>
    </details>
  );
}

function columnOf(chosen: string): RosterColumn {
  return ROSTER_COLUMNS.find((column) => column === chosen) ?? 'none';
}

function whyNot(columns: readonly RosterColumn[]): string | null {
  if (hasTwice(columns)) return 'Two columns hold the same. Set one of them to “not read”.';
  return holdsNames(columns)
    ? null
    : 'Names are needed: family name and given name in two columns, or whole names in one.';
}
