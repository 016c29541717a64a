import 'server-only';
import { selectDepartments } from '@/db/queries/departments';
import { insertPractical } from '@/db/queries/practicals';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { Context } from '../verb';

type Writing = Pick<Context<unknown>, 'actor' | 'tx' | 'refuse'>;

/** The published version that a practical was taken from, and what it is to it. */
export interface PracticalSource {
  versionId: string;
  kind: 'copy' | 'adopted' | 'variant';
}

/** Writes a practical of the actor's with its first draft, in the actor's department or the school's only one. */
export async function writePractical(
  { actor, tx, refuse }: Writing,
  draft: PracticalDraft,
  source: PracticalSource | null = null,
): Promise<string> {
  const { schoolId, personId } = actor;
  const departments = actor.departmentId ? [] : await selectDepartments(tx, schoolId);
  const only = departments.length === 1 ? departments[0]?.departmentId : undefined;
  const departmentId =
    actor.departmentId ??
    only ??
    refuse('conflict', 'You are in no department yet. Ask the admin to set one; then make the practical.');
  const row = { schoolId, departmentId, ownerId: personId, title: draft.title, unit: draft.unit };
  const taken = source && { copiedFromVersionId: source.versionId, sourceKind: source.kind };
  return insertPractical(tx, { ...row, ...taken }, { content: draft, savedBy: personId });
}
