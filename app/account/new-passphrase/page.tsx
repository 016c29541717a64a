import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { makePassphrase } from '@/lib/auth/passphrase';
import { ROLE_HOME } from '@/lib/auth/roles';
import { currentActor } from '@/lib/auth/session';
import { SignOut } from '../_components/sign-out';
import { ChooseWords } from './_components/choose-words';

export const metadata: Metadata = { title: 'Your own words' };

export default async function NewPassphrasePage() {
  const actor = await currentActor();
  if (!actor) redirect('/sign-in');
  if (!actor.mustChangePassword) redirect(ROLE_HOME[actor.role]);
  return (
    <EntranceShell
      title="Your own words"
      titleBlock={[
        { label: 'school', value: actor.schoolName, wide: true },
        { label: 'name', value: `${actor.givenName} ${actor.familyName}`.trim(), wide: true },
      ]}
    >
      <p className="mb-4">
        {actor.givenName}, the words on your slip were for the first time only. Keep new ones that nobody else
        has seen.
      </p>
      <ChooseWords offered={makePassphrase()} />
      <div className="mt-8">
        <SignOut personId={actor.personId} />
      </div>
    </EntranceShell>
  );
}
