'use server';

import { revalidatePath } from 'next/cache';
import { currentActor } from '@/lib/auth/session';
import { publishVersion } from '@/lib/data/practicals/publish-version';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { saveDraft } from '@/lib/data/practicals/save-draft';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { DraftErrors } from '@/lib/practicals/field-reader';
import { isTemporary } from '@/lib/result';
import type { SaveReply } from './_components/draft-keeper';

/** Keeps a draft; when another was kept in between, that one comes back so that both can be offered. */
export async function saveDraftAction(
  practicalId: string,
  revision: number,
  content: PracticalDraft,
): Promise<SaveReply> {
  const actor = await currentActor();
  const result = await saveDraft(actor, { practicalId, revision, content });
  if (result.ok) {
    revalidatePath(`/practicals/${practicalId}`);
    return { kind: 'kept', revision: result.value.revision, at: result.value.savedAt };
  }
  const { code, message } = result.problem;
  if (code !== 'stale') return { kind: 'refused', message, temporary: isTemporary(code) };
  const kept = await readPractical(actor, { practicalId });
  if (!kept.ok) return { kind: 'refused', message: kept.problem.message, temporary: true };
  const { draft } = kept.value;
  return {
    kind: 'stale',
    message,
    there: { content: draft.content, revision: draft.revision, at: draft.savedAt },
  };
}

export type PublishReply =
  | { kind: 'published'; number: number; versionId: string }
  | { kind: 'refused'; message: string; fields: DraftErrors };

export async function publishVersionAction(practicalId: string, revision: number): Promise<PublishReply> {
  const result = await publishVersion(await currentActor(), { practicalId, revision });
  if (!result.ok) {
    const { message, fields = {} } = result.problem;
    return { kind: 'refused', message, fields };
  }
  revalidatePath('/practicals', 'layout');
  return { kind: 'published', number: result.value.number, versionId: result.value.versionId };
}
