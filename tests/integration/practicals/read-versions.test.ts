import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { listVersions } from '@/lib/data/practicals/list-versions';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { readVersion } from '@/lib/data/practicals/read-version';
import { readVersionSheet } from '@/lib/data/practicals/read-version-sheet';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { makeSitting } from '@/tests/support/factories';
import { changeDraft, makeStarter, publishDraft } from '@/tests/support/practicals';
import { makeActor, makeSchool, makeSection } from '@/tests/support/school';

const school = await makeSchool();
let owner: Actor;
let colleague: Actor;
let head: Actor;
let practicalId = '';
let first = { versionId: '', number: 0 };
let second = { versionId: '', number: 0 };

/** What the actor gets of the practical's versions: their numbers, newest first, or the refusal. */
async function numbersFor(actor: Actor): Promise<number[] | string> {
  const result = await listVersions(actor, { practicalId });
  return result.ok ? result.value.versions.map(({ number }) => number) : result.problem.code;
}

/** Gives a version to a section of the teacher's, as if it had been on offer then. */
async function given(teacher: Actor, versionId: string) {
  const sectionId = await makeSection(school, { teacherIds: [teacher.personId] });
  const practical = { practicalId, versionId, task: {}, rubric: {} } as Parameters<typeof makeSitting>[2];
  return makeSitting(school, sectionId, practical, { openedBy: teacher.personId, studentIds: [] });
}

beforeAll(async () => {
  owner = await makeActor(school, 'teacher', { givenName: 'Rut', familyName: 'Lindqvist' });
  colleague = await makeActor(school, 'teacher');
  head = await makeActor(school, 'head');
  practicalId = await makeStarter(owner, 'desk-caddy');
  first = await publishDraft(owner, practicalId);
  await changeDraft(owner, practicalId, (draft) => {
    draft.kerf = '3/32';
    draft.all.worth = '12';
  });
  second = await publishDraft(owner, practicalId);
});

describe('listVersions', () => {
  it('lists every version newest first, with who made it, what stands on it and what it changed', async () => {
    const { sittingId } = await given(owner, first.versionId);
    const list = value(await listVersions(owner, { practicalId }));
    expect(list).toMatchObject({ title: 'Desk caddy', unit: 'in' });
    const [newest, oldest] = list.versions;
    expect(newest).toMatchObject({ number: 2, publisherName: 'Rut Lindqvist', sittings: 0, ownSittings: [] });
    expect(newest?.changes?.[0]).toEqual([
      'Kerf: now ',
      { ticks: 23_812_500 },
      ', was ',
      { ticks: 31_750_000 },
      '.',
    ]);
    expect(JSON.stringify(newest?.changes)).toContain('Worth of a piece');
    expect(oldest).toMatchObject({ number: 1, sittings: 1, changes: null });
    expect(oldest?.ownSittings).toEqual([{ sittingId, sectionName: 'Woods 2', period: '3' }]);
  });

  it('tells the owner which of the own sittings a newer version has left behind, and of nobody else’s', async () => {
    const behind = await given(owner, first.versionId);
    const newest = await given(owner, second.versionId);
    const another = await makeActor(school, 'teacher');
    const others = await given(another, first.versionId);
    const told = value(await readPractical(owner, { practicalId })).behind;
    expect(told).toContainEqual({
      sittingId: behind.sittingId,
      sectionName: 'Woods 2',
      period: '3',
      number: 1,
    });
    const ids = told.map(({ sittingId }) => sittingId);
    expect(ids).not.toContain(newest.sittingId);
    expect(ids).not.toContain(others.sittingId);
  });

  it('tells the owner what the draft changes, or which of its fields cannot be read', async () => {
    expect(value(await listVersions(owner, { practicalId })).draft).toMatchObject({ changes: [], wrong: [] });
    await changeDraft(owner, practicalId, (draft) => {
      draft.title = 'Caddy';
    });
    expect(value(await listVersions(owner, { practicalId })).draft?.changes).toEqual([
      ['Title: now “Caddy”, was “Desk caddy”.'],
    ]);
    await changeDraft(owner, practicalId, (draft) => {
      draft.title = 'Desk caddy';
      draft.kerf = 'thin';
    });
    expect(value(await listVersions(owner, { practicalId })).draft).toMatchObject({
      changes: null,
      wrong: ['kerf'],
    });
    expect(value(await listVersions(head, { practicalId })).draft).toBeNull();
  });

  it('is empty for the owner of what is not published, and nothing to anybody else', async () => {
    const fresh = await makeStarter(owner, 'wall-rack');
    expect(value(await listVersions(owner, { practicalId: fresh })).versions).toEqual([]);
    expect(code(await listVersions(colleague, { practicalId: fresh }))).toBe('not_found');
    expect(code(await listVersions(owner, { practicalId: 'mine' }))).toBe('invalid');
    expect(code(await listVersions(null, { practicalId: fresh }))).toBe('unauthenticated');
    for (const role of ['admin', 'aide', 'student'] as const) {
      expect(code(await listVersions(await makeActor(school, role), { practicalId: fresh }))).toBe(
        'forbidden',
      );
    }
  });
});

describe('who may read a version', () => {
  it('the owner and the head of the department may; of another department or school nobody', async () => {
    expect(await numbersFor(owner)).toEqual([2, 1]);
    expect(await numbersFor(head)).toEqual([2, 1]);
    expect(await numbersFor({ ...head, departmentId: crypto.randomUUID() })).toBe('not_found');
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'head');
    expect(await numbersFor(stranger)).toBe('not_found');
  });

  it('a colleague may while it is on offer', async () => {
    expect(await numbersFor(colleague)).toBe('not_found');
    value(await offerPractical(owner, { practicalId, offered: true }));
    expect(await numbersFor(colleague)).toEqual([2, 1]);
    value(await offerPractical(owner, { practicalId, offered: false }));
    expect(await numbersFor(colleague)).toBe('not_found');
  });

  it('who gave one goes on reading that one, and no other, after it was withdrawn', async () => {
    const giver = await makeActor(school, 'teacher');
    expect(code(await readVersion(giver, { versionId: first.versionId }))).toBe('not_found');
    const { sittingId } = await given(giver, first.versionId);
    expect(await numbersFor(giver)).toEqual([1]);
    expect(code(await readVersion(giver, { versionId: first.versionId }))).toBe('ok');
    expect(code(await readVersion(giver, { versionId: second.versionId }))).toBe('not_found');
    expect(code(await readVersionSheet(giver, { practicalId, number: 2 }))).toBe('not_found');
    expect(value(await readVersionSheet(giver, { practicalId, number: 1 }))).toMatchObject({
      mayCopy: false,
      draft: null,
      numbers: [1],
      ownSittings: [{ sittingId }],
    });
  });

  it('who moved a sitting on reads both the version it stood under and the one it stands under', async () => {
    const mover = await makeActor(school, 'teacher');
    const { sittingId } = await given(mover, first.versionId);
    const sql = ownerSql();
    await sql`insert into sitting_moves ${sql({
      school_id: school.id,
      sitting_id: sittingId,
      number: 1,
      practical_id: practicalId,
      from_version_id: first.versionId,
      to_version_id: second.versionId,
      hold_harmless: false,
      after_publication: 0,
      moved_by: mover.personId,
    })}`;
    await sql`update sittings set rubric_version_id = ${second.versionId} where id = ${sittingId}`;
    expect(await numbersFor(mover)).toEqual([2, 1]);
    const sheet = value(await readVersionSheet(mover, { practicalId, number: 2 }));
    expect(sheet.since?.number).toBe(1);
    expect(value(await readVersionSheet(mover, { practicalId, number: 1 })).ownSittings).toEqual([]);
  });

  it('who no longer teaches the section may not', async () => {
    const substitute = await makeActor(school, 'teacher');
    await given(substitute, first.versionId);
    expect(await numbersFor(substitute)).toEqual([1]);
    await ownerSql()`
      update section_staff set to_day = current_date - 7 where person_id = ${substitute.personId}`;
    expect(await numbersFor(substitute)).toBe('not_found');
    expect(code(await readVersion(substitute, { versionId: first.versionId }))).toBe('not_found');
  });

  it('an aide of the section may not', async () => {
    const aide = await makeActor(school, 'aide');
    expect(code(await readVersionSheet(aide, { practicalId, number: 1 }))).toBe('forbidden');
  });
});

describe('readVersionSheet', () => {
  it('gives the version as it was published, with what it changed and the prices before it', async () => {
    await changeDraft(owner, practicalId, (draft) => {
      draft.kerf = 'thin';
    });
    const sheet = value(await readVersionSheet(owner, { practicalId, number: 2 }));
    expect(sheet).toMatchObject({
      versionId: second.versionId,
      numbers: [2, 1],
      mayCopy: true,
      differenceReason: null,
      task: { title: 'Desk caddy', kerf: 23_812_500 },
      since: { number: 1, versionId: first.versionId },
    });
    expect(sheet.form.defaults.worth).toBe(1200);
    expect(sheet.since?.rubric.lines[0]?.worth).toBe(900);
    expect(sheet.draft?.content.kerf).toBe('thin');
  });

  it('finds it by its own id too, as the head’s screens link to it', async () => {
    const sheet = value(await readVersionSheet(head, { versionId: first.versionId }));
    expect(sheet).toMatchObject({ number: 1, since: null, mayCopy: false, draft: null });
  });

  it('does not find a number that is not there, nor takes what is no number', async () => {
    expect(code(await readVersionSheet(owner, { practicalId, number: 9 }))).toBe('not_found');
    expect(code(await readVersionSheet(owner, { practicalId, number: 0 }))).toBe('invalid');
    expect(code(await readVersionSheet(owner, { versionId: crypto.randomUUID() }))).toBe('not_found');
  });
});
