'use server';

import { revalidatePath } from 'next/cache';
import { currentActor } from '@/lib/auth/session';
import { saveDraft } from '@/lib/data/practicals/save-draft';
import { takeBackVersion } from '@/lib/data/practicals/take-back-version';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { Result } from '@/lib/result';

export type DraftReply = { ok: true; revision: number } | { ok: false; message: string };

/** Takes a version back into the draft; the revision that comes back is what an undo has to name. */
export async function takeBackVersionAction(
  practicalId: string,
  number: number,
  revision: number,
): Promise<DraftReply> {
  return answered(
    practicalId,
    await takeBackVersion(await currentActor(), { practicalId, number, revision }),
  );
}

/** Keeps the draft again that gave way. */
export async function undoTakeBackAction(
  practicalId: string,
  revision: number,
  content: PracticalDraft,
): Promise<DraftReply> {
  return answered(practicalId, await saveDraft(await currentActor(), { practicalId, revision, content }));
}

function answered(practicalId: string, result: Result<{ revision: number }>): DraftReply {
  if (!result.ok) return { ok: false, message: result.problem.message };
  revalidatePath(`/practicals/${practicalId}`, 'layout');
  return { ok: true, revision: result.value.revision };
}
