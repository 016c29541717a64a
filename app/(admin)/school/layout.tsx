import type { ReactNode } from 'react';
import { AccountMenu } from '@/app/account/_components/account-menu';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskShell } from '@/components/shell/desk-shell';

const NAV = [
  { href: '/school', label: 'school', exact: true },
  { href: '/school/people', label: 'people' },
  { href: '/school/sections', label: 'sections' },
  { href: '/school/terms', label: 'terms' },
  { href: '/school/departments', label: 'departments' },
  { href: '/school/log', label: 'log' },
];

export default async function SchoolLayout({ children }: { children: ReactNode }) {
  const actor = await actorInRole('admin');
  const name = `${actor.givenName} ${actor.familyName}`.trim();
  return (
    <DeskShell
      home="/school"
      nav={NAV}
      person={{ name, place: actor.schoolName }}
      menu={<AccountMenu actor={actor} />}
    >
      {children}
    </DeskShell>
  );
}
