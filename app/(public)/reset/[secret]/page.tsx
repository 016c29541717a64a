import type { Metadata } from 'next';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { clientAddress } from '@/lib/auth/client-address';
import { readResetLink } from '@/lib/data/account/read-link';
import { ChoosePassword } from '../../_components/choose-password';
import { LinkEnded } from '../../_components/link-ended';
import { resetPasswordAction } from '../actions';

export const metadata: Metadata = { title: 'Choose a new password', referrer: 'no-referrer' };

export default async function ResetLinkPage({ params }: { params: Promise<{ secret: string }> }) {
  const { secret } = await params;
  const link = await readResetLink({ secret }, await clientAddress());
  if (!link.ok) {
    return (
      <EntranceShell title="Choose a new password">
        <LinkEnded message={link.problem.message} askAgain />
      </EntranceShell>
    );
  }
  const { email, schoolName } = link.value;
  return (
    <EntranceShell
      title="Choose a new password"
      titleBlock={[{ label: 'school', value: schoolName, wide: true }]}
    >
      <p className="mb-4">
        For <strong>{email}</strong>. Wherever you are signed in now, you will have to sign in again.
      </p>
      <ChoosePassword secret={secret} email={email} submit="keep it and go in" action={resetPasswordAction} />
    </EntranceShell>
  );
}
