import { describe, expect, it } from 'vitest';
import { makeVariants } from '@/lib/data/practicals/make-variants';
import { proposeVariants } from '@/lib/data/practicals/propose-variants';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { starterDraft } from '@/lib/practicals/starters';
import { ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  countPracticals,
  makeStarter,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';
import { asProposed, makeProposed, publishedStarter } from '@/tests/support/variants';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');
const colleague = await makeActor(school, 'teacher');

const propose = async (practicalId: string, count = 2) =>
  valueFrom(await proposeVariants(teacher, { practicalId, count }));

describe('making variants', () => {
  it('makes a draft of each under the next letters, with the proposed sizes and all else as the original', async () => {
    const { practicalId, versionId } = await publishedStarter(teacher, 'desk-caddy');
    const proposed = await propose(practicalId);
    const made = valueFrom(await makeVariants(teacher, asProposed(proposed)));
    expect(made.map(({ title }) => title)).toEqual(['Desk caddy, variant B', 'Desk caddy, variant C']);
    for (const [index, { practicalId: variantId, title }] of made.entries()) {
      const { draft, versions } = valueFrom(await readPractical(teacher, { practicalId: variantId }));
      const sizes = { lines: draft.content.lines };
      expect(draft.content).toEqual({ ...starterDraft('desk-caddy'), title, ...sizes });
      expect(parseDraft(draft.content)).toMatchObject({
        task: { cutList: proposed.proposals[index]?.cutList },
      });
      expect(versions).toEqual([]);
      const [row] = await ownerSql()`
        select source_kind, copied_from_version_id, owner_id from practicals where id = ${variantId}`;
      expect(row).toEqual({
        source_kind: 'variant',
        copied_from_version_id: versionId,
        owner_id: teacher.personId,
      });
    }
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'practical.change',
        details: { madeVariant: 'Desk caddy, variant C', fromPractical: practicalId, fromVersion: versionId },
      }),
    );
  });

  it('goes on with the letters, and keeps apart from those that there are', async () => {
    const { practicalId } = await publishedStarter(teacher, 'desk-caddy');
    await makeProposed(teacher, practicalId, 2);
    const proposed = await propose(practicalId, 1);
    expect(proposed.others.map(({ name }) => name)).toEqual(['variant B', 'variant C']);
    expect(proposed.proposals.map(({ letter }) => letter)).toEqual(['D']);
    const [made] = valueFrom(await makeVariants(teacher, asProposed(proposed)));
    expect(made?.title).toBe('Desk caddy, variant D');
  });

  it('takes sizes changed by hand, but not those of the original or of another one again', async () => {
    const { practicalId } = await publishedStarter(teacher, 'six-stick');
    const input = asProposed(await propose(practicalId));
    const [first] = input.variants;
    if (!first) throw new Error('There is no proposal.');
    const before = await countPracticals(school);
    const lines = (width: number, length: number) => [
      { lineId: 'stick', width, length },
      { lineId: 'key', width, length },
    ];
    for (const variants of [
      [first, { ...first, letter: 'C' }],
      [{ letter: 'B', lines: lines(1, 2).slice(1) }],
      [{ letter: 'B', lines: [...lines(1, 2), ...lines(1, 2)] }],
    ]) {
      expect(await makeVariants(teacher, { ...input, variants })).toMatchObject({
        ok: false,
        problem: { code: 'invalid' },
      });
    }
    expect(await countPracticals(school)).toEqual(before);
    const [made] = valueFrom(
      await makeVariants(teacher, {
        ...input,
        variants: [{ letter: 'B', lines: lines(25_400_000, 254_000_000) }],
      }),
    );
    const { draft } = valueFrom(await readPractical(teacher, { practicalId: made?.practicalId }));
    expect(draft.content.lines).toMatchObject([
      { thickness: '3/4', width: '0.1', length: '1' },
      { thickness: '3/4', width: '0.1', length: '1' },
    ]);
  });

  it('keeps the letters of those chosen, and refuses one that is taken or not next', async () => {
    const { practicalId } = await publishedStarter(teacher, 'desk-caddy');
    const input = asProposed(await propose(practicalId, 3));
    const [first, , third] = input.variants;
    const made = valueFrom(await makeVariants(teacher, { ...input, variants: [first, third] }));
    expect(made.map(({ title }) => title)).toEqual(['Desk caddy, variant B', 'Desk caddy, variant D']);
    for (const variants of [[first], [{ ...first, letter: 'A' }], [{ ...first, letter: 'Q' }]]) {
      expect(await makeVariants(teacher, { ...input, variants })).toMatchObject({
        problem: { code: 'stale' },
      });
    }
    expect((await propose(practicalId, 1)).proposals.map(({ letter }) => letter)).toEqual(['E']);
  });

  it('refuses sizes of a version that is no longer the latest', async () => {
    const { practicalId } = await publishedStarter(teacher, 'six-stick');
    const input = asProposed(await propose(practicalId));
    await changeDraft(teacher, practicalId, (draft) => {
      draft.all.worth = '8';
    });
    await publishDraft(teacher, practicalId);
    const before = await countPracticals(school);
    expect(await makeVariants(teacher, input)).toMatchObject({ ok: false, problem: { code: 'stale' } });
    expect(await countPracticals(school)).toEqual(before);
  });

  it('makes none of a variant, nor of what is not published', async () => {
    const { practicalId } = await publishedStarter(teacher, 'desk-caddy');
    const input = asProposed(await propose(practicalId));
    const [variant] = await makeProposed(teacher, practicalId, 1);
    const draft = await makeStarter(teacher);
    for (const each of [variant?.practicalId, draft]) {
      const refused = { ok: false, problem: { code: 'conflict' } };
      expect(await makeVariants(teacher, { ...input, practicalId: each })).toMatchObject(refused);
      expect(await proposeVariants(teacher, { practicalId: each, count: 1 })).toMatchObject({
        ok: false,
        problem: { code: 'conflict' },
      });
    }
  });

  it('is refused to whoever the practical does not belong to, who sees nothing there', async () => {
    const { practicalId } = await publishedStarter(teacher, 'six-stick');
    const input = asProposed(await propose(practicalId));
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'teacher');
    const before = await countPracticals(school);
    for (const other of [colleague, stranger]) {
      expect(await makeVariants(other, input)).toMatchObject({ problem: { code: 'not_found' } });
      expect(await proposeVariants(other, { practicalId, count: 1 })).toMatchObject({
        problem: { code: 'not_found' },
      });
    }
    for (const role of ['head', 'admin', 'aide', 'student'] as const) {
      expect(await makeVariants(await makeActor(school, role), input)).toMatchObject({
        problem: { code: 'forbidden' },
      });
    }
    expect(await countPracticals(school)).toEqual(before);
  });

  it.each([
    ['no practical', { practicalId: 'mine' }],
    ['nothing chosen', { variants: [] }],
    ['a size of nothing', { variants: [{ letter: 'B', lines: [{ lineId: 'stick', width: 0, length: 1 }] }] }],
    [
      'a thickness',
      { variants: [{ letter: 'B', lines: [{ lineId: 'stick', width: 1, length: 1, thickness: 1 }] }] },
    ],
  ])('refuses %s', async (_, wrong) => {
    const { practicalId } = await publishedStarter(teacher, 'six-stick');
    const input = { ...asProposed(await propose(practicalId)), ...wrong };
    expect(await makeVariants(teacher, input)).toMatchObject({ ok: false, problem: { code: 'invalid' } });
  });

  it('refuses to propose none or more than six', async () => {
    const { practicalId } = await publishedStarter(teacher, 'six-stick');
    for (const count of [0, 7, 'some']) {
      expect(await proposeVariants(teacher, { practicalId, count })).toMatchObject({
        ok: false,
        problem: { code: 'invalid', fields: { count: [expect.any(String)] } },
      });
    }
  });

  it('makes none of them when the log cannot be written', async () => {
    const { practicalId } = await publishedStarter(teacher, 'desk-caddy');
    const input = asProposed(await propose(practicalId));
    const before = await countPracticals(school);
    await whileLogFails(() => makeVariants(teacher, input));
    expect(await countPracticals(school)).toEqual(before);
  });
});
