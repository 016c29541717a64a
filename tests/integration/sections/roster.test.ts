import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { addStudent } from '@/lib/data/sections/add-student';
import { bringBackToSection } from '@/lib/data/sections/bring-back-section';
import { importRoster } from '@/lib/data/sections/import-roster';
import { markLeftSection } from '@/lib/data/sections/mark-left-section';
import { previewRoster } from '@/lib/data/sections/preview-roster';
import { readSectionRoster } from '@/lib/data/sections/read-roster';
import type { Result } from '@/lib/result';
import { ownerSql } from '@/tests/support/database';
import {
  logOf,
  makeActor,
  makePerson,
  makeSchool,
  makeSection,
  type TestSchool,
  whileLogFails,
} from '@/tests/support/school';

let school: TestSchool;
let teacher: Actor;
let stranger: Actor;
let head: Actor;

beforeAll(async () => {
  school = await makeSchool();
  teacher = await makeActor(school, 'teacher');
  stranger = await makeActor(school, 'teacher');
  head = await makeActor(school, 'head');
});

function value<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.problem.code}: ${result.problem.message}`);
  return result.value;
}

const code = (result: Result<unknown>) => (result.ok ? 'ok' : result.problem.code);

const newSection = (studentIds: string[] = []) =>
  makeSection(school, { teacherIds: [teacher.personId], studentIds });

async function bringIn(
  sectionId: string,
  text: string,
  more: {
    kind?: 'csv' | 'names';
    choices?: Record<string, string>;
    leaveOutProblems?: boolean;
    actor?: Actor;
    seen?: string;
  } = {},
) {
  const { kind = 'csv', choices = {}, leaveOutProblems = false, actor = teacher } = more;
  const roster = { kind, text };
  const seen = more.seen ?? value(await previewRoster(teacher, { sectionId, roster })).seen;
  return importRoster(actor, { sectionId, roster, choices, leaveOutProblems, seen });
}

const rosterOf = async (sectionId: string) => value(await readSectionRoster(teacher, { sectionId })).students;

const peopleOf = async () =>
  (await ownerSql()<{ count: string }[]>`select count(*) from people where school_id = ${school.id}`)[0]
    ?.count;

describe('importRoster', () => {
  it('brings in every row with its ID as text, and a second time changes nothing', async () => {
    const sectionId = await newSection();
    const text = 'ID;Surname;First name\r\n00417;Abara;Chidi\r\n00422;Aguilar;Renata\r\n';
    expect(value(await bringIn(sectionId, text))).toMatchObject({ changed: true, added: 2, unchanged: 0 });
    const students = await rosterOf(sectionId);
    expect(
      students.map(({ localId, familyName, here, passphrase }) => [localId, familyName, here, passphrase]),
    ).toEqual([
      ['00417', 'Abara', true, 'none'],
      ['00422', 'Aguilar', true, 'none'],
    ]);
    const logged = (await logOf(school)).length;
    expect(value(await bringIn(sectionId, text))).toMatchObject({ changed: false, added: 0, unchanged: 2 });
    expect(await rosterOf(sectionId)).toEqual(students);
    expect(await logOf(school)).toHaveLength(logged);
  });

  it('makes IDs that are unique in the school for pasted names, and knows the names again', async () => {
    const first = await newSection();
    const second = await newSection();
    value(await bringIn(first, 'Ito, Kenji\nZosia Kowalczyk', { kind: 'names' }));
    value(await bringIn(second, 'Ito, Kenji', { kind: 'names' }));
    const made = [...(await rosterOf(first)), ...(await rosterOf(second))].map(({ localId }) => localId);
    expect(new Set(made).size).toBe(3);
    for (const id of made) expect(id).toMatch(/^W\d{4}$/);
    expect(value(await bringIn(first, 'Kenji Ito', { kind: 'names' }))).toMatchObject({ changed: false });
  });

  it('enrolls a student of another section under the same ID, without a second record', async () => {
    const known = await makePerson(school, ['student'], {
      localId: '00501',
      familyName: 'Sandoval',
      givenName: 'Mateo',
    });
    const sectionId = await newSection();
    const before = await peopleOf();
    expect(value(await bringIn(sectionId, 'ID,name\n00501,"Sandoval, Mateo"'))).toMatchObject({
      enrolled: 1,
      added: 0,
    });
    expect((await rosterOf(sectionId)).map(({ studentId }) => studentId)).toEqual([known.personId]);
    expect(await peopleOf()).toBe(before);
  });

  it('logs whom a preview shows who is not in the section', async () => {
    const known = await makePerson(school, ['student'], { localId: '00502' });
    const sectionId = await newSection();
    const roster = { kind: 'csv' as const, text: 'ID,name\n00502,"Someone, Else"' };
    expect(value(await previewRoster(teacher, { sectionId, roster })).rows).toMatchObject([
      { known: { familyName: known.familyName } },
    ]);
    expect((await logOf(school)).at(-1)).toMatchObject({
      action: 'roster.read',
      actor_id: teacher.personId,
      details: { shown: [known.personId] },
    });
  });

  it('shows a name conflict, waits for a decision, and lets nobody rename another teacher’s student', async () => {
    const known = await makePerson(school, ['student'], {
      localId: '00503',
      familyName: 'Tran',
      givenName: 'Quynh',
    });
    const sectionId = await newSection();
    const text = 'ID,name\n00503,"Tran, Quynh Anh"';
    const preview = value(await previewRoster(teacher, { sectionId, roster: { kind: 'csv', text } }));
    expect(preview.rows).toMatchObject([
      { kind: 'name-conflict', known: { familyName: 'Tran', givenName: 'Quynh' }, choices: ['keep', 'skip'] },
    ]);
    expect(code(await bringIn(sectionId, text))).toBe('invalid');
    expect(code(await bringIn(sectionId, text, { choices: { 2: 'rename' } }))).toBe('invalid');
    expect(value(await bringIn(sectionId, text, { choices: { 2: 'keep' } }))).toMatchObject({
      enrolled: 1,
      renamed: 0,
    });
    // Now the student is the teacher's own.
    expect(value(await bringIn(sectionId, text, { choices: { 2: 'rename' } }))).toMatchObject({
      renamed: 1,
      enrolled: 0,
    });
    expect(await rosterOf(sectionId)).toMatchObject([{ studentId: known.personId, givenName: 'Quynh Anh' }]);
    expect(value(await bringIn(sectionId, text))).toMatchObject({ changed: false });
  });

  it('gives a made ID up for the school’s own when told that it is the same student', async () => {
    const sectionId = await newSection();
    value(await bringIn(sectionId, 'Usman, Bilal', { kind: 'names' }));
    const [before] = await rosterOf(sectionId);
    const text = 'ID,name\n00435,"Usman, Bilal"';
    expect(value(await bringIn(sectionId, text, { choices: { 2: 'renumber' } }))).toMatchObject({
      renumbered: 1,
      added: 0,
    });
    expect(await rosterOf(sectionId)).toMatchObject([{ studentId: before?.studentId, localId: '00435' }]);
  });

  it('writes nothing while a row has a problem, and leaves such rows out when asked', async () => {
    const sectionId = await newSection();
    const text = 'ID,name\n=1+1,"Petrov, Anja"\n4.17E+02,"Ng, Mei"\n00610,"Laurent, Mirabel"';
    const refused = await bringIn(sectionId, text);
    expect(refused).toMatchObject({
      ok: false,
      problem: {
        code: 'invalid',
        fields: {
          'choices.2': [expect.stringContaining('=')],
          'choices.3': [expect.stringContaining('power of ten')],
        },
      },
    });
    expect(await rosterOf(sectionId)).toEqual([]);
    expect(value(await bringIn(sectionId, text, { leaveOutProblems: true }))).toMatchObject({
      added: 1,
      leftOut: 2,
    });
  });

  it('refuses a text that is no roster, and columns that nobody confirmed', async () => {
    const sectionId = await newSection();
    expect(code(await previewRoster(teacher, { sectionId, roster: { kind: 'csv', text: 'a,"b' } }))).toBe(
      'invalid',
    );
    expect(code(await bringIn(sectionId, '00417,Abara,Chidi'))).toBe('invalid');
    const roster = {
      kind: 'csv',
      text: '00620,Okafor,Nia',
      layout: { header: false, columns: ['localId', 'familyName', 'givenName'] },
    };
    const { seen } = value(await previewRoster(teacher, { sectionId, roster }));
    expect(
      code(await importRoster(teacher, { sectionId, roster, choices: {}, leaveOutProblems: false, seen })),
    ).toBe('ok');
  });

  it('sends back whoever looked at an older state', async () => {
    const sectionId = await newSection();
    const text = 'ID,name\n00630,"Moreau, Luc"';
    const { seen } = value(await previewRoster(teacher, { sectionId, roster: { kind: 'csv', text } }));
    await makePerson(school, ['student'], { localId: '00630', familyName: 'Somebody', givenName: 'Else' });
    expect(code(await bringIn(sectionId, text, { seen }))).toBe('stale');
  });

  it('is the section’s own teacher’s: another teacher finds nothing, other roles may not', async () => {
    const sectionId = await newSection();
    const text = 'ID,name\n00640,"Haddad, Samir"';
    expect(code(await bringIn(sectionId, text, { actor: stranger }))).toBe('not_found');
    expect(code(await bringIn(sectionId, text, { actor: head }))).toBe('forbidden');
    const foreign = await makeActor(await makeSchool('Ardmore Academy'), 'teacher');
    expect(code(await bringIn(sectionId, text, { actor: foreign }))).toBe('not_found');
    expect(await rosterOf(sectionId)).toEqual([]);
  });

  it('leaves nothing behind when its last write fails', async () => {
    const sectionId = await newSection();
    const before = await peopleOf();
    expect(await whileLogFails(() => bringIn(sectionId, 'ID,name\n00650,"Delacroix, Theo"'))).toBeInstanceOf(
      Error,
    );
    expect(await peopleOf()).toBe(before);
    expect(await rosterOf(sectionId)).toEqual([]);
  });
});

describe('addStudent', () => {
  it('adds a new student with a made ID, or with the ID given', async () => {
    const sectionId = await newSection();
    expect(
      value(await addStudent(teacher, { sectionId, familyName: 'Reyes', givenName: 'Iker' })).localId,
    ).toMatch(/^W\d{4}$/);
    expect(
      value(await addStudent(teacher, { sectionId, familyName: 'Novak', givenName: 'Ida', localId: '00700' }))
        .localId,
    ).toBe('00700');
    expect(await rosterOf(sectionId)).toHaveLength(2);
  });

  it.each([
    [{ familyName: '', givenName: '' }, 'familyName'],
    [{ familyName: 'Novak', localId: '@7' }, 'localId'],
    [{ familyName: 'x'.repeat(81) }, 'familyName'],
  ])('points at the field that is wrong: %j', async (input, field) => {
    const sectionId = await newSection();
    const result = await addStudent(teacher, { sectionId, ...input });
    expect(result.ok ? [] : Object.keys(result.problem.fields ?? {})).toEqual([field]);
  });

  it('names the own student who already has the ID, and nobody else’s', async () => {
    const sectionId = await newSection();
    const rui = await makePerson(school, ['student'], {
      localId: '00710',
      familyName: 'Silva',
      givenName: 'Rui',
    });
    const typed = { sectionId, familyName: 'Silver', localId: '00710' };
    const asked = async () => {
      const result = await addStudent(teacher, typed);
      return result.ok ? '' : result.problem.message;
    };
    expect(await asked()).toMatch(/^The ID 00710 belongs to a student of another name/);
    await newSection([rui.personId]);
    expect(await asked()).toContain('Silva, Rui');
  });

  it('is the own teacher’s alone and leaves nothing behind when its last write fails', async () => {
    const sectionId = await newSection();
    expect(code(await addStudent(stranger, { sectionId, familyName: 'Reyes' }))).toBe('not_found');
    expect(code(await addStudent(head, { sectionId, familyName: 'Reyes' }))).toBe('forbidden');
    expect(await whileLogFails(() => addStudent(teacher, { sectionId, familyName: 'Reyes' }))).toBeInstanceOf(
      Error,
    );
    expect(await rosterOf(sectionId)).toEqual([]);
  });
});

describe('leaving a section', () => {
  it('keeps the student on the list as left, and can be taken back', async () => {
    const student = await makePerson(school, ['student']);
    const sectionId = await newSection([student.personId]);
    const at = { sectionId, studentId: student.personId };
    value(await markLeftSection(teacher, { ...at, leftOn: '2026-11-02' }));
    expect(await rosterOf(sectionId)).toMatchObject([{ leftOn: '2026-11-02', here: false }]);
    value(await bringBackToSection(teacher, at));
    expect(await rosterOf(sectionId)).toMatchObject([{ leftOn: null, here: true }]);
    expect(code(await bringBackToSection(teacher, at))).toBe('conflict');
  });

  it('refuses a day before they joined, a stranger’s student and another teacher', async () => {
    const student = await makePerson(school, ['student']);
    const sectionId = await newSection([student.personId]);
    const at = { sectionId, studentId: student.personId, leftOn: '2026-11-02' };
    expect(code(await markLeftSection(teacher, { ...at, leftOn: '2020-01-01' }))).toBe('invalid');
    expect(code(await markLeftSection(teacher, { ...at, leftOn: 'soon' }))).toBe('invalid');
    expect(code(await markLeftSection(stranger, at))).toBe('not_found');
    expect(code(await markLeftSection(head, at))).toBe('forbidden');
    const other = await makePerson(school, ['student']);
    expect(code(await markLeftSection(teacher, { ...at, studentId: other.personId }))).toBe('not_found');
    expect(await whileLogFails(() => markLeftSection(teacher, at))).toBeInstanceOf(Error);
    expect(await rosterOf(sectionId)).toMatchObject([{ leftOn: null, here: true }]);
  });
});
