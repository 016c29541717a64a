import 'server-only';
import { selectByEmail } from '@/db/queries/account';
import type { Role } from '@/lib/auth/roles';
import { accountKey } from '@/lib/auth/sign-in-limits';
import { signInStaffInput } from '@/lib/contracts/account';
import { defineEntry, logEntry, refuse } from './entry';
import { provePerson } from './prove-person';

/** Who signed in, as the session needs it. */
export interface SignedInView {
  personId: string;
  schoolId: string;
  role: Role;
  schoolName: string;
  schoolCode: string;
}

/** The role that staff begin in who hold several: the one with the most to do. */
const FIRST_ROLE: readonly Role[] = ['teacher', 'head', 'admin', 'aide'];

export function firstStaffRole(roles: readonly Role[]): Role | undefined {
  return FIRST_ROLE.find((role) => roles.includes(role));
}

/** Signs staff in by email and password. An unknown address and a wrong password get one answer, in the same time. */
export const signInStaff = defineEntry({
  input: signInStaffInput,
  async run({ input, address, db }): Promise<SignedInView> {
    const found = await selectByEmail(db, input.email);
    const role = firstStaffRole(found?.roles ?? []);
    await provePerson(db, {
      account: accountKey({ email: input.email }),
      address,
      person: found && role ? found : null,
      passwords: [input.password],
      wrong: 'This email and password do not belong together.',
      closed: 'This account is closed after too many wrong tries. “Forgotten password” opens it again.',
    });
    if (!found || !role) return refuse('invalid', 'This email and password do not belong together.');
    const { personId, schoolId, schoolName, schoolCode } = found;
    await logEntry(db, { schoolId, personId, by: role, action: 'account.sign-in' });
    return { personId, schoolId, role, schoolName, schoolCode };
  },
});
