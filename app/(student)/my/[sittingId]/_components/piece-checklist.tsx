'use client';

import { useEffect, useState } from 'react';
import { OtherSize } from '@/components/other-unit/other-unit';
import { CheckboxField } from '@/components/ui/choice';
import { SizeText } from '@/components/ui/fraction';
import { Heading } from '@/components/ui/titles';
import { listPieces } from '@/lib/round/pieces';
import type { Rubric } from '@/lib/scoring';
import { readTicks, writeTicks } from '@/lib/sync/client/own-ticks';

interface PieceChecklistProps {
  rubric: Rubric;
  personId: string;
  attemptId: string;
}

/** The pieces, to tick off while cutting. It keeps no score and tells nobody. */
export function PieceChecklist({ rubric, personId, attemptId }: PieceChecklistProps) {
  const [ticked, setTicked] = useState<readonly string[]>([]);
  const pieces = listPieces(rubric);

  useEffect(() => {
    readTicks(personId, attemptId).then(setTicked, () => {});
  }, [personId, attemptId]);

  function tick(key: string, on: boolean) {
    const next = on ? [...ticked, key] : ticked.filter((each) => each !== key);
    setTicked(next);
    writeTicks(personId, attemptId, next).catch(() => {});
  }

  const done = pieces.filter(({ line, ordinal }) => ticked.includes(`${line.id}/${ordinal}`)).length;
  return (
    <section>
      <div className="flex items-baseline justify-between border-b-outline border-ink pb-1">
        <Heading>While you cut</Heading>
        <p className="tnum text-label text-ink-2" role="status">
          {done} of {pieces.length} cut
        </p>
      </div>
      <ul className="sm:grid sm:grid-cols-2 sm:gap-x-6">
        {pieces.map(({ line, ordinal, label }) => {
          const key = `${line.id}/${ordinal}`;
          return (
            <li key={key} className="border-b border-hair">
              <CheckboxField
                checked={ticked.includes(key)}
                onChange={(event) => tick(key, event.target.checked)}
                label={
                  <>
                    <span className="font-[580]">{label}</span>{' '}
                    <SizeText {...line.target} unit={rubric.unit} className="ml-1 text-label text-ink-2" />
                    <OtherSize size={line.target} unit={rubric.unit} className="block text-label leading-5" />
                  </>
                }
              />
            </li>
          );
        })}
      </ul>
      <p className="mt-2 text-label text-ink-2">
        The ticks stay on this device. Nothing is scored while you cut.
      </p>
    </section>
  );
}
