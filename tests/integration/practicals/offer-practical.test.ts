import { describe, expect, it } from 'vitest';
import { archivePractical } from '@/lib/data/practicals/archive-practical';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { readVersion } from '@/lib/data/practicals/read-version';
import { code } from '@/tests/support/answers';
import {
  countPracticals,
  makeStarter,
  publishAndOffer,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';
import { makeSharedSchool, offerAndAdopt } from '@/tests/support/shared-school';

const { school, rut, dayo, head } = await makeSharedSchool();

const offeredTo = async (actor: typeof dayo) =>
  valueFrom(await listPracticals(actor, {})).department.map(({ practicalId }) => practicalId);

describe('offering a practical', () => {
  it('lets the department see its versions and take copies, and says so in the log', async () => {
    const practicalId = await makeStarter(rut);
    const { versionId } = await publishDraft(rut, practicalId);
    expect(await offeredTo(dayo)).not.toContain(practicalId);
    expect(code(await readVersion(dayo, { versionId }))).toBe('not_found');
    valueFrom(await offerPractical(rut, { practicalId, offered: true }));
    expect(await offeredTo(dayo)).toContain(practicalId);
    expect(valueFrom(await readVersion(dayo, { versionId }))).toMatchObject({ ownerName: 'Rut Lindqvist' });
    expect(valueFrom(await readPractical(rut, { practicalId })).offered).toBe(true);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({ action: 'practical.change', details: { offered: 'Bench-hook kit' } }),
    );
  });

  it('withdrawn, shows it to nobody else, and leaves every copy working', async () => {
    const { practicalId, versionId, copyId } = await offerAndAdopt(rut, dayo);
    valueFrom(await offerPractical(rut, { practicalId, offered: false }));
    expect(await offeredTo(dayo)).not.toContain(practicalId);
    expect(code(await copyPractical(dayo, { practicalId, versionId }))).toBe('not_found');
    const copy = valueFrom(await readPractical(dayo, { practicalId: copyId }));
    expect(copy.source).toMatchObject({ versionId, number: 1, isOpen: false, newest: null });
    expect((await publishDraft(dayo, copyId)).number).toBe(1);
  });

  it('changes and logs nothing when it is so already', async () => {
    const practicalId = await makeStarter(rut);
    await publishAndOffer(rut, practicalId);
    const before = await countPracticals(school);
    valueFrom(await offerPractical(rut, { practicalId, offered: true }));
    expect(await countPracticals(school)).toEqual(before);
  });

  it('needs a published version, and ends when the practical is put away', async () => {
    const practicalId = await makeStarter(rut);
    expect(code(await offerPractical(rut, { practicalId, offered: true }))).toBe('conflict');
    await publishAndOffer(rut, practicalId);
    valueFrom(await archivePractical(rut, { practicalId, archived: true }));
    expect(code(await offerPractical(rut, { practicalId, offered: true }))).toBe('conflict');
    valueFrom(await archivePractical(rut, { practicalId, archived: false }));
    expect(valueFrom(await readPractical(rut, { practicalId })).offered).toBe(false);
  });

  it('is the owner’s alone, and refuses what is no practical', async () => {
    const practicalId = await makeStarter(rut);
    await publishDraft(rut, practicalId);
    const before = await countPracticals(school);
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'teacher');
    for (const other of [dayo, stranger]) {
      expect(code(await offerPractical(other, { practicalId, offered: true }))).toBe('not_found');
    }
    expect(code(await offerPractical(head, { practicalId, offered: true }))).toBe('forbidden');
    expect(code(await offerPractical(rut, { practicalId: 'mine', offered: true }))).toBe('invalid');
    expect(await countPracticals(school)).toEqual(before);
  });

  it('is undone when the log cannot be written', async () => {
    const practicalId = await makeStarter(rut);
    await publishDraft(rut, practicalId);
    expect(await whileLogFails(() => offerPractical(rut, { practicalId, offered: true }))).toBeInstanceOf(
      Error,
    );
    expect(valueFrom(await readPractical(rut, { practicalId })).offered).toBe(false);
  });
});
