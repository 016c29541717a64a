import { LinkButton } from '@/components/ui/link-button';
import type { Actor } from '@/lib/auth/actor';
import { RoleSwitch } from './role-switch';
import { SignOut } from './sign-out';

/** The foot of the person's menu on every sheet: other roles, the account, the way out. */
export function AccountMenu({ actor }: { actor: Actor }) {
  return (
    <>
      <RoleSwitch actor={actor} />
      <LinkButton href="/account">account</LinkButton>
      <SignOut personId={actor.personId} />
    </>
  );
}
