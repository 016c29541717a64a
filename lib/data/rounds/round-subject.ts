import 'server-only';
import type { Transaction } from '@/db/client';
import { selectStaff } from '@/db/queries/rounds';
import type { Subject } from '@/lib/auth/policy';

/** The sitting as the policy asks for it, and the aides whose days are over. */
export async function roundSubject(
  tx: Transaction,
  round: { schoolId: string; sectionId: string; departmentId: string },
): Promise<{ subject: Subject; formerAideIds: string[] }> {
  const staff = await selectStaff(tx, round.schoolId, round.sectionId);
  const aides = staff.filter(({ duty, begun }) => duty === 'aide' && begun);
  return {
    subject: {
      schoolId: round.schoolId,
      departmentId: round.departmentId,
      teacherIds: staff
        .filter(({ duty, ended }) => duty === 'teacher' && !ended)
        .map(({ personId }) => personId),
      aideIds: aides.filter(({ ended }) => !ended).map(({ personId }) => personId),
    },
    formerAideIds: aides.filter(({ ended }) => ended).map(({ personId }) => personId),
  };
}
