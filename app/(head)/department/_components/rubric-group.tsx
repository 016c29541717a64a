'use client';

import { useState } from 'react';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { Button } from '@/components/ui/button';
import type { ComparableRubrics, RubricInUse } from '@/lib/data/department/list-rubrics';

const MOST = 6;

/** Rubrics of one cut list; those that are ticked are laid side by side. */
export function RubricGroup({ group, about }: { group: ComparableRubrics; about: string }) {
  const { title, rubrics } = group;
  const [chosen, setChosen] = useState(() => firstChoice(rubrics));
  const alone = rubrics.length < 2;
  const notYet =
    chosen.length < 2 ? 'tick two rubrics or more' : chosen.length > MOST ? `tick at most ${MOST}` : null;
  const tick = (versionId: string, on: boolean) =>
    setChosen((before) => (on ? [...before, versionId] : before.filter((each) => each !== versionId)));
  return (
    <form action="/department/compare" aria-label={`rubrics of ${title}`}>
      <div className="mb-2 flex flex-wrap items-end gap-x-4 gap-y-2">
        <h2 className="font-title text-[1.4375rem] leading-7 font-[620]">{title}</h2>
        <p className="text-label text-ink-2">{about}</p>
        {alone ? (
          <p className="text-label text-ink-2 md:ml-auto">one rubric: nothing to compare it with yet</p>
        ) : (
          <Button type="submit" notYet={notYet} className="md:ml-auto">
            lay side by side
          </Button>
        )}
      </div>
      <Table caption={`rubrics of ${title}`}>
        <TableHead>
          <tr>
            <HeadCell className="w-20">
              {alone ? <span className="sr-only">compare</span> : 'compare'}
            </HeadCell>
            <HeadCell className="w-[32%]">teacher</HeadCell>
            <HeadCell className="w-[28%]">rubric</HeadCell>
            <HeadCell>used in</HeadCell>
          </tr>
        </TableHead>
        <TableBody>
          {rubrics.map((rubric) => (
            <tr key={rubric.versionId}>
              <Cell className="align-middle">
                {alone ? null : (
                  <input
                    type="checkbox"
                    name="versions"
                    value={rubric.versionId}
                    aria-label={`${rubric.ownerName}, version ${rubric.number}`}
                    checked={chosen.includes(rubric.versionId)}
                    onChange={(event) => tick(rubric.versionId, event.target.checked)}
                    className="choice-check block size-6 cursor-pointer appearance-none border-outline border-ink bg-plate checked:border-act checked:bg-act"
                  />
                )}
              </Cell>
              <RowHead className="align-middle">{rubric.ownerName}</RowHead>
              <Cell className="align-middle">
                version {rubric.number}
                {rubric.isNewest ? '' : ', since replaced'}
              </Cell>
              <Cell className="align-middle">{usedIn(rubric)}</Cell>
            </tr>
          ))}
        </TableBody>
      </Table>
    </form>
  );
}

/** What most heads want to see first: the rubrics that sittings use, else the newest of each teacher. */
function firstChoice(rubrics: readonly RubricInUse[]): string[] {
  const used = rubrics.filter(({ sittings }) => sittings > 0);
  const first = used.length > 1 ? used : rubrics;
  return first.slice(0, MOST).map(({ versionId }) => versionId);
}

function usedIn({ sittings, periods }: RubricInUse): string {
  if (sittings === 0) return 'no sitting yet';
  return `${periods.length === 1 ? 'period' : 'periods'} ${periods.join(', ')}`;
}
