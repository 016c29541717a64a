import 'server-only';
import type { Transaction } from '@/db/client';
import {
  insertMissingAttempts,
  selectBenchEvents,
  selectNames,
  selectRound,
  selectRoundStudents,
} from '@/db/queries/rounds';
import { may } from '@/lib/auth/policy';
import { type RoundBundle, sittingInput } from '@/lib/contracts/rounds';
import { taskSchema } from '@/lib/practicals/task';
import { rubricSchema } from '@/lib/scoring/schemas';
import { asReadingEvent } from '@/lib/sync/server/stored-event';
import { defineVerb } from '../verb';
import { inHandView } from './in-hand-view';
import { roundSubject } from './round-subject';

/**
 * All that a device needs for a round. Students' own readings are left out: seen before recording, they would
 * anchor whoever measures.
 */
export const readRound = defineVerb({
  action: 'round.read',
  input: sittingInput,
  async run({ actor, input, tx, found, authorize, logView }): Promise<RoundBundle> {
    const { schoolId } = actor;
    const round = found(await selectRound(tx, schoolId, input.sittingId));
    const { subject } = await roundSubject(tx, round);
    authorize(subject);
    await insertMissingAttempts(tx, schoolId, round.sittingId, round.sectionId);
    const students = await selectRoundStudents(tx, schoolId, round.sittingId, round.sectionId);
    const events = await readEvents(
      tx,
      schoolId,
      students.map(({ attemptId }) => attemptId),
    );
    await logView({
      subjectKind: 'sitting',
      subjectId: round.sittingId,
      details: { students: students.map(({ studentId }) => studentId) },
    });
    return {
      sittingId: round.sittingId,
      published: round.state === 'published',
      sectionName: round.sectionName,
      period: round.period,
      schoolName: round.schoolName,
      task: taskSchema.parse(round.task),
      rubric: rubricSchema.parse(round.rubric),
      versionNumber: round.versionNumber,
      students,
      ...events,
      inHand: await inHandView(tx, schoolId, round.sittingId, null),
      may: { finish: may(actor, 'round.finish', subject), settle: may(actor, 'round.settle', subject) },
    };
  },
});

async function readEvents(
  tx: Transaction,
  schoolId: string,
  attemptIds: string[],
): Promise<Pick<RoundBundle, 'events' | 'authors'>> {
  if (attemptIds.length === 0) return { events: [], authors: {} };
  const rows = await selectBenchEvents(tx, schoolId, attemptIds);
  const authorIds = [...new Set(rows.map(({ authorId }) => authorId))];
  const authors = authorIds.length > 0 ? await selectNames(tx, schoolId, authorIds) : [];
  return {
    events: rows.map((row) => ({ ...asReadingEvent(row), deviceId: row.deviceId })),
    authors: Object.fromEntries(
      authors.map(({ id, givenName, familyName }) => [id, `${givenName} ${familyName}`.trim()]),
    ),
  };
}
