import { describe, expect, it } from 'vitest';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { starterDraft } from '@/lib/practicals/starters';
import { ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  countPracticals,
  makeStarter,
  publishAndOffer,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher', { familyName: 'Lindqvist' });
const colleague = await makeActor(school, 'teacher', { familyName: 'Okonjo' });

describe('copying a practical', () => {
  it('of one’s own copies the draft as it is typed, under a title of its own', async () => {
    const practicalId = await makeStarter(teacher);
    await changeDraft(teacher, practicalId, (draft) => {
      draft.kerf = '1/';
    });
    const copy = valueFrom(await copyPractical(teacher, { practicalId }));
    const { draft, versions } = valueFrom(await readPractical(teacher, copy));
    const expected = { ...starterDraft('bench-hook'), title: 'Bench-hook kit, copy', kerf: '1/' };
    expect(draft).toMatchObject({ content: expected, revision: 1 });
    expect(versions).toEqual([]);
  });

  it('of what a colleague offers copies what was published, and remembers the version it came from', async () => {
    const practicalId = await makeStarter(teacher, 'desk-caddy');
    const { versionId } = await publishAndOffer(teacher, practicalId);
    await changeDraft(teacher, practicalId, (draft) => {
      draft.all.worth = '1';
    });
    const copy = valueFrom(await copyPractical(colleague, { practicalId, versionId }));
    const { draft } = valueFrom(await readPractical(colleague, copy));
    expect(draft.content).toEqual(starterDraft('desk-caddy'));
    const [row] = await ownerSql()`
      select owner_id, copied_from_version_id, source_kind, offered_at from practicals
      where id = ${copy.practicalId}`;
    expect(row).toEqual({
      owner_id: colleague.personId,
      copied_from_version_id: versionId,
      source_kind: 'adopted',
      offered_at: null,
    });
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'practical.copy',
        details: { copied: 'Desk caddy', fromPractical: practicalId, fromVersion: versionId },
      }),
    );
  });

  it('of one’s own version remembers it as a copy, offered or not', async () => {
    const practicalId = await makeStarter(teacher, 'gauge-kit');
    const { versionId } = await publishDraft(teacher, practicalId);
    const copy = valueFrom(await copyPractical(teacher, { practicalId, versionId }));
    const [row] = await ownerSql()`
      select copied_from_version_id, source_kind from practicals where id = ${copy.practicalId}`;
    expect(row).toEqual({ copied_from_version_id: versionId, source_kind: 'copy' });
  });

  it('never copies what is not on offer, another’s draft, nor a version of another practical, department or school', async () => {
    const practicalId = await makeStarter(teacher, 'gauge-kit');
    const { versionId } = await publishAndOffer(teacher, practicalId);
    const unoffered = await makeStarter(teacher, 'wall-rack');
    const { versionId: notShown } = await publishDraft(teacher, unoffered);
    const own = await makeStarter(colleague);
    const apart = { ...colleague, departmentId: crypto.randomUUID() };
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'teacher');
    const before = await countPracticals(school);
    for (const [actor, input] of [
      [colleague, { practicalId }],
      [colleague, { practicalId: unoffered, versionId: notShown }],
      [colleague, { practicalId: own, versionId }],
      [apart, { practicalId, versionId }],
      [stranger, { practicalId, versionId }],
    ] as const) {
      expect(await copyPractical(actor, input)).toMatchObject({ ok: false, problem: { code: 'not_found' } });
    }
    expect(await copyPractical(await makeActor(school, 'head'), { practicalId, versionId })).toMatchObject({
      ok: false,
      problem: { code: 'forbidden' },
    });
    expect(await copyPractical(teacher, { practicalId: 'mine' })).toMatchObject({
      ok: false,
      problem: { code: 'invalid' },
    });
    expect(await countPracticals(school)).toEqual(before);
  });

  it('makes nothing when the log cannot be written', async () => {
    const practicalId = await makeStarter(teacher);
    const before = await countPracticals(school);
    await whileLogFails(() => copyPractical(teacher, { practicalId }));
    expect(await countPracticals(school)).toEqual(before);
  });
});
