'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { currentActor } from '@/lib/auth/session';
import { changeRolesInput, invitePersonInput } from '@/lib/contracts/school';
import { type PassphraseSlip, resetPassphrase } from '@/lib/data/account/reset-passphrase';
import { bringBack } from '@/lib/data/school/bring-back';
import { changeRoles } from '@/lib/data/school/change-roles';
import { invitePerson } from '@/lib/data/school/invite-person';
import { markLeft } from '@/lib/data/school/mark-left';
import { resendInvitation } from '@/lib/data/school/resend-invitation';
import type { Result } from '@/lib/result';
import { type FormReply, replyTo } from '@/lib/transport/form';

export async function invitePersonAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: invitePersonInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await invitePerson(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect(`/school/people/${result.value.personId}?done=invited`);
}

export async function changeRolesAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: changeRolesInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await changeRoles(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect(`/school/people/${submission.value.personId}?done=roles`);
}

/** What came of a press on a person's sheet, as its foot shows it. */
export type PressReply = { refused: string } | { done: string } | undefined;

export async function resendInvitationAction(_: PressReply, data: FormData): Promise<PressReply> {
  const result = await resendInvitation(await currentActor(), { personId: data.get('personId') });
  return settle(result, ({ email }) => `Sent to ${email}. Links sent before stop working.`);
}

export async function markLeftAction(_: PressReply, data: FormData): Promise<PressReply> {
  const result = await markLeft(await currentActor(), { personId: data.get('personId') });
  return settle(result, () => 'Marked as left.');
}

export async function bringBackAction(_: PressReply, data: FormData): Promise<PressReply> {
  const result = await bringBack(await currentActor(), { personId: data.get('personId') });
  return settle(result, () => 'Back again.');
}

/** New words for a student, to be shown this once. */
export type WordsReply = { refused: string } | { slip: PassphraseSlip } | undefined;

export async function giveWordsAction(_: WordsReply, data: FormData): Promise<WordsReply> {
  const result = await resetPassphrase(await currentActor(), { studentId: data.get('studentId') });
  return result.ok ? { slip: result.value } : { refused: result.problem.message };
}

function settle<T>(result: Result<T>, say: (value: T) => string): PressReply {
  if (!result.ok) return { refused: result.problem.message };
  revalidatePath('/school', 'layout');
  return { done: say(result.value) };
}
