import { describe, expect, it } from 'vitest';
import { archivePractical } from '@/lib/data/practicals/archive-practical';
import { listVariants } from '@/lib/data/practicals/list-variants';
import { openSitting } from '@/lib/data/sittings/open-sitting';
import { ownerSql } from '@/tests/support/database';
import { changeDraft, publishDraft, valueFrom } from '@/tests/support/practicals';
import { makeActor, makeSchool, makeSection } from '@/tests/support/school';
import { makeProposed, publishedStarter } from '@/tests/support/variants';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');

describe('the list of variants', () => {
  it('tells of each what is published, what was changed since, and which periods have it', async () => {
    const { practicalId, versionId } = await publishedStarter(teacher, 'desk-caddy');
    const [b, c, d] = (await makeProposed(teacher, practicalId, 3)).map((made) => made.practicalId);
    const give = async (version: string, period: string) => {
      const sectionId = await makeSection(school, { teacherIds: [teacher.personId] });
      await ownerSql()`update sections set period = ${period} where id = ${sectionId}`;
      valueFrom(await openSitting(teacher, { sectionId, versionId: version }));
    };
    await give(versionId, '1');
    const published = await publishDraft(teacher, b ?? '');
    await give(published.versionId, '5');
    await give(published.versionId, '3');
    await publishDraft(teacher, c ?? '');
    await changeDraft(teacher, c ?? '', (draft) => {
      draft.all.worth = '8';
    });
    valueFrom(await archivePractical(teacher, { practicalId: d ?? '', archived: true }));
    const list = valueFrom(await listVariants(teacher, { practicalId }));
    expect(list).toMatchObject({
      title: 'Desk caddy',
      of: null,
      original: { versionId, number: 1 },
      periods: [{ period: '1' }],
      variants: [
        {
          practicalId: b,
          name: 'variant B',
          published: { number: 1 },
          changed: false,
          prices: [],
          periods: [{ period: '3' }, { period: '5' }],
        },
        { practicalId: c, name: 'variant C', published: { number: 1 }, changed: true, periods: [] },
        { practicalId: d, archived: true, published: null, changed: false, periods: [] },
      ],
    });
    expect(list.variants[1]?.prices).not.toEqual([]);
  });

  it('leads from a variant to its original', async () => {
    const { practicalId } = await publishedStarter(teacher, 'six-stick');
    const [b] = await makeProposed(teacher, practicalId, 1);
    expect(valueFrom(await listVariants(teacher, { practicalId: b?.practicalId }))).toMatchObject({
      of: { practicalId, number: 1 },
      variants: [],
    });
  });

  it('is shown to nobody else', async () => {
    const { practicalId } = await publishedStarter(teacher, 'six-stick');
    for (const other of [
      await makeActor(school, 'teacher'),
      await makeActor(await makeSchool('Ardmore Academy'), 'teacher'),
    ]) {
      expect(await listVariants(other, { practicalId })).toMatchObject({ problem: { code: 'not_found' } });
    }
    for (const role of ['admin', 'aide', 'student'] as const) {
      expect(await listVariants(await makeActor(school, role), { practicalId })).toMatchObject({
        problem: { code: 'forbidden' },
      });
    }
    expect(await listVariants(teacher, { practicalId: 'mine' })).toMatchObject({
      problem: { code: 'invalid' },
    });
  });
});
