import type { Actor } from '@/lib/auth/actor';
import { ROLE_NAMES } from '@/lib/auth/roles';
import { switchRoleAction } from '../actions';

/** The roles of a person who holds several; each press acts in another from then on. */
export function RoleSwitch({ actor }: { actor: Pick<Actor, 'role' | 'roles'> }) {
  if (actor.roles.length < 2) return null;
  return (
    <form action={switchRoleAction} className="w-full">
      <p className="text-label text-ink-2">you act as</p>
      <ul className="border-t border-hair">
        {actor.roles.map((role) => (
          <li key={role} className="border-b border-hair">
            <button
              type="submit"
              name="role"
              value={role}
              aria-current={role === actor.role ? 'true' : undefined}
              className="flex min-h-11 w-full items-center text-left aria-[current]:font-[660]"
            >
              {ROLE_NAMES[role]}
              {role === actor.role ? (
                <span className="ml-auto text-label font-[480] text-ink-2">now</span>
              ) : null}
            </button>
          </li>
        ))}
      </ul>
    </form>
  );
}
