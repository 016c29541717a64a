import Link from 'next/link';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { LinkButton } from '@/components/ui/link-button';
import { ROLE_HOME, ROLE_NAMES, type Role } from '@/lib/auth/roles';
import { currentActor } from '@/lib/auth/session';

const withArticle = (role: Role) => `${/^[aeiou]/.test(ROLE_NAMES[role]) ? 'an' : 'a'} ${ROLE_NAMES[role]}`;

export default async function NotFound() {
  const actor = await currentActor().catch(() => null);
  return (
    <EntranceShell title="Nothing here">
      <p className="mb-6">
        There is nothing at this address, or it is not yours to see
        {actor ? ` as ${withArticle(actor.role)}` : ''}.
      </p>
      <LinkButton kind="act" href={actor ? ROLE_HOME[actor.role] : '/sign-in'}>
        {actor ? 'to your first sheet' : 'to sign-in'}
      </LinkButton>
      {actor && actor.roles.length > 1 ? (
        <p className="mt-6">
          <Link className="link" href="/account/role">
            act in another of your roles
          </Link>
        </p>
      ) : null}
    </EntranceShell>
  );
}
