import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { endAccommodation } from '@/lib/data/accommodations/end-accommodation';
import { readReason } from '@/lib/data/accommodations/read-reason';
import { modifyFor, REASON } from '@/tests/support/accommodations';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { logOf, makeActor, whileLogFails } from '@/tests/support/school';

let stage: RoundStage;
let accommodationId: string;

beforeAll(async () => {
  stage = await stageRound();
  accommodationId = await modifyFor(stage);
});

const looks = async () =>
  (await logOf(stage.school)).filter(({ action }) => action === 'accommodation.reason');

describe('readReason', () => {
  it('gives the reason to the teacher and the head of the department, and logs each single look', async () => {
    const head = await makeActor(stage.school, 'head');
    const before = await looks();
    for (const actor of [stage.teacher, stage.teacher, head]) {
      expect(value(await readReason(actor, { accommodationId }))).toMatchObject({
        reason: REASON,
        writtenBy: 'Dayo Okonjo',
      });
    }
    const about = stage.students[0].personId;
    expect((await looks()).slice(before.length)).toEqual(
      [stage.teacher, stage.teacher, head].map(({ personId }) => ({
        action: 'accommodation.reason',
        actor_id: personId,
        about_person_id: about,
        details: {},
      })),
    );
  });

  it('shows nothing when the look cannot be logged', async () => {
    const answer = await whileLogFails(() => readReason(stage.teacher, { accommodationId }));
    expect(answer).toBeInstanceOf(Error);
    expect(String(answer)).not.toContain(REASON);
  });

  it('gives it to nobody else', async () => {
    const { school, aide, students } = stage;
    for (const actor of [aide, students[0], students[1], await makeActor(school, 'admin')]) {
      expect(code(await readReason(actor, { accommodationId }))).toBe('forbidden');
    }
    const [metal] = await ownerSql()<{ id: string }[]>`
      insert into departments (school_id, name) values (${school.id}, 'Metal') returning id`;
    const otherHead = { ...(await makeActor(school, 'head')), departmentId: metal?.id ?? '' };
    for (const actor of [await makeActor(school, 'teacher'), otherHead]) {
      expect(code(await readReason(actor, { accommodationId }))).toBe('not_found');
    }
    expect(code(await readReason(null, { accommodationId }))).toBe('unauthenticated');
    expect(code(await readReason(stage.teacher, { accommodationId: randomUUID() }))).toBe('not_found');
    expect(code(await readReason(stage.teacher, { accommodationId: 'x' }))).toBe('invalid');
  });

  it('keeps the reason of one that has ended', async () => {
    const other = await stageRound();
    const ended = await modifyFor(other);
    value(await endAccommodation(other.teacher, { accommodationId: ended }));
    expect(value(await readReason(other.teacher, { accommodationId: ended })).reason).toBe(REASON);
  });

  it('is never changed or deleted, not even by the owner of the tables', async () => {
    const sql = ownerSql();
    await expect(sql`update accommodation_reasons set reason = 'another'`).rejects.toThrow();
    await expect(sql`delete from accommodation_reasons`).rejects.toThrow();
  });
});
