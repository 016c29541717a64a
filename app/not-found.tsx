import { EntranceShell } from '@/components/shell/entrance-shell';
import { LinkButton } from '@/components/ui/link-button';
import { ROLE_HOME, ROLE_NAMES, type Role } from '@/lib/auth/roles';
import { currentActor } from '@/lib/auth/session';
import { RoleSwitch } from './account/_components/role-switch';

const article = (role: Role) => (/^[aeiou]/.test(ROLE_NAMES[role]) ? 'an' : 'a');

export default async function NotFound() {
  const actor = await currentActor().catch(() => null);
  return (
    <EntranceShell title="Nothing here">
      <p className="mb-6">
        There is nothing at this address, or it is not yours to see
        {actor ? ` as ${article(actor.role)} ${ROLE_NAMES[actor.role]}` : ''}.
      </p>
      <LinkButton kind="act" href={actor ? ROLE_HOME[actor.role] : '/sign-in'}>
        {actor ? 'to your first sheet' : 'to sign-in'}
      </LinkButton>
      {actor && actor.roles.length > 1 ? (
        <div className="mt-8">
          <RoleSwitch actor={actor} />
        </div>
      ) : null}
    </EntranceShell>
  );
}
