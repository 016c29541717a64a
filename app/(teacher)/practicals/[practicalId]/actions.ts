'use server';

import { revalidatePath } from 'next/cache';
import { currentActor } from '@/lib/auth/session';
import { publishVersion } from '@/lib/data/practicals/publish-version';
import { putBackDraft } from '@/lib/data/practicals/put-back-draft';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { saveDraft } from '@/lib/data/practicals/save-draft';
import { type TakenDraft, takeNewerVersion } from '@/lib/data/practicals/take-newer-version';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { DraftErrors } from '@/lib/practicals/field-reader';
import type { Result } from '@/lib/result';
import type { KeptDraft, SaveReply } from './_components/draft-keeper';

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
  if (code !== 'stale') return { kind: 'refused', message, signIn: code === 'unauthenticated' };
  const kept = await readPractical(actor, { practicalId });
  if (!kept.ok) return { kind: 'refused', message: kept.problem.message, signIn: false };
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

/** `reason`: why it differs from the department’s, in the teacher’s words. */
export async function publishVersionAction(
  practicalId: string,
  revision: number,
  reason: string | null,
): Promise<PublishReply> {
  const result = await publishVersion(await currentActor(), { practicalId, revision, reason });
  if (!result.ok) {
    const { message, fields = {} } = result.problem;
    return { kind: 'refused', message, fields };
  }
  revalidatePath('/practicals', 'layout');
  return { kind: 'published', number: result.value.number, versionId: result.value.versionId };
}

/** What a press that gives the draft another content answers. */
export type DraftReply = { kind: 'done'; draft: KeptDraft } | { kind: 'refused'; message: string };

function draftReply(result: Result<TakenDraft>): DraftReply {
  if (!result.ok) return { kind: 'refused', message: result.problem.message };
  revalidatePath('/practicals', 'layout');
  const { content, revision, savedAt } = result.value;
  return { kind: 'done', draft: { content, revision, at: savedAt } };
}

export async function takeNewerVersionAction(
  practicalId: string,
  revision: number,
  versionId: string,
): Promise<DraftReply> {
  return draftReply(await takeNewerVersion(await currentActor(), { practicalId, revision, versionId }));
}

export async function putBackDraftAction(practicalId: string, revision: number): Promise<DraftReply> {
  return draftReply(await putBackDraft(await currentActor(), { practicalId, revision }));
}
