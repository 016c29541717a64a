import 'server-only';
import { notFound, redirect } from 'next/navigation';
import type { Actor } from '@/lib/auth/actor';
import type { Role } from '@/lib/auth/roles';
import { pageActor } from '@/lib/transport/page';

/**
 * The signed-in person of a role's sheets. Who holds the role but acts in another is asked to switch; for everybody
 * else there is nothing here. A courtesy alone: what may be seen is decided by each verb.
 */
export async function actorInRole(role: Role): Promise<Actor> {
  const actor = await pageActor();
  if (actor.role === role) return actor;
  if (actor.roles.includes(role)) redirect(`/account/role?for=${role}`);
  return notFound();
}
