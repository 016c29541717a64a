import type { Actor } from '@/lib/auth/actor';
import { createPractical } from '@/lib/data/practicals/create-practical';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import { publishVersion } from '@/lib/data/practicals/publish-version';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { saveDraft } from '@/lib/data/practicals/save-draft';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { StarterId } from '@/lib/practicals/starter-plans';
import type { Result } from '@/lib/result';
import { ownerSql } from './database';

/** The value of a verb that must have done its work. */
export function valueFrom<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.problem.code}: ${result.problem.message}`);
  return result.value;
}

export async function makeStarter(actor: Actor, starter: StarterId = 'bench-hook'): Promise<string> {
  return valueFrom(await createPractical(actor, { from: 'starter', starter })).practicalId;
}

/** Keeps the practical's draft with something else in it. */
export async function changeDraft(
  actor: Actor,
  practicalId: string,
  change: (draft: PracticalDraft) => void,
): Promise<number> {
  const { draft } = valueFrom(await readPractical(actor, { practicalId }));
  const content = structuredClone(draft.content);
  change(content);
  return valueFrom(await saveDraft(actor, { practicalId, revision: draft.revision, content })).revision;
}

/** Publishes the draft as it stands. */
export async function publishDraft(
  actor: Actor,
  practicalId: string,
): Promise<{ versionId: string; number: number }> {
  const { draft } = valueFrom(await readPractical(actor, { practicalId }));
  return valueFrom(await publishVersion(actor, { practicalId, revision: draft.revision }));
}

/** Publishes the draft as it stands and offers the practical to the department. */
export async function publishAndOffer(
  actor: Actor,
  practicalId: string,
): Promise<{ versionId: string; number: number }> {
  const version = await publishDraft(actor, practicalId);
  valueFrom(await offerPractical(actor, { practicalId, offered: true }));
  return version;
}

/** How much of a school's work on practicals is stored; the same before and after a refusal. */
export async function countPracticals(school: { id: string }) {
  const [row] = await ownerSql()<
    { practicals: number; versions: number; drafts: number; revisions: number; log: number }[]
  >`
    select
      (select count(*)::int from practicals where school_id = ${school.id}) as practicals,
      (select count(*)::int from rubric_versions where school_id = ${school.id}) as versions,
      (select count(*)::int from practical_drafts where school_id = ${school.id}) as drafts,
      (select coalesce(sum(revision), 0)::int from practical_drafts where school_id = ${school.id}) as revisions,
      (select count(*)::int from access_log where school_id = ${school.id}) as log`;
  return row;
}
