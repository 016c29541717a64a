import { redirect } from 'next/navigation';
import { ROLE_HOME } from '@/lib/auth/roles';
import { pageActor } from '@/lib/transport/page';

/** The front door leads everybody to the first screen of the role they act in. */
export default async function FrontDoor() {
  const actor = await pageActor();
  redirect(ROLE_HOME[actor.role]);
}
