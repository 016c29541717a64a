import { beforeEach, describe, expect, it } from 'vitest';
import { listVariants } from '@/lib/data/practicals/list-variants';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { takePrices } from '@/lib/data/practicals/take-prices';
import {
  changeDraft,
  countPracticals,
  makeStarter,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';
import { makeProposed, publishedStarter } from '@/tests/support/variants';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');

let original = '';
let variant = '';

const draftOf = async (practicalId: string) => valueFrom(await readPractical(teacher, { practicalId })).draft;

const listed = async () => {
  const list = valueFrom(await listVariants(teacher, { practicalId: original }));
  const [row] = list.variants;
  if (!row || !list.original) throw new Error('The variant is not listed.');
  return { row, versionId: list.original.versionId };
};

beforeEach(async () => {
  original = (await publishedStarter(teacher, 'desk-caddy')).practicalId;
  variant = (await makeProposed(teacher, original, 1))[0]?.practicalId ?? '';
});

/** Publishes the original with a dearer side and another missing price. */
async function moveOn(): Promise<void> {
  await changeDraft(teacher, original, (draft) => {
    draft.all.missing = '7';
    draft.reading.margin = '0.004';
    Object.assign(draft.lines[2] ?? {}, { worth: '12' });
    Object.assign(draft.lines[0] ?? {}, { length: '7 1/2' });
  });
  await publishDraft(teacher, original);
}

describe('the prices of the original', () => {
  it('are those of the variant as it is made, and others once the original has moved on', async () => {
    expect((await listed()).row.prices).toEqual([]);
    await moveOn();
    const { prices } = (await listed()).row;
    expect(prices.length).toBeGreaterThan(0);
    expect(JSON.stringify(prices)).toContain('margin');
  });

  it('are taken over into the draft; words and sizes stay as they are', async () => {
    await changeDraft(teacher, variant, (draft) => {
      draft.instructions = 'Cut the ends from the narrow strip.';
    });
    const before = (await draftOf(variant)).content;
    await moveOn();
    const { row, versionId } = await listed();
    const taken = valueFrom(
      await takePrices(teacher, { practicalId: variant, revision: row.revision, versionId }),
    );
    expect(taken).toEqual({ revision: row.revision + 1 });
    const { content } = await draftOf(variant);
    const priced = structuredClone(before);
    priced.all.missing = '7';
    priced.reading.margin = '0.004';
    Object.assign(priced.lines[2] ?? {}, { worth: '12' });
    expect(content).toEqual(priced);
    expect((await listed()).row.prices).toEqual([]);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'practical.change',
        details: { tookPrices: 'Desk caddy, variant B', version: 2, fromVersion: versionId },
      }),
    );
  });

  it('are told and taken while the variant’s draft cannot be read yet', async () => {
    await changeDraft(teacher, variant, (draft) => {
      Object.assign(draft.lines[0] ?? {}, { width: '3 1/' });
    });
    await moveOn();
    const { row, versionId } = await listed();
    expect(JSON.stringify(row.prices)).toContain('0.004');
    valueFrom(await takePrices(teacher, { practicalId: variant, revision: row.revision, versionId }));
    expect((await draftOf(variant)).content.lines[0]).toMatchObject({ width: '3 1/' });
    expect((await listed()).row.prices).toEqual([]);
  });

  it('are refused over a draft or from a version that has been changed since', async () => {
    await moveOn();
    const { row, versionId } = await listed();
    const input = { practicalId: variant, revision: row.revision, versionId };
    const before = await countPracticals(school);
    const other = (await publishedStarter(teacher, 'bench-hook')).versionId;
    for (const wrong of [{ revision: row.revision + 1 }, { versionId: other }]) {
      expect(await takePrices(teacher, { ...input, ...wrong })).toMatchObject({ problem: { code: 'stale' } });
    }
    expect((await countPracticals(school))?.revisions).toBe((before?.revisions ?? 0) + 1);
  });

  it('are nothing to take for what is no variant', async () => {
    const practicalId = await makeStarter(teacher);
    const { versionId } = await publishDraft(teacher, practicalId);
    expect(await takePrices(teacher, { practicalId, revision: 1, versionId })).toMatchObject({
      problem: { code: 'conflict' },
    });
  });

  it('are refused to whoever the variant does not belong to, and to other roles', async () => {
    await moveOn();
    const { row, versionId } = await listed();
    const input = { practicalId: variant, revision: row.revision, versionId };
    const others = [
      await makeActor(school, 'teacher'),
      await makeActor(await makeSchool('Ardmore Academy'), 'teacher'),
    ];
    for (const other of others) {
      expect(await takePrices(other, input)).toMatchObject({ problem: { code: 'not_found' } });
    }
    for (const role of ['head', 'admin', 'aide', 'student'] as const) {
      expect(await takePrices(await makeActor(school, role), input)).toMatchObject({
        problem: { code: 'forbidden' },
      });
    }
    expect(await takePrices(teacher, { ...input, practicalId: 'mine' })).toMatchObject({
      problem: { code: 'invalid' },
    });
    expect((await draftOf(variant)).revision).toBe(row.revision);
  });

  it('are not taken when the log cannot be written', async () => {
    await moveOn();
    const { row, versionId } = await listed();
    const before = await countPracticals(school);
    await whileLogFails(() =>
      takePrices(teacher, { practicalId: variant, revision: row.revision, versionId }),
    );
    expect(await countPracticals(school)).toEqual(before);
  });
});
