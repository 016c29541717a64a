'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import type { ReasonReply } from '@/components/accommodation/read-reason-press';
import { currentActor } from '@/lib/auth/session';
import { accommodationForm } from '@/lib/contracts/accommodations';
import { endAccommodation } from '@/lib/data/accommodations/end-accommodation';
import { makeAccommodation } from '@/lib/data/accommodations/make-accommodation';
import { readReason } from '@/lib/data/accommodations/read-reason';
import type { Result } from '@/lib/result';
import { type FormReply, replyTo } from '@/lib/transport/form';

export async function makeAccommodationAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: accommodationForm });
  if (submission.status !== 'success') return submission.reply();
  const result = await makeAccommodation(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, namedAsInForm(result));
  revalidatePath('/periods', 'layout');
  redirect(`/periods/${submission.value.sectionId}/modified`);
}

/** The verb takes the modification as one; in the form its parts are fields. */
function namedAsInForm<T>(result: Result<T>): Result<T> {
  if (result.ok || !result.problem.fields) return result;
  const fields = Object.entries(result.problem.fields).map(([path, messages]) => [
    path === 'modification' ? '' : path.replace(/^modification\.(widen|excused|checks)\b.*$/, '$1'),
    messages,
  ]);
  return { ok: false, problem: { ...result.problem, fields: Object.fromEntries(fields) } };
}

/** Gives back why it was refused, if it was. */
export async function endAccommodationAction(data: FormData): Promise<string | null> {
  const accommodationId = data.get('accommodationId');
  const result = await endAccommodation(await currentActor(), { accommodationId });
  if (!result.ok) return result.problem.message;
  revalidatePath('/periods', 'layout');
  return null;
}

export async function readReasonAction(_: ReasonReply, data: FormData): Promise<ReasonReply> {
  const accommodationId = data.get('accommodationId');
  const result = await readReason(await currentActor(), { accommodationId });
  return result.ok ? result.value : { refused: result.problem.message };
}
