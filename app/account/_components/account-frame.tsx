import type { ReactNode } from 'react';
import { DeskShell } from '@/components/shell/desk-shell';
import { PhoneShell } from '@/components/shell/phone-shell';
import type { Actor } from '@/lib/auth/actor';
import { ROLE_HOME } from '@/lib/auth/roles';
import { AccountMenu } from './account-menu';

/** The account sheet in the frame of whatever role the person acts in. */
export function AccountFrame({ actor, children }: { actor: Actor; children: ReactNode }) {
  const home = ROLE_HOME[actor.role];
  const person = { name: `${actor.givenName} ${actor.familyName}`.trim(), place: actor.schoolName };
  const nav = [
    { href: home, label: 'back to work' },
    { href: '/account', label: 'account', exact: true },
  ];
  const menu = <AccountMenu actor={actor} />;
  if (actor.role === 'student') {
    return (
      <PhoneShell home={home} nav={nav} person={{ name: person.name }} menu={menu}>
        {children}
      </PhoneShell>
    );
  }
  return (
    <DeskShell home={home} nav={nav} person={person} menu={menu}>
      {children}
    </DeskShell>
  );
}
