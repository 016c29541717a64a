import type { Transaction } from '@/db/client';
import { insertPublication, insertResults } from '@/db/queries/publications';
import { selectSitting, updateSitting } from '@/db/queries/sittings';
import { asTold, gatherResults, judgeAll } from '@/lib/data/sittings/gather-results';
import type { SeededSchool } from './people';
import { morningOf } from './practicals';
import type { Random } from './random';
import type { SeededSitting } from './sittings';

/** Publishes a sitting as its teacher did, on the evening of the day after. */
export async function seedPublication(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
): Promise<void> {
  if (sitting.plan.state !== 'published') return;
  const schoolId = school.id;
  const row = await selectSitting(tx, schoolId, sitting.id);
  if (!row) throw new Error('this sitting is not there');
  const results = judgeAll(await gatherResults(tx, row), false);
  const publicationId = await insertPublication(tx, {
    ...{
      schoolId,
      id: random.uuid(),
      sittingId: sitting.id,
      number: 1,
      rubricVersionId: row.rubricVersionId,
    },
    publishedBy: sitting.section.teacherId,
    publishedAt: new Date(morningOf(sitting.plan.day).getTime() + 32 * 3_600_000),
  });
  await insertResults(
    tx,
    results.map((result) => ({ schoolId, publicationId, ...asTold(result) })),
  );
  await updateSitting(tx, schoolId, sitting.id, { state: 'published' });
}
