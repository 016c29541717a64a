import { notFound } from 'next/navigation';
import type { ReactNode } from 'react';
import { AccountMenu } from '@/app/account/_components/account-menu';
import { DeskShell } from '@/components/shell/desk-shell';
import { pageActor } from '@/lib/transport/page';

const NAV = [
  { href: '/school', label: 'school', exact: true },
  { href: '/school/people', label: 'people' },
  { href: '/school/sections', label: 'sections' },
  { href: '/school/terms', label: 'terms' },
  { href: '/school/departments', label: 'departments' },
  { href: '/school/log', label: 'access log' },
];

export default async function SchoolLayout({ children }: { children: ReactNode }) {
  const actor = await pageActor();
  if (actor.role !== 'admin') notFound();
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
