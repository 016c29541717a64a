import { randomUUID } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { describe, expect, test } from 'vitest';
import { lockAttempts } from '@/db/queries/rounds';
import { lockSitting } from '@/db/queries/sittings';
import { makeAccommodation } from '@/lib/data/accommodations/make-accommodation';
import { takeInHand } from '@/lib/data/rounds/take-in-hand';
import { accommodationOf, modifyFor } from '@/tests/support/accommodations';
import { value } from '@/tests/support/answers';
import { inSchoolAs, ownerSql } from '@/tests/support/database';
import { outcomes, push } from '@/tests/support/push-events';
import { eventOf, stageRound } from '@/tests/support/round-stage';
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

test('a reading is received after the publication that it had to wait for', async () => {
  const { school, teacher, sittingId, attempts } = await stageRound();
  const event = eventOf(teacher, attempts[0]);
  const { sending, moment } = await inSchoolAs(school.id, async (tx) => {
    await lockAttempts(tx, school.id, sittingId, attempts);
    const begun = outcomes(push(teacher, sittingId, [event]));
    await untilWaiting();
    const [row] = await tx.execute<{ moment: string }>(sql`select clock_timestamp()::text as moment`);
    return { sending: begun, moment: row?.moment ?? '' };
  });
  expect(await sending).toEqual(['kept']);
  const [row] = await ownerSql()`
    select received_at > ${moment}::text::timestamptz as after from reading_events where id = ${event.id}`;
  expect(row?.after).toBe(true);
});
