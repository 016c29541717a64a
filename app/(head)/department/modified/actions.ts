'use server';

import type { ReasonReply } from '@/components/accommodation/read-reason-press';
import { currentActor } from '@/lib/auth/session';
import { readReason } from '@/lib/data/accommodations/read-reason';

export async function readReasonAction(_: ReasonReply, data: FormData): Promise<ReasonReply> {
  const accommodationId = data.get('accommodationId');
  const result = await readReason(await currentActor(), { accommodationId });
  return result.ok ? result.value : { refused: result.problem.message };
}
