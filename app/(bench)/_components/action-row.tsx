'use client';

import { listUnread } from '@/lib/round/cursor';
import { openCheckCells, unreadOfLine } from '@/lib/round/gauge';
import { findPiece } from '@/lib/round/pieces';
import { recordOf } from '@/lib/round/record';
import { fullName, nextStudent } from '@/lib/round/students';
import { useBench } from './bench-context';
import { BenchKey, KeyGroup } from './bench-parts';

/** What is pressed for a line, a student or a piece; each key says what it would do now. */
export function ActionRow() {
  const { view, press } = useBench();
  const { state } = view;
  const { rubric, mayFinish } = state.plan;
  const place = state.spot && findPiece(rubric, state.spot);
  const line = unreadOfLine(state).length;
  const rest = listUnread(rubric, recordOf(state)).length;
  const checks = openCheckCells(state).length;
  const last = state.presses.at(-1);
  const next = nextStudent(state);
  const away = last !== undefined && last.attemptId !== state.attemptId;
  const asked = state.asked?.about;
  return (
    <div className="grid gap-2 max-lg:grid-cols-1 lg:flex lg:gap-[13px]">
      <KeyGroup label="take back" className="lg:flex-[134]">
        <BenchKey
          onPress={() => press({ do: 'undo' })}
          idle={!last}
          note={last ? (away ? 'the student before' : last.label) : 'nothing yet'}
          className="w-full"
        >
          undo
        </BenchKey>
      </KeyGroup>
      <KeyGroup label="gauged by eye or block" className="lg:flex-[384]">
        <BenchKey
          onPress={() => press({ do: 'line-ok' })}
          idle={line === 0}
          note={gauges(line)}
          className="flex-1"
        >
          line OK
        </BenchKey>
        <BenchKey
          onPress={() => press({ do: 'rest-ok' })}
          idle={rest === 0}
          note={gauges(rest)}
          className="flex-1"
        >
          rest OK
        </BenchKey>
        <BenchKey
          onPress={() => press({ do: 'all-good' })}
          idle={checks === 0}
          note={checks === 0 ? 'checks are set' : 'all checks'}
          className="flex-1"
        >
          all good
        </BenchKey>
      </KeyGroup>
      <KeyGroup label="the piece in hand" className="lg:flex-[348]">
        <BenchKey
          onPress={() => press({ do: 'ask', about: 'missing' })}
          kind={asked === 'missing' ? 'open' : 'plain'}
          idle={!place}
          note={place?.label ?? 'tap a piece'}
          className="flex-1"
        >
          missing
        </BenchKey>
        <BenchKey
          onPress={() => press({ do: 'ask', about: 'held' })}
          kind={asked === 'held' ? 'open' : 'plain'}
          idle={!place}
          note={place?.label ?? 'tap a piece'}
          className="flex-1"
        >
          held
        </BenchKey>
        <BenchKey
          onPress={() => press({ do: 'ask', about: 'spoiled' })}
          kind={asked === 'spoiled' ? 'open' : 'plain'}
          idle={!place}
          note={state.spot ? `this ${state.spot.axis}` : 'tap a size'}
          className="flex-1"
        >
          spoiled
        </BenchKey>
      </KeyGroup>
      <KeyGroup label="the student in hand" className="lg:flex-[238]">
        <BenchKey onPress={() => press({ do: 'skip' })} note="come back" className="flex-[2]">
          skip
        </BenchKey>
        <BenchKey
          onPress={() => press({ do: mayFinish ? 'finish' : 'next' })}
          kind={asked === 'finish' ? 'open' : 'act'}
          note={next ? fullName(next) : 'end of the round'}
          className="flex-[3]"
        >
          {mayFinish ? 'finish' : 'next'}
        </BenchKey>
      </KeyGroup>
    </div>
  );
}

function gauges(count: number): string {
  if (count === 0) return 'nothing unread';
  return count === 1 ? 'gauges 1 size' : `gauges ${count} sizes`;
}
