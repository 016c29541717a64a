import { describe, expect, it } from 'vitest';
import { compareVersions } from '@/lib/data/department/compare-versions';
import { listRubrics } from '@/lib/data/department/list-rubrics';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import { ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  makeStarter,
  publishAndOffer,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { makeActor, makeSchool, makeSection } from '@/tests/support/school';

const school = await makeSchool();
const head = await makeActor(school, 'head', { givenName: 'Imre', familyName: 'Vass' });
const rut = await makeActor(school, 'teacher', { givenName: 'Rut', familyName: 'Lindqvist' });
const dayo = await makeActor(school, 'teacher', { givenName: 'Dayo', familyName: 'Okonjo' });

const caddy = await makeStarter(rut, 'desk-caddy');
const first = await publishAndOffer(rut, caddy);
await changeDraft(rut, caddy, (draft) => {
  draft.redo.capPercent = '100';
});
const second = await publishDraft(rut, caddy);
const copy = valueFrom(await copyPractical(dayo, { practicalId: caddy, versionId: first.versionId }));
await changeDraft(dayo, copy.practicalId, (draft) => {
  draft.all.sizes.length.under.beyond = '5';
});
const okonjo = await publishDraft(dayo, copy.practicalId);
const hook = await publishDraft(rut, await makeStarter(rut, 'bench-hook'));
const sectionId = await makeSection(school, { teacherIds: [rut.personId] });
await ownerSql()`insert into sittings ${ownerSql()({
  school_id: school.id,
  section_id: sectionId,
  practical_id: caddy,
  rubric_version_id: first.versionId,
  opened_by: rut.personId,
})}`;

describe('the department’s rubrics', () => {
  it('stand together by what they ask for: those in use and the newest of each', async () => {
    const { groups } = valueFrom(await listRubrics(head, {}));
    expect(groups.map(({ title, pieces, rubrics }) => [title, pieces, rubrics.length])).toEqual([
      ['Bench-hook kit', 5, 1],
      ['Desk caddy', 7, 3],
    ]);
    expect(groups[1]?.rubrics).toMatchObject([
      { ownerName: 'Rut Lindqvist', number: 2, sittings: 0, periods: [], isNewest: true },
      { ownerName: 'Rut Lindqvist', number: 1, sittings: 1, periods: ['3'], isNewest: false },
      { ownerName: 'Dayo Okonjo', number: 1, sittings: 0, isNewest: true },
    ]);
  });

  it('are nothing to other departments, schools and roles', async () => {
    const apart = { ...head, departmentId: crypto.randomUUID() };
    expect(await listRubrics(apart, {})).toEqual({ ok: true, value: { groups: [] } });
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'head');
    expect(await listRubrics(stranger, {})).toEqual({ ok: true, value: { groups: [] } });
    for (const role of ['teacher', 'admin', 'aide', 'student'] as const) {
      const other = await makeActor(school, role);
      expect(await listRubrics(other, {})).toMatchObject({ problem: { code: 'forbidden' } });
      expect(await compareVersions(other, { versionIds: [first.versionId, second.versionId] })).toMatchObject(
        { problem: { code: 'forbidden' } },
      );
    }
  });
});

describe('laying versions side by side', () => {
  it('compares them in the order asked for, each by its teacher', async () => {
    const versionIds = [okonjo.versionId, first.versionId];
    const { title, versions, comparison } = valueFrom(await compareVersions(head, { versionIds }));
    expect(title).toBe('Desk caddy');
    expect(versions.map(({ label, note }) => [label, note])).toEqual([
      ['Okonjo', 'version 1'],
      ['Lindqvist', 'version 1'],
    ]);
    expect(comparison.sentences).toHaveLength(1);
    expect(comparison.sentences[0]?.[0]).toBe('Lindqvist takes 2 points less than Okonjo for ');
  });

  it('names versions of one teacher by their numbers', async () => {
    const versionIds = [first.versionId, second.versionId];
    const { versions, comparison } = valueFrom(await compareVersions(head, { versionIds }));
    expect(versions.map(({ label }) => label)).toEqual(['version 1', 'version 2']);
    expect(comparison.policies.filter(({ differs }) => differs).map(({ label }) => label)).toEqual([
      ['a redo counts up to'],
    ]);
  });

  it('refuses one alone, the same twice, and rubrics of other pieces, each with the reason', async () => {
    const ask = async (versionIds: string[]) => compareVersions(head, { versionIds });
    expect(await ask([first.versionId])).toMatchObject({
      problem: { code: 'invalid', message: 'Choose two rubrics or more.' },
    });
    expect(await ask([first.versionId, first.versionId])).toMatchObject({
      problem: { code: 'invalid', message: 'The same version is named twice.' },
    });
    expect(await ask([first.versionId, hook.versionId])).toMatchObject({
      problem: { code: 'invalid', fields: { versionIds: [expect.stringContaining('different pieces')] } },
    });
  });

  it('never shows a version of another department or school', async () => {
    const versionIds = [first.versionId, second.versionId];
    const apart = { ...head, departmentId: crypto.randomUUID() };
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'head');
    for (const other of [apart, stranger]) {
      expect(await compareVersions(other, { versionIds })).toMatchObject({ problem: { code: 'not_found' } });
    }
  });
});
