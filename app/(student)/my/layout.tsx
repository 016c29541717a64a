import { notFound } from 'next/navigation';
import type { ReactNode } from 'react';
import { AccountMenu } from '@/app/account/_components/account-menu';
import { PhoneShell } from '@/components/shell/phone-shell';
import { pageActor } from '@/lib/transport/page';

export default async function StudentLayout({ children }: { children: ReactNode }) {
  const actor = await pageActor();
  if (actor.role !== 'student') notFound();
  const name = `${actor.givenName} ${actor.familyName}`.trim();
  return (
    <PhoneShell home="/my" person={{ name }} menu={<AccountMenu actor={actor} />}>
      {children}
    </PhoneShell>
  );
}
