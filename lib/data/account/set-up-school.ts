import 'server-only';
import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { Transaction } from '@/db/client';
import { endSetupLinks } from '@/db/queries/account';
import { insertFirstAdmin, insertSchool, isSchoolCodeTaken } from '@/db/queries/school';
import { insertTerm } from '@/db/queries/terms';
import { savePassword } from '@/lib/auth/credentials';
import { passwordProblem } from '@/lib/auth/password-rules';
import type { Role } from '@/lib/auth/roles';
import { setUpSchoolInput } from '@/lib/contracts/school';
import { asRole } from './as-role';
import { defineEntry, logEntry, refuseFields } from './entry';
import { openSetupLink } from './open-link';
import { firstStaffRole, type SignedInView } from './sign-in-staff';

type Plan = z.output<typeof setUpSchoolInput>;

/**
 * Makes a school with one department, its current term and its first admin, and uses the link up: all of it or nothing.
 */
export const setUpSchool = defineEntry({
  input: setUpSchoolInput,
  run: ({ input, db }) =>
    db.transaction(async (tx): Promise<SignedInView> => {
      await openSetupLink(tx, input.secret, true);
      const wrong = passwordProblem(input.password, input);
      if (wrong) refuseFields({ password: [wrong] });
      if (await isSchoolCodeTaken(tx, input.schoolCode)) {
        refuseFields({ schoolCode: ['Another school here has this code. Choose another.'] });
      }
      return makeSchool(tx, input);
    }),
});

async function makeSchool(tx: Transaction, plan: Plan): Promise<SignedInView> {
  const schoolId = randomUUID();
  const personId = randomUUID();
  const roles: Role[] = ['admin'];
  if (plan.teaches) roles.push('teacher');
  if (plan.leads) roles.push('head');
  const { schoolName: name, schoolCode: code, timeZone, unit } = plan;
  await insertSchool(tx, { id: schoolId, name, code, timeZone, unit });
  await insertFirstAdmin(tx, { schoolId, personId, roles, ...plan });
  await savePassword(tx, { schoolId, personId }, plan.password, false);
  await endSetupLinks(tx);
  await asRole(tx, schoolId, ['trymark_app', 'trymark_auth'], () =>
    insertTerm(tx, { schoolId, name: plan.termName, startsOn: plan.startsOn, endsOn: plan.endsOn }),
  );
  await logEntry(tx, { schoolId, personId, by: 'admin', action: 'school.set-up', details: { code, roles } });
  const role = firstStaffRole(roles) ?? 'admin';
  return { personId, schoolId, role, schoolName: name, schoolCode: code };
}
