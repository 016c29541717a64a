import 'server-only';
import { randomUUID } from 'node:crypto';
import type { Transaction } from '@/db/client';
import {
  enrollToday,
  insertAttemptsInOpenSittings,
  insertStudentRoles,
  insertStudents,
  selectMadeIds,
  updateStudent,
} from '@/db/queries/rosters';
import type { SectionRow } from '@/db/queries/sections';
import { madeIds } from './local-ids';
import type { ImportPlan } from './plan-import';

/**
 * Writes a plan: new people with their IDs, corrected names and IDs, and everybody's place in the section and in its
 * open sittings. The rosters of the school must be locked. Returns who was added, with the IDs that were made.
 */
export async function writeRoster(
  tx: Transaction,
  { schoolId, sectionId, today }: SectionRow,
  plan: ImportPlan,
): Promise<{ personId: string; localId: string }[]> {
  const given = plan.added.flatMap(({ localId }) => localId ?? []);
  const missing = plan.added.filter(({ localId }) => localId === null).length;
  const made = madeIds([...(await selectMadeIds(tx, schoolId)), ...given], missing).values();
  const added = plan.added.map(({ localId, ...name }) => ({
    personId: randomUUID(),
    localId: localId ?? made.next().value ?? '',
    ...name,
  }));
  for (const { person, familyName, givenName } of plan.renamed) {
    await updateStudent(tx, schoolId, person.personId, { familyName, givenName });
  }
  for (const { person, localId } of plan.renumbered) {
    await updateStudent(tx, schoolId, person.personId, { localId });
  }
  await insertStudents(tx, schoolId, added);
  const joining = plan.enrolled.map(({ personId }) => personId);
  await insertStudentRoles(tx, schoolId, joining);
  const studentIds = [...added.map(({ personId }) => personId), ...joining];
  await enrollToday(tx, schoolId, sectionId, { studentIds, today });
  await insertAttemptsInOpenSittings(tx, schoolId, sectionId);
  return added.map(({ personId, localId }) => ({ personId, localId }));
}
