import type { Transaction } from '@/db/client';
import { practicalDrafts, practicals, rubricApprovals } from '@/db/schema';
import { starterDraft } from '@/lib/practicals/starters';
import type { SeededSchool } from './people';
import { cheapMissingGuide, morningOf, type SeededVersion } from './practicals';
import type { Random } from './random';

/**
 * What colleagues have of each other's: the head approved one rubric, and a copy stands on a version whose original
 * has moved on since.
 */
export async function seedSharing(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  versions: Map<string, SeededVersion>,
): Promise<void> {
  const [head, copier] = [school.staff.get('vass'), school.staff.get('okonjo')];
  const [approved, original] = [versions.get('desk-caddy'), versions.get('bench-hook')];
  if (!head || !copier || !approved || !original) throw new Error('the demo has nothing to share');
  await tx.insert(rubricApprovals).values({
    schoolId: school.id,
    id: random.uuid(),
    practicalId: approved.practicalId,
    rubricVersionId: approved.id,
    approvedBy: head,
    approvedAt: morningOf('2026-11-04'),
  });
  await seedFollower(tx, random, school, copier, original);
}

/** A copy of version 1, not published yet, in which a redo may reach the full total. */
async function seedFollower(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  ownerId: string,
  original: SeededVersion,
): Promise<void> {
  const content = starterDraft('bench-hook');
  cheapMissingGuide(content);
  content.redo.capPercent = '100';
  const practicalId = random.uuid();
  const made = morningOf('2026-09-16');
  await tx.insert(practicals).values({
    schoolId: school.id,
    id: practicalId,
    departmentId: school.departmentId,
    ownerId,
    title: content.title,
    unit: content.unit,
    copiedFromVersionId: original.id,
    sourceKind: 'adopted',
    createdAt: made,
  });
  await tx.insert(practicalDrafts).values({
    schoolId: school.id,
    practicalId,
    content,
    revision: 1,
    savedBy: ownerId,
    savedAt: made,
  });
}
