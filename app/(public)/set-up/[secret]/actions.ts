'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { clientAddress } from '@/lib/auth/client-address';
import { setUpSchoolInput } from '@/lib/contracts/school';
import { setUpSchool } from '@/lib/data/account/set-up-school';
import type { FormReply } from '@/lib/transport/form';
import { replyWithoutSecrets } from '@/lib/transport/secret-form';
import { enter } from '../../_components/enter';

export async function setUpSchoolAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: setUpSchoolInput });
  if (submission.status !== 'success') return replyWithoutSecrets(submission, null, ['secret', 'password']);
  const result = await setUpSchool(submission.value, await clientAddress());
  if (!result.ok) return replyWithoutSecrets(submission, result, ['secret', 'password']);
  return enter(result.value);
}
