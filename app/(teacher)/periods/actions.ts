'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { redirect } from 'next/navigation';
import { currentActor } from '@/lib/auth/session';
import { createSectionInput } from '@/lib/contracts/sections';
import { createSection } from '@/lib/data/sections/create-section';
import { type FormReply, replyTo } from '@/lib/transport/form';

/** Makes a section and goes on to its names. */
export async function createSectionAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: createSectionInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await createSection(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect(`/periods/${result.value.sectionId}/import`);
}
