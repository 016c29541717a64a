import type { ReactNode } from 'react';
import { AccountMenu } from '@/app/account/_components/account-menu';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskShell } from '@/components/shell/desk-shell';

const NAV = [
  { href: '/department', label: 'department' },
  { href: '/department/shared', label: 'shared' },
  { href: '/department/modified', label: 'modified rubrics' },
  { href: '/gradebook', label: 'gradebook' },
];

export default async function HeadLayout({ children }: { children: ReactNode }) {
  const actor = await actorInRole('head');
  const name = `${actor.givenName} ${actor.familyName}`.trim();
  return (
    <DeskShell
      home="/department"
      nav={NAV}
      person={{ name, place: actor.schoolName }}
      menu={<AccountMenu actor={actor} />}
    >
      {children}
    </DeskShell>
  );
}
