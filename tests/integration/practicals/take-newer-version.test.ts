import { describe, expect, it } from 'vitest';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import { putBackDraft } from '@/lib/data/practicals/put-back-draft';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { takeNewerVersion } from '@/lib/data/practicals/take-newer-version';
import { starterDraft } from '@/lib/practicals/starters';
import { code } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  countPracticals,
  makeStarter,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';
import { makeSharedSchool, offerAndAdopt } from '@/tests/support/shared-school';

const { school, rut, dayo, head } = await makeSharedSchool();

/** Dayo's copy of version 1 with changes of Dayo's own; Rut has published version 2 since. */
async function original() {
  const { practicalId, versionId: firstId, copyId } = await offerAndAdopt(rut, dayo);
  const revision = await changeDraft(dayo, copyId, (draft) => {
    draft.title = 'Caddy for period 5';
    draft.redo.capPercent = '100';
  });
  await changeDraft(rut, practicalId, (draft) => {
    draft.all.missing = '5';
  });
  const { versionId } = await publishDraft(rut, practicalId);
  return { practicalId, firstId, copyId, revision, versionId };
}

describe('a copy whose original moves on', () => {
  it('says so with what the newer version changes, on its own sheet and in the list', async () => {
    const { copyId, versionId, firstId } = await original();
    const { source } = valueFrom(await readPractical(dayo, { practicalId: copyId }));
    expect(source).toMatchObject({
      ...{ kind: 'adopted', ownerName: 'Rut Lindqvist', versionId: firstId, number: 1, isOpen: true },
      newest: { versionId, number: 2 },
    });
    expect(JSON.stringify(source?.newest?.changes)).toMatch(/missing/i);
    const listed = valueFrom(await listPracticals(dayo, {})).own.find(
      ({ practicalId }) => practicalId === copyId,
    );
    expect(listed?.source).toMatchObject({ ownerName: 'Rut Lindqvist', number: 1, newest: { number: 2 } });
  });

  it('of one’s own follows too', async () => {
    const practicalId = await makeStarter(rut);
    const { versionId } = await publishDraft(rut, practicalId);
    const copy = valueFrom(await copyPractical(rut, { practicalId, versionId }));
    await changeDraft(rut, practicalId, (draft) => {
      draft.all.worth = '12';
    });
    await publishDraft(rut, practicalId);
    const { source } = valueFrom(await readPractical(rut, copy));
    expect(source).toMatchObject({ kind: 'copy', ownerName: null, number: 1, newest: { number: 2 } });
  });
});

describe('taking a newer version over', () => {
  it('makes it the draft under the copy’s own title, and the copy stands on that version', async () => {
    const { copyId, revision, versionId } = await original();
    const taken = valueFrom(await takeNewerVersion(dayo, { practicalId: copyId, revision, versionId }));
    const view = valueFrom(await readPractical(dayo, { practicalId: copyId }));
    const expected = starterDraft('desk-caddy');
    expected.title = 'Caddy for period 5';
    expected.all.missing = '5';
    expect(view.draft).toMatchObject({ content: expected, revision: revision + 1 });
    expect(taken).toMatchObject({ content: expected, revision: revision + 1 });
    expect(view).toMatchObject({
      title: 'Caddy for period 5',
      tookOver: 2,
      source: { number: 2, newest: null },
    });
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        details: { tookOver: 'Caddy for period 5', version: 2, fromVersion: versionId },
      }),
    );
  });

  it('can be put back whole, as the next revision, and the copy stands on the earlier version again', async () => {
    const { copyId, revision, versionId, firstId } = await original();
    const before = valueFrom(await readPractical(dayo, { practicalId: copyId })).draft.content;
    valueFrom(await takeNewerVersion(dayo, { practicalId: copyId, revision, versionId }));
    const later = await changeDraft(dayo, copyId, (draft) => {
      draft.title = 'Another title';
    });
    valueFrom(await putBackDraft(dayo, { practicalId: copyId, revision: later }));
    const view = valueFrom(await readPractical(dayo, { practicalId: copyId }));
    expect(view.draft).toMatchObject({ content: before, revision: later + 1 });
    expect(view).toMatchObject({ title: before.title, tookOver: null, source: { versionId: firstId } });
    expect(code(await putBackDraft(dayo, { practicalId: copyId, revision: later + 1 }))).toBe('conflict');
  });

  it('cannot be put back over what was published since', async () => {
    const { copyId, revision, versionId } = await original();
    const taken = valueFrom(await takeNewerVersion(dayo, { practicalId: copyId, revision, versionId }));
    await publishDraft(dayo, copyId);
    expect(valueFrom(await readPractical(dayo, { practicalId: copyId })).tookOver).toBeNull();
    const { revision: now } = taken;
    expect(code(await putBackDraft(dayo, { practicalId: copyId, revision: now }))).toBe('conflict');
  });

  it('is not for a variant, which has sizes of its own', async () => {
    const { copyId, revision, versionId } = await original();
    await ownerSql()`update practicals set source_kind = 'variant' where id = ${copyId}`;
    expect(code(await takeNewerVersion(dayo, { practicalId: copyId, revision, versionId }))).toBe('conflict');
  });

  it('refuses a draft that was changed since, an earlier version, another original’s and a withdrawn one', async () => {
    const { practicalId, firstId, copyId, revision, versionId } = await original();
    const before = await countPracticals(school);
    const ask = async (change: object) =>
      code(await takeNewerVersion(dayo, { practicalId: copyId, revision, versionId, ...change }));
    expect(await ask({ revision: revision - 1 })).toBe('stale');
    expect(await ask({ versionId: firstId })).toBe('conflict');
    expect(await ask({ versionId: 'two' })).toBe('invalid');
    const other = await original();
    expect(await ask({ versionId: other.versionId })).toBe('not_found');
    valueFrom(await offerPractical(rut, { practicalId, offered: false }));
    expect(await ask({})).toBe('not_found');
    expect((await countPracticals(school))?.versions).toBe((before?.versions ?? 0) + 2);
    expect(valueFrom(await readPractical(dayo, { practicalId: copyId })).draft.revision).toBe(revision);
  });

  it('and putting back are the owner’s alone, and nothing to a practical that was taken from none', async () => {
    const { practicalId, copyId, revision, versionId } = await original();
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'teacher');
    for (const other of [rut, stranger]) {
      expect(code(await takeNewerVersion(other, { practicalId: copyId, revision, versionId }))).toBe(
        'not_found',
      );
      expect(code(await putBackDraft(other, { practicalId: copyId, revision }))).toBe('not_found');
    }
    expect(code(await takeNewerVersion(head, { practicalId: copyId, revision, versionId }))).toBe(
      'forbidden',
    );
    expect(code(await putBackDraft(head, { practicalId: copyId, revision }))).toBe('forbidden');
    expect(code(await putBackDraft(dayo, { practicalId: 'mine', revision }))).toBe('invalid');
    const own = valueFrom(await readPractical(rut, { practicalId })).draft.revision;
    expect(code(await takeNewerVersion(rut, { practicalId, revision: own, versionId }))).toBe('conflict');
  });

  it('changes nothing when the log cannot be written', async () => {
    const { copyId, revision, versionId } = await original();
    const before = valueFrom(await readPractical(dayo, { practicalId: copyId }));
    await whileLogFails(() => takeNewerVersion(dayo, { practicalId: copyId, revision, versionId }));
    expect(valueFrom(await readPractical(dayo, { practicalId: copyId }))).toEqual(before);
    valueFrom(await takeNewerVersion(dayo, { practicalId: copyId, revision, versionId }));
    const after = valueFrom(await readPractical(dayo, { practicalId: copyId }));
    await whileLogFails(() => putBackDraft(dayo, { practicalId: copyId, revision: revision + 1 }));
    expect(valueFrom(await readPractical(dayo, { practicalId: copyId }))).toEqual(after);
  });
});
