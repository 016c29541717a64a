import { describe, expect, it } from 'vitest';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { saveDraft } from '@/lib/data/practicals/save-draft';
import { starterDraft } from '@/lib/practicals/starters';
import { ownerSql } from '@/tests/support/database';
import { countPracticals, makeStarter, valueFrom } from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');
const colleague = await makeActor(school, 'teacher');
const content = { ...starterDraft('bench-hook'), title: 'Hook, half typed' };

const draftOf = async (practicalId: string) => valueFrom(await readPractical(teacher, { practicalId })).draft;

describe('keeping a draft', () => {
  it('keeps what cannot be read yet just as it was typed, and the title in the list with it', async () => {
    const practicalId = await makeStarter(teacher);
    const typed = structuredClone(content);
    Object.assign(typed.lines[0] ?? {}, { width: '4 1/', quantity: 'two' });
    expect(await saveDraft(teacher, { practicalId, revision: 1, content: typed })).toMatchObject({
      ok: true,
      value: { revision: 2 },
    });
    expect(await draftOf(practicalId)).toMatchObject({ content: typed, revision: 2 });
    expect(valueFrom(await readPractical(teacher, { practicalId })).title).toBe('Hook, half typed');
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({ action: 'practical.change', details: { keptDraft: 2 } }),
    );
  });

  it('keeps the title of the list while the typed one is empty', async () => {
    const practicalId = await makeStarter(teacher);
    valueFrom(await saveDraft(teacher, { practicalId, revision: 1, content: { ...content, title: ' ' } }));
    expect(valueFrom(await readPractical(teacher, { practicalId })).title).toBe('Bench-hook kit');
  });

  it('refuses a stale one and leaves the kept one alone', async () => {
    const practicalId = await makeStarter(teacher);
    valueFrom(await saveDraft(teacher, { practicalId, revision: 1, content }));
    const late = { ...content, title: 'from another tab' };
    expect(await saveDraft(teacher, { practicalId, revision: 1, content: late })).toMatchObject({
      ok: false,
      problem: { code: 'stale' },
    });
    expect(await draftOf(practicalId)).toMatchObject({ content, revision: 2 });
  });

  it('of two that are sent at once keeps exactly one', async () => {
    const practicalId = await makeStarter(teacher);
    const sent = await Promise.all(
      ['one', 'two'].map((title) =>
        saveDraft(teacher, { practicalId, revision: 1, content: { ...content, title } }),
      ),
    );
    expect(sent.map(({ ok }) => ok).sort()).toEqual([false, true]);
    expect((await draftOf(practicalId)).revision).toBe(2);
  });

  it('is refused to whoever it does not belong to, who sees nothing there', async () => {
    const practicalId = await makeStarter(teacher);
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'teacher');
    for (const other of [colleague, stranger]) {
      expect(await saveDraft(other, { practicalId, revision: 1, content })).toMatchObject({
        ok: false,
        problem: { code: 'not_found' },
      });
    }
    for (const role of ['head', 'admin', 'aide', 'student'] as const) {
      expect(
        await saveDraft(await makeActor(school, role), { practicalId, revision: 1, content }),
      ).toMatchObject({ ok: false, problem: { code: 'forbidden' } });
    }
    expect((await draftOf(practicalId)).revision).toBe(1);
  });

  it('refuses another unit than the practical was made in, and what is no draft', async () => {
    const practicalId = await makeStarter(teacher);
    expect(
      await saveDraft(teacher, { practicalId, revision: 1, content: { ...content, unit: 'mm' } }),
    ).toMatchObject({ ok: false, problem: { code: 'invalid', fields: { unit: [expect.any(String)] } } });
    expect(
      await saveDraft(teacher, { practicalId, revision: 1, content: { ...content, lines: 'none' } }),
    ).toMatchObject({ ok: false, problem: { code: 'invalid' } });
    expect((await draftOf(practicalId)).revision).toBe(1);
  });

  it('keeps nothing when the log cannot be written', async () => {
    const practicalId = await makeStarter(teacher);
    const before = await countPracticals(school);
    await whileLogFails(() => saveDraft(teacher, { practicalId, revision: 1, content }));
    expect(await countPracticals(school)).toEqual(before);
    const [row] = await ownerSql()`select title from practicals where id = ${practicalId}`;
    expect(row?.title).toBe('Bench-hook kit');
  });
});
