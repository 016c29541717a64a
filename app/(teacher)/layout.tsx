import type { ReactNode } from 'react';
import { AccountMenu } from '@/app/account/_components/account-menu';
import { DeskShell } from '@/components/shell/desk-shell';
import type { Role } from '@/lib/auth/roles';
import { ROLE_HOME } from '@/lib/auth/roles';
import { pageActor } from '@/lib/transport/page';

const ROUNDS = { href: '/round', label: 'rounds' };

/** Links a role has use for; each screen asks for itself who may see it. */
const NAV: Partial<Record<Role, { href: string; label: string }[]>> = {
  teacher: [
    { href: '/periods', label: 'periods' },
    { href: '/practicals', label: 'practicals' },
    { href: '/sittings', label: 'sittings' },
    ROUNDS,
    { href: '/gradebook', label: 'gradebook' },
  ],
  aide: [ROUNDS],
  head: [
    { href: '/department', label: 'department' },
    { href: '/department/shared', label: 'shared' },
    { href: '/department/modified', label: 'modified rubrics' },
    { href: '/gradebook', label: 'gradebook' },
  ],
};

export default async function TeacherLayout({ children }: { children: ReactNode }) {
  const actor = await pageActor();
  const name = `${actor.givenName} ${actor.familyName}`.trim();
  return (
    <DeskShell
      home={ROLE_HOME[actor.role]}
      nav={NAV[actor.role] ?? []}
      person={{ name, place: actor.schoolName }}
      menu={<AccountMenu actor={actor} />}
    >
      {children}
    </DeskShell>
  );
}
