import { describe, expect, it } from 'vitest';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { saveDraft } from '@/lib/data/practicals/save-draft';
import { takeBackVersion } from '@/lib/data/practicals/take-back-version';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { changeDraft, countPracticals, makeStarter, publishDraft } from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');

/** A practical whose draft has moved on from its version 1. */
async function movedOn() {
  const practicalId = await makeStarter(teacher, 'desk-caddy');
  const before = value(await readPractical(teacher, { practicalId })).draft.content;
  await publishDraft(teacher, practicalId);
  const revision = await changeDraft(teacher, practicalId, (draft) => {
    draft.title = 'Another caddy';
    draft.kerf = 'thin';
    draft.lines.pop();
  });
  return { practicalId, revision, before };
}

describe('taking a version back into the draft', () => {
  it('makes the draft say what the version says, titles it so, and logs it; what gave way can be kept again', async () => {
    const { practicalId, revision, before } = await movedOn();
    const { draft: changed } = value(await readPractical(teacher, { practicalId }));
    const taken = value(await takeBackVersion(teacher, { practicalId, number: 1, revision }));
    expect(taken.revision).toBe(revision + 1);
    const { draft, title } = value(await readPractical(teacher, { practicalId }));
    expect(draft.content).toEqual(before);
    expect(title).toBe('Desk caddy');
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'practical.change',
        details: { tookBackVersion: 1, keptDraft: revision + 1 },
      }),
    );
    const undone = { practicalId, revision: taken.revision, content: changed.content };
    value(await saveDraft(teacher, undone));
    expect(value(await readPractical(teacher, { practicalId })).draft.content).toEqual(changed.content);
  });

  it('is refused when the draft was changed since it was looked at', async () => {
    const { practicalId, revision } = await movedOn();
    const stale = { practicalId, number: 1, revision: revision - 1 };
    expect(code(await takeBackVersion(teacher, stale))).toBe('stale');
    expect(value(await readPractical(teacher, { practicalId })).draft.content.kerf).toBe('thin');
  });

  it('is nothing to anybody but the owner, and not of a version that is not there', async () => {
    const { practicalId, revision } = await movedOn();
    const before = await countPracticals(school);
    const input = { practicalId, number: 1, revision };
    expect(code(await takeBackVersion(await makeActor(school, 'teacher'), input))).toBe('not_found');
    expect(code(await takeBackVersion(await makeActor(school, 'head'), input))).toBe('forbidden');
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'teacher');
    expect(code(await takeBackVersion(stranger, input))).toBe('not_found');
    expect(code(await takeBackVersion(teacher, { ...input, number: 2 }))).toBe('not_found');
    expect(code(await takeBackVersion(teacher, { ...input, number: 1.5 }))).toBe('invalid');
    expect(await countPracticals(school)).toEqual(before);
  });

  it('leaves the draft and its title when the log cannot be written', async () => {
    const { practicalId, revision } = await movedOn();
    await whileLogFails(() => takeBackVersion(teacher, { practicalId, number: 1, revision }));
    const [row] = await ownerSql()`
      select p.title, d.revision from practicals p join practical_drafts d on d.practical_id = p.id
      where p.id = ${practicalId}`;
    expect(row).toEqual({ title: 'Another caddy', revision });
  });
});
