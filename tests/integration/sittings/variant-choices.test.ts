import { expect, it } from 'vitest';
import { openSitting } from '@/lib/data/sittings/open-sitting';
import { readOpenChoices } from '@/lib/data/sittings/read-open-choices';
import { ownerSql } from '@/tests/support/database';
import { publishDraft, valueFrom } from '@/tests/support/practicals';
import { makeActor, makeSchool, makeSection } from '@/tests/support/school';
import { makeProposed, publishedStarter } from '@/tests/support/variants';

it('tells of a practical with published variants which of one’s own periods have which', async () => {
  const school = await makeSchool();
  const teacher = await makeActor(school, 'teacher');
  const colleague = await makeActor(school, 'teacher');
  const { practicalId, versionId } = await publishedStarter(teacher, 'desk-caddy');
  const lone = await publishedStarter(teacher, 'six-stick');
  const [b, c] = (await makeProposed(teacher, practicalId, 3)).map((made) => made.practicalId);
  await publishDraft(teacher, b ?? '');
  const later = await publishDraft(teacher, c ?? '');
  const give = async (actor: typeof teacher, period: string, version: string) => {
    const sectionId = await makeSection(school, { teacherIds: [actor.personId] });
    await ownerSql()`update sections set period = ${period} where id = ${sectionId}`;
    valueFrom(await openSitting(actor, { sectionId, versionId: version }));
  };
  await give(teacher, '2', versionId);
  await give(teacher, '6', later.versionId);
  await ownerSql()`update practicals set offered_at = now() where id = ${c ?? ''}`;
  await give(colleague, '7', later.versionId);
  const { families, sections } = valueFrom(await readOpenChoices(teacher, {}));
  expect(families).toEqual([
    {
      practicalIds: expect.arrayContaining([practicalId, b, c]),
      members: [
        { practicalId, versionId, name: 'original', periods: ['2'] },
        expect.objectContaining({ practicalId: b, name: 'variant B', periods: [] }),
        { practicalId: c, versionId: later.versionId, name: 'variant C', periods: ['6'] },
      ],
    },
  ]);
  expect(families[0]?.practicalIds).not.toContain(lone.practicalId);
  const second = sections.find(({ period }) => period === '2');
  expect(second?.versions.map((version) => version.practicalId)).toEqual(expect.arrayContaining([b, c]));
  expect(second?.versions.map((version) => version.practicalId)).not.toContain(practicalId);
});
