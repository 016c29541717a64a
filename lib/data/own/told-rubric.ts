import 'server-only';
import type { Transaction } from '@/db/client';
import type { Rubric } from '@/lib/scoring';
import { modifyRubric } from '@/lib/scoring/modification';
import { rubricSchema } from '@/lib/scoring/schemas';
import { loadModifications } from '../pricing/load-pricing';

/** The rubric that a result names, as it priced this student. */
export async function toldRubric(
  tx: Transaction,
  schoolId: string,
  { rubric, accommodationId }: { rubric: unknown; accommodationId: string | null },
): Promise<Rubric> {
  const parsed = rubricSchema.parse(rubric);
  if (accommodationId === null) return parsed;
  const modification = (await loadModifications(tx, schoolId, [accommodationId])).get(accommodationId);
  return modification ? modifyRubric(parsed, modification) : parsed;
}
