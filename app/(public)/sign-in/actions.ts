'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { clientAddress } from '@/lib/auth/client-address';
import { signInStaffInput, signInStudentInput } from '@/lib/contracts/account';
import { signInStaff } from '@/lib/data/account/sign-in-staff';
import { signInStudent } from '@/lib/data/account/sign-in-student';
import type { FormReply } from '@/lib/transport/form';
import { replyWithoutSecrets } from '@/lib/transport/secret-form';
import { enter } from '../_components/enter';

export async function signInStaffAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: signInStaffInput });
  if (submission.status !== 'success') return replyWithoutSecrets(submission, null, ['password']);
  const result = await signInStaff(submission.value, await clientAddress());
  if (!result.ok) return replyWithoutSecrets(submission, result, ['password']);
  return enter(result.value);
}

export async function signInStudentAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: signInStudentInput });
  if (submission.status !== 'success') return replyWithoutSecrets(submission, null, ['passphrase']);
  const result = await signInStudent(submission.value, await clientAddress());
  if (!result.ok) return replyWithoutSecrets(submission, result, ['passphrase']);
  return enter(result.value);
}
