import { describe, expect, it } from 'vitest';
import type { Role } from '@/lib/auth/roles';
import { createPractical } from '@/lib/data/practicals/create-practical';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { emptyDraft } from '@/lib/practicals/empty-draft';
import { STARTER_IDS } from '@/lib/practicals/starter-plans';
import { starterDraft } from '@/lib/practicals/starters';
import { ownerSql } from '@/tests/support/database';
import { countPracticals, valueFrom } from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');

describe('making a practical', () => {
  it('from nothing: the title, the unit, the defaults of a new rubric, and no version', async () => {
    const input = { from: 'empty', title: '  Box  ', unit: 'mm' };
    const { practicalId } = valueFrom(await createPractical(teacher, input));
    expect(valueFrom(await readPractical(teacher, { practicalId }))).toMatchObject({
      title: 'Box',
      unit: 'mm',
      draft: { content: emptyDraft('mm', 'Box'), revision: 1 },
      versions: [],
      latest: null,
    });
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'practical.create',
        actor_id: teacher.personId,
        details: { made: 'Box' },
      }),
    );
  });

  it.each(STARTER_IDS)('from the starter %s', async (starter) => {
    const { practicalId } = valueFrom(await createPractical(teacher, { from: 'starter', starter }));
    const { draft } = valueFrom(await readPractical(teacher, { practicalId }));
    expect(draft.content).toEqual(starterDraft(starter));
  });

  it.each(['student', 'head', 'aide', 'admin'] as const)('is refused to a %s', async (role: Role) => {
    const other = await makeActor(school, role);
    const before = await countPracticals(school);
    expect(await createPractical(other, { from: 'empty', title: 'Box', unit: 'in' })).toMatchObject({
      ok: false,
      problem: { code: 'forbidden' },
    });
    expect(await countPracticals(school)).toEqual(before);
  });

  it('says at the field what is wrong, and makes nothing', async () => {
    const before = await countPracticals(school);
    expect(await createPractical(teacher, { from: 'empty', title: ' ', unit: 'ft' })).toMatchObject({
      ok: false,
      problem: {
        code: 'invalid',
        fields: { title: ['Give the practical a title.'], unit: ['Choose inches or millimetres.'] },
      },
    });
    expect(await createPractical(teacher, { from: 'starter', starter: 'bird-house' })).toMatchObject({
      ok: false,
      problem: { code: 'invalid', fields: { starter: ['Choose one of the starters.'] } },
    });
    expect(await countPracticals(school)).toEqual(before);
  });

  it('makes nothing when the log cannot be written', async () => {
    const before = await countPracticals(school);
    await whileLogFails(() => createPractical(teacher, { from: 'starter', starter: 'gauge-kit' }));
    expect(await countPracticals(school)).toEqual(before);
  });

  it('goes to the only department there is, and asks for one when there are several', async () => {
    const small = await makeSchool('Ardmore Academy');
    const loose = { ...(await makeActor(small, 'teacher')), departmentId: null };
    expect(await createPractical(loose, { from: 'starter', starter: 'wall-rack' })).toMatchObject({
      ok: true,
    });
    await ownerSql()`insert into departments (school_id, name) values (${small.id}, 'Design')`;
    expect(await createPractical(loose, { from: 'starter', starter: 'wall-rack' })).toMatchObject({
      ok: false,
      problem: { code: 'conflict' },
    });
  });
});
