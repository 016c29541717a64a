import type { Metadata } from 'next';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { clientAddress } from '@/lib/auth/client-address';
import { readInvitation } from '@/lib/data/account/read-link';
import { ChoosePassword } from '../../_components/choose-password';
import { LinkEnded } from '../../_components/link-ended';
import { acceptInvitationAction } from './actions';

export const metadata: Metadata = { title: 'Your invitation', referrer: 'no-referrer' };

export default async function InvitationPage({ params }: { params: Promise<{ secret: string }> }) {
  const { secret } = await params;
  const invitation = await readInvitation({ secret }, await clientAddress());
  if (!invitation.ok) {
    return (
      <EntranceShell title="Your invitation">
        <LinkEnded message={invitation.problem.message} />
      </EntranceShell>
    );
  }
  const { givenName, familyName, email, schoolName } = invitation.value;
  return (
    <EntranceShell
      title="Your invitation"
      titleBlock={[
        { label: 'school', value: schoolName, wide: true },
        { label: 'name', value: `${givenName} ${familyName}`, wide: true },
      ]}
    >
      <p className="mb-4">
        {givenName}, choose a password for {schoolName}. You sign in with <strong>{email}</strong>.
      </p>
      <ChoosePassword
        secret={secret}
        email={email}
        submit="keep it and go in"
        action={acceptInvitationAction}
      />
    </EntranceShell>
  );
}
