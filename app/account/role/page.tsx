import type { Metadata } from 'next';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { LinkButton } from '@/components/ui/link-button';
import { ROLE_HOME, ROLE_NAMES, ROLES } from '@/lib/auth/roles';
import { pageActor } from '@/lib/transport/page';
import { RoleSwitch } from '../_components/role-switch';

export const metadata: Metadata = { title: 'Your roles' };

interface RolePageProps {
  searchParams: Promise<{ for?: string }>;
}

export default async function RolePage({ searchParams }: RolePageProps) {
  const actor = await pageActor();
  const { for: wanted } = await searchParams;
  const role = ROLES.find((each) => each === wanted && actor.roles.includes(each));
  const several = actor.roles.length > 1;
  const choice = several ? 'Choose the role to go on in.' : 'You have no other role.';
  return (
    <EntranceShell
      title={several ? 'Another of your roles' : 'Your role'}
      titleBlock={[{ label: 'school', value: actor.schoolName, wide: true }]}
    >
      <p className="mb-6">
        You act as {ROLE_NAMES[actor.role]} now.{' '}
        {role ? `That sheet is for you as ${ROLE_NAMES[role]}.` : choice}
      </p>
      <RoleSwitch actor={actor} />
      <p className="mt-8">
        <LinkButton href={ROLE_HOME[actor.role]}>go on as {ROLE_NAMES[actor.role]}</LinkButton>
      </p>
    </EntranceShell>
  );
}
