'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { CheckboxField } from '@/components/ui/choice';
import { Refusal } from '@/components/ui/refusal';
import { Verdict } from '@/components/ui/titles';
import type { RosterChoice } from '@/lib/contracts/sections';
import type { LookedAt } from '../actions';
import { ColumnChoice } from './column-choice';
import { ConflictRows } from './conflict-rows';
import { PlainRows } from './plain-rows';
import { ProblemRows } from './problem-rows';
import { count, groupRows, sayGroups } from './row-groups';
import type { RosterImportState } from './use-roster-import';

interface RowsStepProps {
  state: RosterImportState;
  looked: LookedAt;
}

/** What an import would do, row by row, before anything is written. */
export function RowsStep({ state, looked }: RowsStepProps) {
  const { preview, roster, fileName, note } = looked;
  const { refused, pending } = state;
  const [choices, setChoices] = useState<Record<string, RosterChoice>>({});
  const [leaveOut, setLeaveOut] = useState(false);
  const groups = groupRows(preview.rows);
  const { problems, conflicts, coming } = groups;
  const anything = coming.length + conflicts.length > 0;
  const sure = preview.layout.sure;
  const why = whyNotYet(problems.length > 0 && !leaveOut, conflicts.length - Object.keys(choices).length);
  const lookAgain = () => state.lookAtText(roster);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
      <header className="grid gap-2">
        <Verdict role="status">{sure ? sayGroups(groups) : 'Say which column holds what.'}</Verdict>
        <p className="text-label text-ink-2">
          {fileName ? `From ${fileName}. ` : ''}
          {note ? `${note} ` : ''}Nothing is written yet.
        </p>
      </header>
      {refused[''] ? <Refusal title={refused['']} /> : null}
      {refused.stale ? (
        <Refusal title={refused.stale} action={<Button onClick={lookAgain}>look at the rows again</Button>} />
      ) : null}
      {roster.kind === 'csv' ? <ColumnChoice state={state} looked={looked} /> : null}
      {sure ? (
        <>
          <ProblemRows rows={problems} />
          <ConflictRows
            rows={conflicts}
            choices={choices}
            refused={refused}
            choose={(line, choice) => setChoices((made) => ({ ...made, [line]: choice }))}
          />
          <PlainRows groups={groups} />
        </>
      ) : null}
      <div className="grid gap-2 border-t-edge border-ink pt-4">
        {sure && anything && problems.length > 0 ? (
          <CheckboxField
            label={`leave out ${count(problems.length, 'the row that cannot be used', 'rows that cannot be used')}`}
            checked={leaveOut}
            onChange={(event) => setLeaveOut(event.currentTarget.checked)}
          />
        ) : null}
        {sure && anything && why ? (
          <p className="text-label text-ink-2">Before they come in, {why}.</p>
        ) : null}
        <div className="flex flex-wrap items-center gap-2">
          {sure && anything ? (
            <Button
              kind="act"
              disabled={pending}
              aria-busy={pending}
              notYet={why}
              onClick={() => state.bringIn(looked, choices, leaveOut)}
            >
              {pending ? 'bringing them in' : 'bring them in'}
            </Button>
          ) : null}
          <Button onClick={state.toText}>change the text</Button>
        </div>
      </div>
    </div>
  );
}

function whyNotYet(problems: boolean, open: number): string | null {
  if (problems) return 'correct the rows that cannot be used in the text, or leave them out';
  if (open > 0) return open === 1 ? 'say what holds in one row' : `say what holds in ${open} rows`;
  return null;
}
