import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { endAccommodation } from '@/lib/data/accommodations/end-accommodation';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { modifyFor, pricedSheet, storedAccommodations } from '@/tests/support/accommodations';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { markPieces } from '@/tests/support/mark-pieces';
import { stageRound } from '@/tests/support/round-stage';
import { logOf, makeActor, whileLogFails } from '@/tests/support/school';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/width': '2 1/16' };

async function stageModified(sittingId?: null) {
  const stage = await stageRound();
  const { teacher, attempts, practical } = stage;
  await markPieces(teacher, stage.sittingId, attempts[0], practical.rubric, SHORT);
  const accommodationId = await modifyFor(stage, sittingId === null ? { sittingId } : {});
  return { ...stage, accommodationId };
}

describe('endAccommodation', () => {
  it.each([
    ['a sitting', undefined],
    ['the term', null],
  ] as const)('of %s prices the student like everybody else again', async (_, sittingId) => {
    const { teacher, school, students, attempts, accommodationId } = await stageModified(sittingId);
    value(await endAccommodation(teacher, { accommodationId }));
    expect(await pricedSheet(attempts[0])).toMatchObject({ score: 9500, accommodation_id: null });
    expect(await storedAccommodations(school)).toMatchObject([
      { id: accommodationId, ended_by: teacher.personId },
    ]);
    expect((await logOf(school)).at(-1)).toMatchObject({
      action: 'accommodation.change',
      about_person_id: students[0].personId,
      details: { modifiedRubric: 'ended' },
    });
  });

  it('changes no result that is out', async () => {
    const { teacher, sittingId, attempts, accommodationId } = await stageModified();
    const { seen } = value(await previewPublication(teacher, { sittingId }));
    value(await publishSitting(teacher, { sittingId, seen, withoutUnread: true, lateLocks: 'leave out' }));
    const told = () => ownerSql()`
      select score_points, accommodation_id from results where attempt_id = ${attempts[0]} order by publication_id`;
    const before = await told();
    expect(before).toEqual([{ score_points: 9900, accommodation_id: accommodationId }]);
    value(await endAccommodation(teacher, { accommodationId }));
    expect(await told()).toEqual(before);
    expect(await pricedSheet(attempts[0])).toMatchObject({ score: 9500 });
    expect(value(await previewPublication(teacher, { sittingId })).seen).not.toBe(seen);
  });

  it('ends once', async () => {
    const { teacher, school, accommodationId } = await stageModified();
    value(await endAccommodation(teacher, { accommodationId }));
    const stored = await storedAccommodations(school);
    expect(code(await endAccommodation(teacher, { accommodationId }))).toBe('conflict');
    expect(await storedAccommodations(school)).toEqual(stored);
  });

  it('is no other role’s to do, nor another teacher’s', async () => {
    const { school, aide, students, accommodationId, teacher } = await stageModified();
    for (const actor of [
      aide,
      students[0],
      await makeActor(school, 'admin'),
      await makeActor(school, 'head'),
    ]) {
      expect(code(await endAccommodation(actor, { accommodationId }))).toBe('forbidden');
    }
    expect(code(await endAccommodation(await makeActor(school, 'teacher'), { accommodationId }))).toBe(
      'not_found',
    );
    expect(code(await endAccommodation(teacher, { accommodationId: randomUUID() }))).toBe('not_found');
    expect(code(await endAccommodation(teacher, { accommodationId: 'first' }))).toBe('invalid');
    expect(await storedAccommodations(school)).toMatchObject([{ ended: false }]);
  });

  it('leaves all as it was when its last write fails', async () => {
    const { teacher, school, attempts, accommodationId } = await stageModified();
    expect(await whileLogFails(() => endAccommodation(teacher, { accommodationId }))).toBeInstanceOf(Error);
    expect(await storedAccommodations(school)).toMatchObject([{ ended: false }]);
    expect(await pricedSheet(attempts[0])).toMatchObject({ score: 9900 });
  });
});
