'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { currentActor } from '@/lib/auth/session';
import {
  changeAttemptInput,
  changeDueInput,
  openSittingInput,
  publishInput,
  startRedoInput,
} from '@/lib/contracts/sittings';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { changeDue } from '@/lib/data/sittings/change-due';
import { openSitting } from '@/lib/data/sittings/open-sitting';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { startRedo } from '@/lib/data/sittings/start-redo';
import { type FormReply, replyTo } from '@/lib/transport/form';

export async function openSittingAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: openSittingInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await openSitting(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect(`/sittings/${result.value.sittingId}`);
}

export async function changeAttemptAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: changeAttemptInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await changeAttempt(await currentActor(), submission.value);
  if (result.ok) revalidatePath(`/sittings/${submission.value.sittingId}`);
  return replyTo(submission, result);
}

export async function startRedoAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: startRedoInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await startRedo(await currentActor(), submission.value);
  if (result.ok) revalidatePath(`/sittings/${submission.value.sittingId}`);
  return replyTo(submission, result);
}

export async function changeDueAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: changeDueInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await changeDue(await currentActor(), submission.value);
  if (result.ok) revalidatePath(`/sittings/${submission.value.sittingId}`);
  return replyTo(submission, result);
}

/** Tells the class, and goes to the gradebook, where the numbers now stand in bold. */
export async function publishAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: publishInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await publishSitting(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect(`/gradebook/${result.value.sectionId}`);
}
