'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { redirect } from 'next/navigation';
import type { Actor } from '@/lib/auth/actor';
import { clientAddress } from '@/lib/auth/client-address';
import { makePassphrase } from '@/lib/auth/passphrase';
import { ROLE_HOME } from '@/lib/auth/roles';
import { currentActor, endSession, startSession, switchRole } from '@/lib/auth/session';
import { changePasswordInput, choosePassphraseInput, switchRoleInput } from '@/lib/contracts/account';
import { changePassword, choosePassphrase } from '@/lib/data/account/change-password';
import type { FormReply } from '@/lib/transport/form';
import { replyWithoutSecrets } from '@/lib/transport/secret-form';

export async function signOutAction(): Promise<void> {
  await endSession();
  redirect('/sign-in');
}

export async function switchRoleAction(data: FormData): Promise<void> {
  const wanted = switchRoleInput.safeParse({ role: data.get('role') });
  if (!wanted.success || !(await switchRole(wanted.data.role))) redirect('/');
  redirect(ROLE_HOME[wanted.data.role]);
}

export async function changePasswordAction(_: FormReply, data: FormData): Promise<FormReply> {
  const secrets = ['current', 'password'];
  const submission = parseWithZod(data, { schema: changePasswordInput });
  if (submission.status !== 'success') return replyWithoutSecrets(submission, null, secrets);
  const actor = await currentActor();
  const result = await changePassword(actor, submission.value, await clientAddress());
  if (!result.ok || !actor) return replyWithoutSecrets(submission, result, secrets);
  await startSession(actor);
  redirect('/account?changed=yes');
}

export async function choosePassphraseAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: choosePassphraseInput });
  if (submission.status !== 'success') return replyWithoutSecrets(submission, null, ['password']);
  const actor = await currentActor();
  const result = await choosePassphrase(actor, submission.value, await clientAddress());
  if (!result.ok || !actor) return replyWithoutSecrets(submission, result, ['password']);
  return goOn(actor);
}

/** Other words to choose from; they are nobody's until they are kept. */
export async function offerWordsAction(): Promise<string> {
  return makePassphrase();
}

async function goOn(actor: Actor): Promise<never> {
  await startSession(actor);
  redirect(ROLE_HOME[actor.role]);
}
