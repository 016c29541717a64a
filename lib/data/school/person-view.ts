import type { selectPerson } from '@/db/queries/people';
import type { Role } from '@/lib/auth/roles';

/** How far a person has come: `invited` and `invitation ended` wait for a password, `no passphrase` for first words. */
export type PersonState = 'active' | 'invited' | 'invitation ended' | 'no passphrase' | 'left';

export interface PersonView {
  personId: string;
  givenName: string;
  familyName: string;
  email: string | null;
  localId: string | null;
  roles: Role[];
  department: { departmentId: string; name: string } | null;
  state: PersonState;
  isSelf: boolean;
}

type PersonRow = NonNullable<Awaited<ReturnType<typeof selectPerson>>>;

export function viewPerson(row: PersonRow, actorId: string): PersonView {
  const { personId, givenName, familyName, email, localId, roles } = row;
  const place = roles.find(({ departmentId }) => departmentId !== null);
  return {
    personId,
    givenName,
    familyName,
    email,
    localId,
    roles: roles.map(({ role }) => role),
    department: place?.departmentId
      ? { departmentId: place.departmentId, name: place.departmentName ?? '' }
      : null,
    state: stateOf(row),
    isSelf: personId === actorId,
  };
}

function stateOf({ leftAt, hasPassword, roles, invitedUntil }: PersonRow): PersonState {
  if (leftAt) return 'left';
  if (hasPassword) return 'active';
  if (!isStaff(roles)) return 'no passphrase';
  return invitedUntil && invitedUntil.getTime() > Date.now() ? 'invited' : 'invitation ended';
}

export function isStaff(roles: readonly { role: Role }[]): boolean {
  return roles.some(({ role }) => role !== 'student');
}
