'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { redirect } from 'next/navigation';
import { clientAddress } from '@/lib/auth/client-address';
import { askResetInput, newPasswordInput } from '@/lib/contracts/account';
import { askReset } from '@/lib/data/account/ask-reset';
import { resetPassword } from '@/lib/data/account/use-link';
import { type FormReply, replyTo } from '@/lib/transport/form';
import { replyWithoutSecrets } from '@/lib/transport/secret-form';
import { enter } from '../_components/enter';

export async function askResetAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: askResetInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await askReset(submission.value, await clientAddress());
  if (!result.ok) return replyTo(submission, result);
  redirect('/reset?sent=yes');
}

export async function resetPasswordAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: newPasswordInput });
  if (submission.status !== 'success') return replyWithoutSecrets(submission, null, ['secret', 'password']);
  const result = await resetPassword(submission.value, await clientAddress());
  if (!result.ok) return replyWithoutSecrets(submission, result, ['secret', 'password']);
  return enter(result.value);
}
