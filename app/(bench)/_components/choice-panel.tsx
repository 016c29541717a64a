'use client';

import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import type { Asked } from '@/lib/round/types';
import { useBench } from './bench-context';
import { CheckChoice } from './check-choice';
import { ConflictChoice } from './conflict-choice';
import {
  FinishChoice,
  FoundChoice,
  HeldChoice,
  MissingChoice,
  SpoiledChoice,
  UnitChoice,
} from './piece-choices';
import { RoundEnd } from './round-end';

/** What the last tap opened; the answer is the second tap. */
export function ChoicePanel({ asked }: { asked: Asked }) {
  switch (asked.about) {
    case 'missing':
      return <MissingChoice asked={asked} />;
    case 'held':
      return <HeldChoice asked={asked} />;
    case 'spoiled':
      return <SpoiledChoice asked={asked} />;
    case 'found':
      return <FoundChoice asked={asked} />;
    case 'checks':
      return <CheckChoice at={asked} />;
    case 'work':
      return <CheckChoice at={null} />;
    case 'conflict':
      return <ConflictChoice cell={asked.cell} />;
    case 'finish':
      return <FinishChoice asked={asked} />;
    case 'unit':
      return <UnitChoice asked={asked} />;
    case 'round-end':
      return <RoundEnd />;
  }
}

interface ChoiceProps {
  title: ReactNode;
  children: ReactNode;
  /** What the key that leaves things as they are is called; none where there is nothing to leave. */
  back?: string;
}

/** A question over the entry: what it is about, its answers as large keys, and the way back. */
export function Choice({ title, children, back = 'back' }: ChoiceProps) {
  const { press } = useBench();
  return (
    <section
      aria-label="choose"
      className="flex flex-col gap-3 border-outline border-t-edge border-ink p-4 lg:h-[246px]"
    >
      <h2 className="narrow flex min-h-7 items-start justify-between gap-4 text-[24px] leading-7 font-[660]">
        <span>{title}</span>
      </h2>
      <div className="flex min-h-0 flex-1 flex-wrap content-start items-stretch gap-2">
        {children}
        <button
          type="button"
          onClick={() => press({ do: 'cancel' })}
          className={classNames(
            'ml-auto min-h-touch min-w-touch self-end px-4 text-key underline decoration-[2px] underline-offset-4',
          )}
        >
          {back}
        </button>
      </div>
    </section>
  );
}
