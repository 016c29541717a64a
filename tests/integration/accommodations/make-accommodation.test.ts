import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { makeAccommodation } from '@/lib/data/accommodations/make-accommodation';
import type { Modification } from '@/lib/scoring/modification';
import {
  accommodationOf,
  modifyFor,
  pricedSheet,
  REASON,
  storedAccommodations,
  WIDER,
} from '@/tests/support/accommodations';
import { code, fieldsOf } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { enroll, makeAttempt, makePractical, makeSitting } from '@/tests/support/factories';
import { markPieces } from '@/tests/support/mark-pieces';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { logOf, makeActor, makeSchool, makeSection, whileLogFails } from '@/tests/support/school';

const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/width': '2 1/16' };
const NONE: Modification = { ...WIDER, widen: { num: 1, den: 1 } };
const excusing = (...excused: Modification['excused']): Modification => ({ ...NONE, excused });

let stage: RoundStage;

beforeAll(async () => {
  stage = await stageRound();
});

describe('makeAccommodation', () => {
  it('prices one student of one sitting otherwise, at once, and nobody else', async () => {
    const other = await stageRound();
    const { teacher, sittingId, attempts, practical } = other;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, sittingId, attempts[1], practical.rubric, SHORT);
    const before = await pricedSheet(attempts[0]);
    const accommodationId = await modifyFor(other);
    expect(before).toMatchObject({ score: 9500, lost: 400, accommodation_id: null });
    expect(await pricedSheet(attempts[0])).toMatchObject({
      score: 9900,
      lost: 100,
      total: before?.total,
      accommodation_id: accommodationId,
      recorded: before?.recorded,
    });
    expect(await pricedSheet(attempts[1])).toMatchObject({ score: 9500, accommodation_id: null });
  });

  it('prices what is read afterwards, too, and a redo', async () => {
    const other = await stageRound();
    const { teacher, sittingId, attempts, practical } = other;
    await modifyFor(other);
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    expect(await pricedSheet(attempts[0])).toMatchObject({ lost: 100 });
    const again = await makeAttempt(other.school, sittingId, other.students[0].personId, 2);
    await markPieces(teacher, sittingId, again, practical.rubric, SHORT);
    expect(await pricedSheet(again)).toMatchObject({ lost: 100 });
  });

  it('for the term prices every sitting of the department, but one that has its own', async () => {
    const other = await stageRound();
    const { teacher, school, sectionId, students, sittingId, attempts, practical } = other;
    const second = await makePractical(school, teacher.personId);
    const studentIds = [students[0].personId];
    const late = await makeSitting(school, sectionId, second, { openedBy: teacher.personId, studentIds });
    const lateAttempt = late.attempts.get(students[0].personId) ?? '';
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await markPieces(teacher, late.sittingId, lateAttempt, second.rubric, SHORT);
    const ofTerm = await modifyFor(other, { sittingId: null });
    expect(await pricedSheet(attempts[0])).toMatchObject({ lost: 100, accommodation_id: ofTerm });
    expect(await pricedSheet(lateAttempt)).toMatchObject({ lost: 100, accommodation_id: ofTerm });
    const own = await modifyFor(other, { modification: { ...WIDER, widen: { num: 3, den: 1 } } });
    expect(await pricedSheet(attempts[0])).toMatchObject({ lost: 0, accommodation_id: own });
    expect(await pricedSheet(lateAttempt)).toMatchObject({ lost: 100, accommodation_id: ofTerm });
  });

  it('keeps the reason apart, and tells the log for whom and nothing of what or why', async () => {
    const other = await stageRound();
    const accommodationId = await modifyFor(other, { reason: `  ${REASON}  ` });
    expect(await storedAccommodations(other.school)).toEqual([
      expect.objectContaining({ id: accommodationId, modification: WIDER, reason: REASON, ended: false }),
    ]);
    const entry = (await logOf(other.school)).at(-1);
    expect(entry).toEqual({
      action: 'accommodation.change',
      actor_id: other.teacher.personId,
      about_person_id: other.students[0].personId,
      details: { modifiedRubric: 'made' },
    });
  });

  it('ends the one it replaces and keeps it', async () => {
    const other = await stageRound();
    const { teacher, sittingId, attempts, practical } = other;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    const first = await modifyFor(other);
    const again = { ...WIDER, widen: { num: 3, den: 1 } };
    const second = await modifyFor(other, { modification: again, replaces: first });
    expect(await storedAccommodations(other.school)).toMatchObject([
      { id: first, ended: true, ended_by: teacher.personId, modification: WIDER },
      { id: second, ended: false, modification: again },
    ]);
    expect(await pricedSheet(attempts[0])).toMatchObject({ lost: 0, accommodation_id: second });
    expect((await logOf(other.school)).at(-1)?.details).toEqual({ modifiedRubric: 'changed' });
  });

  it('makes no second one beside one that stands, nor replaces one that does not', async () => {
    const other = await stageRound();
    const first = await modifyFor(other);
    const stored = await storedAccommodations(other.school);
    for (const replaces of [null, randomUUID()]) {
      expect(code(await makeAccommodation(other.teacher, accommodationOf(other, { replaces })))).toBe(
        'conflict',
      );
    }
    const ofTerm = accommodationOf(other, { sittingId: null, replaces: first });
    expect(code(await makeAccommodation(other.teacher, ofTerm))).toBe('conflict');
    expect(await storedAccommodations(other.school)).toEqual(stored);
  });

  it.each<[string, object, string[]]>([
    ['no reason', { reason: '  ' }, ['reason']],
    ['a reason of 2001 characters', { reason: 'x'.repeat(2001) }, ['reason']],
    ['narrower bands', { modification: { ...WIDER, widen: { num: 1, den: 2 } } }, ['modification.widen.num']],
    ['a key nobody knows', { modification: { ...WIDER, hidden: true } }, ['modification']],
    ['nothing modified', { modification: NONE }, ['modification']],
    [
      'a line of the term',
      { sittingId: null, modification: excusing({ lineId: 'base', axis: null }) },
      ['modification.excused'],
    ],
    [
      'a line that is not there',
      { modification: excusing({ lineId: 'door', axis: null }) },
      ['modification.excused'],
    ],
    [
      'every line',
      {
        modification: excusing(
          ...['base', 'end', 'side', 'divider'].map((lineId) => ({ lineId, axis: null })),
        ),
      },
      ['modification.excused'],
    ],
    [
      'a check that is not there',
      { modification: { ...NONE, checks: [{ label: 'shine', lose: null }] } },
      ['modification.checks'],
    ],
    ['a student of another section', { studentId: randomUUID() }, ['studentId']],
  ])('refuses %s and points at it', async (_, change, fields) => {
    const before = await storedAccommodations(stage.school);
    const result = await makeAccommodation(stage.teacher, { ...accommodationOf(stage), ...change });
    expect(fieldsOf(result)).toEqual(fields);
    expect(await storedAccommodations(stage.school)).toEqual(before);
  });

  it('takes a line, an axis and a check of the sitting', async () => {
    const other = await stageRound();
    const { teacher, sittingId, attempts, practical } = other;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    await modifyFor(other, {
      modification: {
        ...excusing({ lineId: 'end', axis: null }, { lineId: null, axis: 'width' }),
        checks: [{ label: 'Name and period on pieces', lose: null }],
      },
    });
    expect(await pricedSheet(attempts[0])).toMatchObject({ total: 10_000, lost: 100, score: 9800 });
  });

  it('takes no student who has left the section', async () => {
    const other = await stageRound();
    await ownerSql()`update enrollments set left_on = current_date - 2 where student_id = ${other.students[0].personId}`;
    expect(fieldsOf(await makeAccommodation(other.teacher, accommodationOf(other)))).toEqual(['studentId']);
  });

  it('is no other role’s to do', async () => {
    const { school, aide, students } = stage;
    for (const actor of [
      aide,
      students[0],
      await makeActor(school, 'admin'),
      await makeActor(school, 'head'),
    ]) {
      expect(code(await makeAccommodation(actor, accommodationOf(stage)))).toBe('forbidden');
    }
    expect(code(await makeAccommodation(null, accommodationOf(stage)))).toBe('unauthenticated');
  });

  it('finds nothing in a section or sitting of somebody else', async () => {
    const { school, teacher, students } = stage;
    const colleague = await makeActor(school, 'teacher');
    expect(code(await makeAccommodation(colleague, accommodationOf(stage)))).toBe('not_found');
    const elsewhere = await makeActor(await makeSchool(), 'teacher');
    expect(code(await makeAccommodation(elsewhere, accommodationOf(stage)))).toBe('not_found');
    const sectionId = await makeSection(school, { teacherIds: [teacher.personId] });
    await enroll(school, sectionId, students[0].personId);
    expect(code(await makeAccommodation(teacher, accommodationOf(stage, { sectionId })))).toBe('not_found');
  });

  it('leaves nothing behind when its last write fails', async () => {
    const other = await stageRound();
    const { teacher, sittingId, attempts, practical } = other;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
    const before = await pricedSheet(attempts[0]);
    expect(await whileLogFails(() => makeAccommodation(teacher, accommodationOf(other)))).toBeInstanceOf(
      Error,
    );
    expect(await storedAccommodations(other.school)).toHaveLength(0);
    expect(await pricedSheet(attempts[0])).toEqual(before);
  });
});
