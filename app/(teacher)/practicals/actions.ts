'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { currentActor } from '@/lib/auth/session';
import { createPracticalInput } from '@/lib/contracts/practicals';
import { archivePractical } from '@/lib/data/practicals/archive-practical';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import { createPractical } from '@/lib/data/practicals/create-practical';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import type { Result } from '@/lib/result';
import { type FormReply, replyTo } from '@/lib/transport/form';

/** An empty practical by its title and unit; leads to its first sheet. */
export async function createPracticalAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: createPracticalInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await createPractical(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect(`/practicals/${result.value.practicalId}?step=task`);
}

/** What a press that went wrong says; a press that went well leads on or shows the list anew. */
export type PressReply = { message: string } | undefined;

const text = (data: FormData, name: string) => {
  const value = data.get(name);
  return typeof value === 'string' && value !== '' ? value : null;
};

function follow(result: Result<{ practicalId: string }>): PressReply {
  if (!result.ok) return { message: result.problem.message };
  redirect(`/practicals/${result.value.practicalId}`);
}

export async function copyStarterAction(_: PressReply, data: FormData): Promise<PressReply> {
  const input = { from: 'starter', starter: text(data, 'starter') };
  return follow(await createPractical(await currentActor(), input));
}

export async function copyPracticalAction(_: PressReply, data: FormData): Promise<PressReply> {
  const input = { practicalId: text(data, 'practicalId'), versionId: text(data, 'versionId') };
  return follow(await copyPractical(await currentActor(), input));
}

export async function archivePracticalAction(_: PressReply, data: FormData): Promise<PressReply> {
  const input = { practicalId: text(data, 'practicalId'), archived: text(data, 'archived') === 'yes' };
  const result = await archivePractical(await currentActor(), input);
  if (!result.ok) return { message: result.problem.message };
  revalidatePath('/practicals');
  return undefined;
}

export async function offerPracticalAction(_: PressReply, data: FormData): Promise<PressReply> {
  const input = { practicalId: text(data, 'practicalId'), offered: text(data, 'offered') === 'yes' };
  const result = await offerPractical(await currentActor(), input);
  if (!result.ok) return { message: result.problem.message };
  revalidatePath('/practicals', 'layout');
  return undefined;
}
