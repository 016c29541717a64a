'use client';

import { studentStatus } from '@/lib/round/students';
import { useBench } from './bench-context';
import { BenchKey } from './bench-parts';
import { Choice } from './choice-panel';

/** Nobody is left who is present and unread: who is missing from the round, one tap each by way of the roster. */
export function RoundEnd() {
  const { view, open, press } = useBench();
  const { state } = view;
  const all = state.plan.students.map((student) => studentStatus(state, student));
  const count = (test: (status: (typeof all)[number]) => boolean) => all.filter(test).length;
  const parts = [
    [count(({ finished }) => finished), 'finished'],
    [count(({ standing }) => standing === 'absent'), 'absent'],
    [count(({ unread, standing }) => unread > 0 && standing === 'expected'), 'with sizes unread'],
    [count(({ held }) => held > 0), 'with a piece held'],
    [count(({ conflicts }) => conflicts > 0), 'with two readings'],
  ].filter(([number]) => number !== 0);
  return (
    <Choice title="Everyone present has been marked." back="stay here">
      <p className="w-full text-lead text-ink-2">
        {parts.map(([number, words]) => `${number} ${words}`).join(', ')}.
      </p>
      <BenchKey
        kind="act"
        className="min-w-48"
        note="absent, held, unread"
        onPress={() => {
          press({ do: 'cancel' });
          open('students');
        }}
      >
        who is left
      </BenchKey>
    </Choice>
  );
}
