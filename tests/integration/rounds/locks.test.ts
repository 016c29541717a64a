import { randomUUID } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { describe, test } from 'vitest';
import { lockAttempts } from '@/db/queries/rounds';
import { lockSitting } from '@/db/queries/sittings';
import { makeAccommodation } from '@/lib/data/accommodations/make-accommodation';
import { takeInHand } from '@/lib/data/rounds/take-in-hand';
import { accommodationOf, modifyFor } from '@/tests/support/accommodations';
import { value } from '@/tests/support/answers';
import { inSchoolAs } from '@/tests/support/database';
import { stageRound } from '@/tests/support/round-stage';
import { untilWaiting } from '@/tests/support/waiting';

// Publishing and moving hold the sitting, then its attempts, and write rows that point at modified rubrics.
describe('while results are written, whoever waits', () => {
  test('to change a modified rubric lets sheets and results point at it', async () => {
    const stage = await stageRound();
    const { school, teacher, sittingId, attempts } = stage;
    const accommodationId = await modifyFor(stage);
    const { making } = await inSchoolAs(school.id, async (tx) => {
      await lockAttempts(tx, school.id, sittingId, attempts);
      const begun = makeAccommodation(teacher, accommodationOf(stage, { replaces: accommodationId }));
      await untilWaiting();
      await tx.execute(sql`select 1 from accommodations where id = ${accommodationId} for key share nowait`);
      return { making: begun };
    });
    value(await making);
  });

  test('to take a student in hand holds no attempt', async () => {
    const { school, teacher, sittingId, attempts } = await stageRound();
    const { taking } = await inSchoolAs(school.id, async (tx) => {
      await lockSitting(tx, school.id, sittingId);
      const begun = takeInHand(teacher, { sittingId, deviceId: randomUUID(), attemptId: attempts[0] });
      await untilWaiting();
      await tx.execute(sql`select 1 from attempts where id = ${attempts[0]} for update nowait`);
      return { taking: begun };
    });
    value(await taking);
  });
});
