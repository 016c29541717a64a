'use server';

import { revalidatePath } from 'next/cache';
import { currentActor } from '@/lib/auth/session';
import { moveSitting } from '@/lib/data/sittings/move-sitting';
import { undoMove } from '@/lib/data/sittings/undo-move';
import type { Problem } from '@/lib/result';

export type MoveReply =
  | { kind: 'moved' }
  | { kind: 'stale' }
  | { kind: 'refused'; message: string; signedOut: boolean };

interface MoveRequest {
  sittingId: string;
  versionId: string;
  holdHarmless: boolean;
  seen: string;
}

/** Moves the sitting, unless the preview that was looked at is no longer what would happen. */
export async function moveSittingAction(request: MoveRequest): Promise<MoveReply> {
  const result = await moveSitting(await currentActor(), request);
  if (!result.ok) return replyTo(result.problem);
  revalidatePath(`/sittings/${request.sittingId}`, 'layout');
  return { kind: 'moved' };
}

/** Takes the latest move back; what stands then is shown by the page that is asked for again. */
export async function undoMoveAction(request: {
  sittingId: string;
  moveId: string;
}): Promise<MoveReply | null> {
  const result = await undoMove(await currentActor(), request);
  if (!result.ok) return replyTo(result.problem);
  revalidatePath(`/sittings/${request.sittingId}`, 'layout');
  return null;
}

function replyTo({ code, message }: Problem): MoveReply {
  return code === 'stale'
    ? { kind: 'stale' }
    : { kind: 'refused', message, signedOut: code === 'unauthenticated' };
}
