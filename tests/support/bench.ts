import { act } from '@/lib/round/act';
import { startRound } from '@/lib/round/start-round';
import type { Action, BenchEvent, Mint, Outcome, RoundPlan, RoundState } from '@/lib/round/types';
import type { Rubric } from '@/lib/scoring';
import { defaultRubric, ticksOf } from './rubrics';

/** Ids and times in order, from 1. */
export function countingMint(prefix = '0'): Mint {
  let count = 0;
  const next = () => String(++count).padStart(12, '0');
  return {
    id: () => `${prefix.repeat(8)}-0000-4000-8000-${next()}`,
    now: () => `2026-12-01T15:00:00.${String(count % 1000).padStart(3, '0')}Z`,
  };
}

export const STUDENTS = ['ana', 'ben', 'cleo', 'dov'].map((givenName) => ({
  attemptId: `attempt-${givenName}`,
  attemptNumber: 1,
  givenName,
  familyName: 'Test',
}));

export function planFor(
  rubric: Rubric = defaultRubric(),
  who: Partial<Pick<RoundPlan, 'personId' | 'mayFinish' | 'maySettle'>> = {},
): RoundPlan {
  return { rubric, students: STUDENTS, personId: 'teacher', mayFinish: true, maySettle: true, ...who };
}

/** A bench under test: it counts the taps, and keeps what was recorded. */
export class TestBench {
  state: RoundState;
  taps = 0;
  last: Outcome | null = null;
  readonly made: BenchEvent[] = [];

  constructor(
    plan: RoundPlan = planFor(),
    readonly mint: Mint = countingMint(),
    events: readonly BenchEvent[] = [],
  ) {
    this.state = startRound(plan, events);
  }

  tap(action: Action): Outcome {
    this.taps += 1;
    return this.feed(action);
  }

  /** An action that is no tap: a reading from an instrument. */
  feed(action: Action): Outcome {
    const outcome = act(this.state, action, this.mint);
    this.state = outcome.state;
    this.last = outcome;
    this.made.push(...outcome.made);
    return outcome;
  }

  /** Presses the graduation that many steps of 1/32 in from the target under the cursor. */
  step(count: number): Outcome {
    const spot = this.state.spot;
    const line = this.state.plan.rubric.lines.find(({ id }) => id === spot?.lineId);
    if (!spot || !line) throw new Error('the cursor stands nowhere');
    const ticks = line.target[spot.axis] + count * ticksOf('1/32');
    return this.tap({
      do: 'read',
      reading: { ticks, typed: String(ticks), unit: 'in', instrument: 'rule' },
    });
  }

  point(lineId: string, ordinal: number, what: string): Outcome {
    return this.tap({ do: 'point', lineId, ordinal, what });
  }
}
