import { describe, expect, it } from 'vitest';
import { archivePractical } from '@/lib/data/practicals/archive-practical';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { countPracticals, makeStarter, valueFrom } from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');
const colleague = await makeActor(school, 'teacher');

const titles = async (archived: boolean) =>
  valueFrom(await listPracticals(teacher, { archived })).own.map(({ practicalId }) => practicalId);

describe('putting a practical away', () => {
  it('takes it off the list, and bringing it back puts it there again', async () => {
    const practicalId = await makeStarter(teacher);
    valueFrom(await archivePractical(teacher, { practicalId, archived: true }));
    expect(await titles(false)).not.toContain(practicalId);
    expect(await titles(true)).toContain(practicalId);
    valueFrom(await archivePractical(teacher, { practicalId, archived: false }));
    expect(await titles(false)).toContain(practicalId);
    const said = (await logOf(school)).map(({ details }) => details);
    expect(said).toContainEqual({ putAway: 'Bench-hook kit' });
    expect(said).toContainEqual({ broughtBack: 'Bench-hook kit' });
  });

  it('is refused to whoever it does not belong to, and for what is no practical', async () => {
    const practicalId = await makeStarter(teacher);
    expect(await archivePractical(colleague, { practicalId, archived: true })).toMatchObject({
      ok: false,
      problem: { code: 'not_found' },
    });
    expect(
      await archivePractical(await makeActor(school, 'admin'), { practicalId, archived: true }),
    ).toMatchObject({
      ok: false,
      problem: { code: 'forbidden' },
    });
    expect(await archivePractical(teacher, { practicalId: '7', archived: true })).toMatchObject({
      ok: false,
      problem: { code: 'invalid' },
    });
    expect(await titles(false)).toContain(practicalId);
  });

  it('changes nothing when the log cannot be written', async () => {
    const practicalId = await makeStarter(teacher);
    const before = await countPracticals(school);
    await whileLogFails(() => archivePractical(teacher, { practicalId, archived: true }));
    expect(await titles(false)).toContain(practicalId);
    expect(await countPracticals(school)).toEqual(before);
  });
});
