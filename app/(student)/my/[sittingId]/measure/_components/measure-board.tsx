'use client';

import { OtherUnitSwitch, TargetInOther } from '@/components/other-unit/other-unit';
import { PartDrawing } from '@/components/part/part-drawing';
import { PhoneActions } from '@/components/shell/phone-actions';
import { LinkButton } from '@/components/ui/link-button';
import type { OwnTaskView } from '@/lib/data/own/read-task';
import { listOpen } from '@/lib/practicals/own-record';
import type { OwnSession, OwnView } from '@/lib/sync/client/own-session';
import { EntryKeys } from './entry-keys';
import { KeptLine, KeptTrouble } from './kept-line';
import { LockKey } from './lock-key';
import { ReadingField } from './reading-field';
import { SizeMap } from './size-map';
import { useMeasuring } from './use-measuring';
import { WhatElse } from './what-else';
import { WhatIsLeft } from './what-is-left';

interface MeasureBoardProps {
  session: OwnSession;
  view: OwnView;
  task: OwnTaskView;
}

/** Measuring one's own pieces: which size, where to hold, what it reads. No score and no deviation before the lock. */
export function MeasureBoard({ session, view, task }: MeasureBoardProps) {
  const measuring = useMeasuring(session, view, task);
  const { rubric } = task;
  const { place, spot } = measuring;
  const left = listOpen(rubric, view.record);
  return (
    <>
      <div className="flex items-baseline justify-between gap-4">
        <h1 className="font-title text-[1.5rem] leading-8 font-[620]">{task.task.title}</h1>
        <KeptLine view={view} />
      </div>
      <KeptTrouble view={view} session={session} />
      <div className="mt-2 grid grid-cols-[minmax(0,1fr)] gap-x-6 pb-4 sm:grid-cols-[minmax(0,1fr)_19rem]">
        <div>
          <SizeMap rubric={rubric} record={view.record} spot={spot} onPoint={measuring.point} />
          {place && spot ? (
            <div className="mx-auto mt-2 max-w-[22rem] sm:max-w-none">
              <PartDrawing
                size={place.line.target}
                unit={rubric.unit}
                axis={spot.axis}
                note
                label={place.label}
                width={500}
                height={250}
              />
              <TargetInOther ticks={place.line.target[spot.axis]} unit={rubric.unit} />
            </div>
          ) : null}
        </div>
        {place && spot ? (
          <div>
            <ReadingField measuring={measuring} record={view.record} unit={rubric.unit} />
            <EntryKeys measuring={measuring} unit={rubric.unit} />
            <WhatElse measuring={measuring} record={view.record} />
            <OtherUnitSwitch unit={rubric.unit} />
          </div>
        ) : (
          <p className="mt-4 text-lead">
            Every size is recorded. Tap one above to measure it again, or lock your readings.
          </p>
        )}
      </div>
      <div className="mt-auto [&>div]:static">
        <PhoneActions>
          <LinkButton href={`/my/${task.sittingId}`}>the task</LinkButton>
          <WhatIsLeft rubric={rubric} left={left} onPoint={measuring.point} />
          <LockKey left={left.length} record={view.record} onLock={() => session.lock()} />
        </PhoneActions>
      </div>
    </>
  );
}
