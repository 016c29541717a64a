import 'server-only';
import { selectByLocalId } from '@/db/queries/account';
import { tidyPassphrase } from '@/lib/auth/passphrase';
import { accountKey } from '@/lib/auth/sign-in-limits';
import { signInStudentInput } from '@/lib/contracts/account';
import { defineEntry, logEntry, refuse } from './entry';
import { provePerson } from './prove-person';
import type { SignedInView } from './sign-in-staff';

const WRONG = 'This ID and passphrase do not belong together at this school.';

/** Signs a student in by school code, local ID and passphrase; capitals and hyphens between words do not matter. */
export const signInStudent = defineEntry({
  input: signInStudentInput,
  async run({ input, address, db }): Promise<SignedInView> {
    const { schoolCode, localId, passphrase } = input;
    const found = await selectByLocalId(db, schoolCode, localId);
    const isStudent = found?.roles.includes('student') ?? false;
    await provePerson(db, {
      account: accountKey({ schoolCode, localId }),
      address,
      person: found && isStudent ? found : null,
      passwords: [...new Set([passphrase, tidyPassphrase(passphrase)])],
      wrong: WRONG,
      closed: 'This account is closed after too many wrong tries. Your teacher can give you new words.',
    });
    if (!found) return refuse('invalid', WRONG);
    const { personId, schoolId, schoolName } = found;
    await logEntry(db, { schoolId, personId, by: 'student', action: 'account.sign-in' });
    return { personId, schoolId, role: 'student', schoolName, schoolCode: found.schoolCode };
  },
});
