import 'server-only';
import { selectSectionForSlips, selectWithoutPassphrase } from '@/db/queries/account';
import { saveFirstPasswords } from '@/lib/auth/credentials';
import { makePassphrase } from '@/lib/auth/passphrase';
import { makePassphrasesInput } from '@/lib/contracts/account';
import { defineVerb } from '../verb';
import type { PassphraseSlip } from './reset-passphrase';

export interface PassphraseSlipsView {
  schoolName: string;
  schoolCode: string;
  sectionName: string;
  period: string;
  slips: PassphraseSlip[];
}

/**
 * Gives first words to the students of a section who cannot sign in yet; those who can keep theirs. The words are
 * returned once and kept nowhere; each student changes them at the first sign-in.
 */
export const makePassphrases = defineVerb({
  action: 'passphrase.reset',
  input: makePassphrasesInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<PassphraseSlipsView> {
    const section = found(await selectSectionForSlips(tx, actor.schoolId, input.sectionId));
    authorize(section);
    const students = await selectWithoutPassphrase(tx, actor.schoolId, input.sectionId);
    const slips = students.flatMap(({ localId, ...student }) =>
      localId === null ? [] : [{ ...student, localId, words: makePassphrase() }],
    );
    await saveFirstPasswords(
      tx,
      actor.schoolId,
      slips.map(({ studentId, words }) => ({ personId: studentId, password: words })),
    );
    for (const { studentId } of slips) {
      await log({
        subjectKind: 'person',
        subjectId: studentId,
        aboutPersonId: studentId,
        details: { first: true },
      });
    }
    const { schoolName, schoolCode, name, period } = section;
    return { schoolName, schoolCode, sectionName: name, period, slips };
  },
});
