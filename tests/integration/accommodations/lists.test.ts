import { beforeAll, describe, expect, it } from 'vitest';
import { endAccommodation } from '@/lib/data/accommodations/end-accommodation';
import { listAccommodations } from '@/lib/data/accommodations/list-accommodations';
import { listDepartmentAccommodations } from '@/lib/data/accommodations/list-department-accommodations';
import { makeAccommodation } from '@/lib/data/accommodations/make-accommodation';
import { readAccommodationDesk } from '@/lib/data/accommodations/read-accommodation-desk';
import { readReason } from '@/lib/data/accommodations/read-reason';
import { markLeftSection } from '@/lib/data/sections/mark-left-section';
import { accommodationOf, modifyFor, pricedSheet, REASON, WIDER } from '@/tests/support/accommodations';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { enroll, makeSitting } from '@/tests/support/factories';
import { markPieces } from '@/tests/support/mark-pieces';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { logOf, makeActor, makeSchool, makeSection } from '@/tests/support/school';

let stage: RoundStage;
let ofSitting: string;
let ofTerm: string;

beforeAll(async () => {
  stage = await stageRound();
  ofSitting = await modifyFor(stage, {
    modification: {
      ...WIDER,
      excused: [
        { lineId: 'base', axis: null },
        { lineId: null, axis: 'width' },
      ],
    },
  });
  ofTerm = await modifyFor(stage, { student: stage.students[1], sittingId: null });
});

describe('listAccommodations', () => {
  it('names student, scope and what is modified, who made it, and never why', async () => {
    const list = value(await listAccommodations(stage.teacher, { sectionId: stage.sectionId }));
    expect(list.standing).toMatchObject([
      {
        accommodationId: ofSitting,
        familyName: 'Abbott',
        sittingTitle: 'Nine parts',
        words: ['bands 2.25 times as wide', 'base excused', 'width of every line excused'],
        madeBy: 'Dayo Okonjo',
        ended: null,
      },
      {
        accommodationId: ofTerm,
        familyName: 'Brandt',
        sittingTitle: null,
        words: ['bands 2.25 times as wide'],
      },
    ]);
    expect(JSON.stringify(list)).not.toContain(REASON);
  });

  it('keeps what has ended apart, with who ended it', async () => {
    const other = await stageRound();
    const accommodationId = await modifyFor(other);
    value(await endAccommodation(other.teacher, { accommodationId }));
    const list = value(await listAccommodations(other.teacher, { sectionId: other.sectionId }));
    expect(list.standing).toEqual([]);
    expect(list.ended).toMatchObject([{ accommodationId, ended: { by: 'Dayo Okonjo' } }]);
  });

  it('logs the look without telling whom', async () => {
    const entry = (await logOf(stage.school)).find(({ action }) => action === 'accommodation.list');
    expect(entry).toMatchObject({ about_person_id: null, details: { modifiedRubrics: 2 } });
  });

  it('is there for the section’s teacher and the department’s head alone', async () => {
    const { school, sectionId, aide, students } = stage;
    expect(code(await listAccommodations(await makeActor(school, 'head'), { sectionId }))).toBe('ok');
    for (const actor of [aide, ...students, await makeActor(school, 'admin')]) {
      expect(code(await listAccommodations(actor, { sectionId }))).toBe('forbidden');
    }
    for (const actor of [await makeActor(school, 'teacher'), await makeActor(await makeSchool(), 'head')]) {
      expect(code(await listAccommodations(actor, { sectionId }))).toBe('not_found');
    }
    expect(code(await listAccommodations(stage.teacher, { sectionId: 'three' }))).toBe('invalid');
  });
});

describe('listDepartmentAccommodations', () => {
  it('gives a head all of the own department by section, and never why', async () => {
    const list = value(await listDepartmentAccommodations(await makeActor(stage.school, 'head'), {}));
    expect(list.sections).toMatchObject([
      {
        sectionId: stage.sectionId,
        accommodations: [{ accommodationId: ofSitting }, { accommodationId: ofTerm }],
      },
    ]);
    expect(list.elsewhere).toEqual([]);
    expect(JSON.stringify(list)).not.toContain(REASON);
  });

  it('shows another department’s head none, and is no teacher’s', async () => {
    const [metal] = await ownerSql()<{ id: string }[]>`
      insert into departments (school_id, name) values (${stage.school.id}, 'Metal') returning id`;
    const otherHead = { ...(await makeActor(stage.school, 'head')), departmentId: metal?.id ?? '' };
    expect(value(await listDepartmentAccommodations(otherHead, {}))).toMatchObject({
      sections: [],
      elsewhere: [],
    });
    expect(code(await listDepartmentAccommodations(stage.teacher, {}))).toBe('not_found');
    for (const actor of [stage.aide, stage.students[0], await makeActor(stage.school, 'admin')]) {
      expect(code(await listDepartmentAccommodations(actor, {}))).toBe('forbidden');
    }
  });
});

describe('readAccommodationDesk', () => {
  const desk = (more: object = {}) =>
    readAccommodationDesk(stage.teacher, {
      sectionId: stage.sectionId,
      studentId: null,
      change: null,
      ...more,
    });

  it('offers who is in the section, its sittings, and what is recorded of the chosen student alone', async () => {
    const other = await stageRound();
    const { teacher, sectionId, sittingId, attempts, practical, students } = other;
    await markPieces(teacher, sittingId, attempts[0], practical.rubric, { 'base/1/length': '6.91234' });
    await markPieces(teacher, sittingId, attempts[1], practical.rubric, { 'base/1/length': '6.95432' });
    const of = async (studentId: string | null) =>
      value(await readAccommodationDesk(teacher, { sectionId, studentId, change: null }));
    const nobody = await of(null);
    expect(nobody.students.map(({ familyName }) => familyName)).toEqual(['Abbott', 'Brandt']);
    expect(nobody.sittings).toMatchObject([{ sittingId, title: 'Nine parts', attempts: [] }]);
    const ana = await of(students[0].personId);
    expect(ana.sittings[0]?.attempts).toHaveLength(1);
    expect(JSON.stringify(ana)).not.toContain('1766397280');
    expect((await logOf(other.school)).at(-1)).toMatchObject({
      action: 'accommodation.list',
      about_person_id: students[0].personId,
    });
  });

  it('brings the one that is to be changed, with its student, and not its reason', async () => {
    const view = value(await desk({ change: ofTerm }));
    expect(view).toMatchObject({
      chosen: stage.students[1].personId,
      change: { accommodationId: ofTerm, sittingId: null, modification: WIDER },
    });
    expect(JSON.stringify(view)).not.toContain(REASON);
  });

  it('brings none that has ended or is at home elsewhere, and is the section’s teacher’s alone', async () => {
    const other = await stageRound();
    const ended = await modifyFor(other);
    value(await endAccommodation(other.teacher, { accommodationId: ended }));
    const at = { sectionId: other.sectionId, studentId: null };
    expect(code(await readAccommodationDesk(other.teacher, { ...at, change: ended }))).toBe('not_found');
    expect(code(await desk({ change: ended }))).toBe('not_found');
    expect(
      code(await readAccommodationDesk(await makeActor(other.school, 'teacher'), { ...at, change: null })),
    ).toBe('not_found');
    for (const actor of [other.aide, other.students[0], await makeActor(other.school, 'head')]) {
      expect(code(await readAccommodationDesk(actor, { ...at, change: null }))).toBe('forbidden');
    }
  });
});

describe('a student who changes the section in mid-term', () => {
  it('takes the modified rubric of the term along, and leaves that of a sitting with the sitting', async () => {
    const other = await stageRound();
    const { school, teacher, students, practical, sectionId } = other;
    const student = students[0];
    const term = await modifyFor(other, { sittingId: null });
    const sitting = await modifyFor(other, { modification: { ...WIDER, widen: { num: 2, den: 1 } } });
    const next = await makeActor(school, 'teacher', { givenName: 'Silke', familyName: 'Brandt' });
    const newSection = await makeSection(school, { teacherIds: [next.personId] });
    const asNext = { sectionId: newSection };
    expect(value(await listAccommodations(next, asNext)).standing).toEqual([]);
    expect(code(await readReason(next, { accommodationId: term }))).toBe('not_found');

    value(await markLeftSection(teacher, { sectionId, studentId: student.personId, leftOn: '2026-11-02' }));
    await enroll(school, newSection, student.personId);
    const { sittingId, attempts } = await makeSitting(school, newSection, practical, {
      openedBy: next.personId,
      studentIds: [student.personId],
    });
    const attemptId = attempts.get(student.personId) ?? '';
    await markPieces(next, sittingId, attemptId, practical.rubric, { 'base/1/length': '6 15/16' });
    expect(await pricedSheet(attemptId)).toMatchObject({ lost: 0, accommodation_id: term });

    const ids = async (actor: typeof next, at: string) =>
      value(await listAccommodations(actor, { sectionId: at })).standing.map((each) => each.accommodationId);
    expect(await ids(next, newSection)).toEqual([term]);
    expect(await ids(teacher, sectionId)).toEqual([sitting]);
    expect(value(await readReason(next, { accommodationId: term })).reason).toBe(REASON);
    expect(code(await readReason(next, { accommodationId: sitting }))).toBe('not_found');
    expect(code(await readReason(teacher, { accommodationId: term }))).toBe('not_found');

    const again = accommodationOf(other, { sectionId: newSection, sittingId: null, replaces: term });
    value(
      await makeAccommodation(next, {
        ...again,
        modification: { ...WIDER, widen: { num: 1, den: 1 }, excused: [{ lineId: null, axis: 'length' }] },
      }),
    );
    expect(await pricedSheet(attemptId)).toMatchObject({ lost: 0 });
    expect(await ids(next, newSection)).not.toContain(term);
  });

  it('is shown to the head apart while in none of the department’s sections', async () => {
    const other = await stageRound();
    const term = await modifyFor(other, { sittingId: null });
    value(
      await markLeftSection(other.teacher, {
        sectionId: other.sectionId,
        studentId: other.students[0].personId,
        leftOn: '2026-11-02',
      }),
    );
    const list = value(await listDepartmentAccommodations(await makeActor(other.school, 'head'), {}));
    expect(list).toMatchObject({ sections: [], elsewhere: [{ accommodationId: term }] });
  });
});
