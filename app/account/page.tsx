import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { Notice } from '@/components/ui/notice';
import { Heading } from '@/components/ui/titles';
import { ROLE_NAMES } from '@/lib/auth/roles';
import { readAccount } from '@/lib/data/account/read-account';
import { pageActor, pageValue } from '@/lib/transport/page';
import { AccountFrame } from './_components/account-frame';
import { ChangePassword } from './_components/change-password';
import { RoleSwitch } from './_components/role-switch';
import { SignOut } from './_components/sign-out';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage({ searchParams }: { searchParams: Promise<{ changed?: string }> }) {
  const actor = await pageActor();
  const account = pageValue(await readAccount(actor));
  const { changed } = await searchParams;
  const word = account.localId === null ? 'password' : 'passphrase';
  const signsInAs = account.email ?? account.localId ?? '';
  return (
    <AccountFrame actor={actor}>
      <DeskPage
        title="Account"
        note={actor.roles.map((role) => ROLE_NAMES[role]).join(', ')}
        titleBlock={[
          { label: 'school', value: actor.schoolName, wide: true },
          { label: account.email ? 'email' : 'ID', value: signsInAs, wide: true },
        ]}
      >
        {changed ? <Notice className="mb-8" title={`Your ${word} is changed.`} /> : null}
        <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-2">
          <section>
            <Heading className="mb-4 border-b border-ink pb-1">change your {word}</Heading>
            <ChangePassword word={word} signsInAs={signsInAs} />
          </section>
          <section>
            <Heading className="mb-4 border-b border-ink pb-1">on this device</Heading>
            <div className="grid max-w-[26rem] gap-4">
              <RoleSwitch actor={actor} />
              <div>
                <SignOut personId={actor.personId} />
              </div>
            </div>
          </section>
        </div>
      </DeskPage>
    </AccountFrame>
  );
}
