'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { clientAddress } from '@/lib/auth/client-address';
import { newPasswordInput } from '@/lib/contracts/account';
import { acceptInvitation } from '@/lib/data/account/use-link';
import type { FormReply } from '@/lib/transport/form';
import { replyWithoutSecrets } from '@/lib/transport/secret-form';
import { enter } from '../../_components/enter';

export async function acceptInvitationAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: newPasswordInput });
  if (submission.status !== 'success') return replyWithoutSecrets(submission, null, ['secret', 'password']);
  const result = await acceptInvitation(submission.value, await clientAddress());
  if (!result.ok) return replyWithoutSecrets(submission, result, ['secret', 'password']);
  return enter(result.value);
}
