'use server';

import { revalidatePath } from 'next/cache';
import { currentActor } from '@/lib/auth/session';
import { approveVersion } from '@/lib/data/department/approve-version';
import { endApproval } from '@/lib/data/department/end-approval';
import type { Result } from '@/lib/result';

/** What a press that went wrong says; null when it went well. */
export type ApprovalReply = string | null;

function replyOf(result: Result<unknown>): ApprovalReply {
  if (!result.ok) return result.problem.message;
  revalidatePath('/department', 'layout');
  return null;
}

export async function approveVersionAction(versionId: string): Promise<ApprovalReply> {
  return replyOf(await approveVersion(await currentActor(), { versionId }));
}

export async function endApprovalAction(approvalId: string): Promise<ApprovalReply> {
  return replyOf(await endApproval(await currentActor(), { approvalId }));
}
