import type { Transaction } from '@/db/client';
import { attempts, readingEvents, sittings } from '@/db/schema';
import { rebuildSheets } from '@/lib/data/rounds/rebuild-sheets';
import { addDisorder } from './disorder';
import { recordOwnReadings } from './own-readings';
import type { SeededSchool, SeededSection, SeededStudent } from './people';
import { ROOMS, type SittingPlan } from './plan';
import { morningOf, type SeededVersion } from './practicals';
import type { Random } from './random';
import { Recorder, recordFinish, recordPieces, type SeedEvent } from './recording';
import { type MadePiece, makeHand, makePieces, stepOf } from './wood';

export interface SeededAttempt {
  id: string;
  student: SeededStudent;
  pieces: MadePiece[];
}

export interface SeededSitting {
  id: string;
  plan: SittingPlan;
  section: SeededSection;
  version: SeededVersion;
  attempts: SeededAttempt[];
}

/** A sitting with its attempts and everything recorded of them, priced. */
export async function seedSitting(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  versions: Map<string, SeededVersion>,
  plan: SittingPlan,
): Promise<SeededSitting> {
  const section = school.sections.get(plan.section);
  const version = versions.get(plan.practical);
  const room = ROOMS[plan.section];
  if (!section || !version || !room)
    throw new Error(`${plan.section} or ${plan.practical} is not in the plan`);
  const id = random.uuid();
  const openedAt = morningOf(plan.day);
  await tx.insert(sittings).values({
    ...{ schoolId: school.id, id, sectionId: section.id, practicalId: version.practicalId },
    ...{ rubricVersionId: version.id, openedBy: section.teacherId, openedAt, dueOn: plan.day },
  });
  const made = section.students.map((student) => ({
    id: random.uuid(),
    student,
    pieces: makePieces(random, version.rubric, makeHand(random, room)),
  }));
  await tx.insert(attempts).values(
    made.map((attempt) => ({
      ...{ schoolId: school.id, id: attempt.id, sittingId: id, studentId: attempt.student.id },
      ...{ number: 1, createdAt: openedAt },
    })),
  );
  const sitting = { id, plan, section, version, attempts: made };
  const events = recordSitting(random, sitting, room.graderBias);
  const disorder = await addDisorder(tx, random, school, sitting, events);
  const own = await recordOwnReadings(random, sitting);
  await insertEvents(tx, school.id, id, [...own, ...disorder]);
  await rebuildSheets(
    tx,
    school.id,
    made.map((attempt) => attempt.id),
  );
  return sitting;
}

/** How many students of the section the round has come to. */
function countMeasured(sitting: SeededSitting): number {
  const { state } = sitting.plan;
  if (state === 'open') return 0;
  return state === 'under way' ? Math.floor(sitting.attempts.length * 0.55) : sitting.attempts.length;
}

/** The teacher's round: bench by bench, each student finished before the next. */
function recordSitting(random: Random, sitting: SeededSitting, graderBias: number): SeedEvent[] {
  const { rubric } = sitting.version;
  const start = new Date(morningOf(sitting.plan.day).getTime() + 15 * 60_000);
  const recorder = new Recorder(random, random.uuid(), sitting.section.teacherId, 'bench', start);
  const bias = Math.round((graderBias * stepOf(rubric)) / 5);
  return sitting.attempts.slice(0, countMeasured(sitting)).flatMap((attempt) => {
    const instrument = random.chance(0.5) ? ('rule' as const) : ('caliper' as const);
    const reader = { bias, instrument, gauges: true };
    return [
      ...recordPieces(random, recorder, attempt.id, rubric, attempt.pieces, reader),
      ...recordFinish(random, recorder, attempt.id, rubric),
    ];
  });
}

const ROWS_A_STATEMENT = 500;

async function insertEvents(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  events: SeedEvent[],
): Promise<void> {
  const rows = events.map(({ cell, value, ...event }) => ({
    ...event,
    ...cell,
    ...{ schoolId, sittingId, value, senderId: event.authorId, receivedAt: event.capturedAt },
    readingTicks: value.kind === 'value' ? value.ticks : null,
  }));
  for (let from = 0; from < rows.length; from += ROWS_A_STATEMENT) {
    await tx.insert(readingEvents).values(rows.slice(from, from + ROWS_A_STATEMENT));
  }
}
