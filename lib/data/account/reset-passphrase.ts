import 'server-only';
import { deleteCounters, deleteSessions, selectStudent } from '@/db/queries/account';
import { savePassword } from '@/lib/auth/credentials';
import { makePassphrase } from '@/lib/auth/passphrase';
import { accountKey, counterKeys } from '@/lib/auth/sign-in-limits';
import { resetPassphraseInput } from '@/lib/contracts/account';
import { defineVerb } from '../verb';
import { asRole } from './as-role';

/** A student's new words, to be shown once and written down. */
export interface PassphraseSlip {
  studentId: string;
  givenName: string;
  familyName: string;
  localId: string;
  words: string;
}

/**
 * Gives a student new words at the bench: the old ones stop, the student's sessions end, and a closed account opens.
 * The words are returned once and kept nowhere; the student changes them at the next sign-in.
 */
export const resetPassphrase = defineVerb({
  action: 'passphrase.reset',
  input: resetPassphraseInput,
  async run({ actor, input, tx, authorize, found, refuse, log }): Promise<PassphraseSlip> {
    const { schoolId } = actor;
    const student = found(await selectStudent(tx, schoolId, input.studentId));
    authorize({ schoolId: student.schoolId, teacherIds: student.teacherIds, studentId: student.personId });
    const { givenName, familyName, localId, schoolCode, personId: studentId } = student;
    if (student.roles.some((role) => role !== 'student')) {
      refuse('forbidden', `${givenName} ${familyName} also works here and resets the password by email.`);
    }
    if (localId === null) {
      return refuse(
        'conflict',
        `${givenName} ${familyName} has no ID to sign in with. Add one to the roster first.`,
      );
    }
    const words = makePassphrase();
    await savePassword(tx, student, words, true);
    await deleteSessions(tx, schoolId, studentId);
    const keys = counterKeys(accountKey({ schoolCode, localId }));
    await asRole(tx, schoolId, ['trymark_auth', 'trymark_app'], () => deleteCounters(tx, keys));
    await log({ subjectKind: 'person', subjectId: studentId, aboutPersonId: studentId });
    return { studentId, givenName, familyName, localId, words };
  },
});
