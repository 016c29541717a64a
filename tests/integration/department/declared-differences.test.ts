import { describe, expect, it } from 'vitest';
import { approveVersion } from '@/lib/data/department/approve-version';
import { readDeclaredDifferences } from '@/lib/data/department/read-declared-differences';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import { publishVersion } from '@/lib/data/practicals/publish-version';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { openSitting } from '@/lib/data/sittings/open-sitting';
import { code } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  makeStarter,
  publishAndOffer,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, makeSection } from '@/tests/support/school';
import { makeSharedSchool, offerAndAdopt } from '@/tests/support/shared-school';

const REASON = 'A short end leaves a gap that cannot be closed.';

/** Rut's desk caddy, approved in version 1, and Dayo's copy of it with a dearer price for short cuts. */
async function approved() {
  const place = await makeSharedSchool();
  const { rut, dayo, head } = place;
  const { practicalId, versionId, copyId } = await offerAndAdopt(rut, dayo);
  valueFrom(await approveVersion(head, { versionId }));
  const revision = await changeDraft(dayo, copyId, (draft) => {
    draft.all.sizes.length = { ...draft.all.sizes.length, mirrored: false };
    draft.all.sizes.length.under.beyond = '5';
  });
  return { ...place, practicalId, versionId, copyId, revision };
}

const reasonOf = async (versionId: string) => {
  const [row] = await ownerSql()`select difference_reason from rubric_versions where id = ${versionId}`;
  return row?.difference_reason;
};

describe('publishing what differs from the department’s', () => {
  it('keeps the teacher’s reason with the version, and in the log', async () => {
    const { school, dayo, copyId, revision } = await approved();
    const input = { practicalId: copyId, revision, reason: `  ${REASON} ` };
    const { versionId } = valueFrom(await publishVersion(dayo, input));
    expect(await reasonOf(versionId)).toBe(REASON);
    expect(valueFrom(await readPractical(dayo, { practicalId: copyId })).latest?.differenceReason).toBe(
      REASON,
    );
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        details: { published: 'Desk caddy', version: 1, differenceReason: REASON },
      }),
    );
  });

  it('needs no reason, and takes none for what does not differ or has nothing to differ from', async () => {
    const { rut, dayo, copyId, revision } = await approved();
    const silent = valueFrom(await publishVersion(dayo, { practicalId: copyId, revision, reason: '   ' }));
    expect(await reasonOf(silent.versionId)).toBeNull();
    const same = await changeDraft(dayo, copyId, (draft) => {
      draft.all.sizes.length.under.beyond = '3';
    });
    const alike = valueFrom(
      await publishVersion(dayo, { practicalId: copyId, revision: same, reason: REASON }),
    );
    expect(await reasonOf(alike.versionId)).toBeNull();
    const practicalId = await makeStarter(rut, 'bench-hook');
    const alone = valueFrom(await publishVersion(rut, { practicalId, revision: 1, reason: REASON }));
    expect(await reasonOf(alone.versionId)).toBeNull();
  });

  it('refuses a reason longer than 400 characters', async () => {
    const { dayo, copyId, revision } = await approved();
    const long = await publishVersion(dayo, { practicalId: copyId, revision, reason: 'a'.repeat(401) });
    expect(long).toMatchObject({ problem: { code: 'invalid', fields: { reason: [expect.any(String)] } } });
    const longest = { practicalId: copyId, revision, reason: 'a'.repeat(400) };
    expect(await publishVersion(dayo, longest)).toMatchObject({ ok: true });
  });
});

describe('declared differences', () => {
  it('tell the newest version and those in use, in words, with their periods and the reason', async () => {
    const { school, rut, dayo, head, practicalId, versionId, copyId, revision } = await approved();
    const first = valueFrom(await publishVersion(dayo, { practicalId: copyId, revision, reason: REASON }));
    const sectionId = await makeSection(school, { teacherIds: [dayo.personId] });
    valueFrom(await openSitting(dayo, { sectionId, versionId: first.versionId }));
    await changeDraft(dayo, copyId, (draft) => {
      draft.all.sizes.length.under.beyond = '3';
    });
    const second = await publishDraft(dayo, copyId);
    await changeDraft(rut, practicalId, (draft) => {
      draft.redo.capPercent = '100';
    });
    const own = await publishDraft(rut, practicalId);
    const { versions } = valueFrom(await readDeclaredDifferences(head, { versionId }));
    expect(versions.map((version) => version.versionId)).toEqual([
      own.versionId,
      second.versionId,
      first.versionId,
    ]);
    const [theirs, newest, used] = versions;
    expect(theirs).toMatchObject({ ownerName: 'Rut Lindqvist', isNewest: true, same: false, periods: [] });
    expect(JSON.stringify(theirs?.sentences)).toContain('A redo counts up to');
    expect(newest).toMatchObject({
      ownerName: 'Dayo Okonjo',
      number: 2,
      same: true,
      sentences: [],
      reason: null,
    });
    expect(used).toMatchObject({ number: 1, isNewest: false, same: false, periods: ['3'], reason: REASON });
    expect(used?.sentences[0]?.[0]).toBe('This version takes 2 points more than the department for ');
  });

  it('reach copies of copies, other rubrics of the cut list, and what asks for other pieces by now', async () => {
    const { rut, dayo, head, versionId, copyId, revision } = await approved();
    const first = valueFrom(await publishVersion(dayo, { practicalId: copyId, revision }));
    await publishAndOffer(dayo, await makeStarter(dayo, 'gauge-kit'));
    const again = valueFrom(await copyPractical(dayo, { practicalId: copyId, versionId: first.versionId }));
    await changeDraft(dayo, again.practicalId, (draft) => {
      draft.lines.pop();
    });
    const other = await publishDraft(dayo, again.practicalId);
    const alike = await publishDraft(rut, await makeStarter(rut, 'desk-caddy'));
    const { versions } = valueFrom(await readDeclaredDifferences(head, { versionId }));
    expect(versions.map((version) => version.versionId).sort()).toEqual(
      [first.versionId, other.versionId, alike.versionId].sort(),
    );
    const pieces = versions.find((version) => version.versionId === other.versionId);
    expect(JSON.stringify(pieces?.sentences)).toContain('asks for other pieces');
    expect(versions.find((version) => version.versionId === alike.versionId)?.same).toBe(true);
  });

  it('are none of a version that is not approved, and nothing to others', async () => {
    const { school, head, rut, versionId } = await approved();
    const hook = await publishAndOffer(rut, await makeStarter(rut, 'bench-hook'));
    expect(valueFrom(await readDeclaredDifferences(head, { versionId: hook.versionId }))).toEqual({
      versions: [],
    });
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'head');
    for (const other of [stranger, { ...head, departmentId: crypto.randomUUID() }]) {
      expect(code(await readDeclaredDifferences(other, { versionId }))).toBe('not_found');
    }
    expect(code(await readDeclaredDifferences(await makeActor(school, 'teacher'), { versionId }))).toBe(
      'forbidden',
    );
    expect(code(await readDeclaredDifferences(head, { versionId: 'one' }))).toBe('invalid');
  });
});
