import { emailOf, type SeededSchool } from './people';

/** For the demo alone: it is loaded only into a cluster that the start command made itself, on loopback. */
export const STAFF_PASSWORD = 'plane with the grain';
export const STUDENT_PASSPHRASE = 'cedar gauge knife bench';

export function demoAccounts(schools: SeededSchool[]) {
  return schools.flatMap(({ plan, sections }) => [
    ...plan.staff.flatMap((person) =>
      person.roles.slice(0, 1).map((role) => ({
        role,
        name: `${person.givenName} ${person.familyName}`,
        email: emailOf(plan, person),
        schoolCode: null,
        localId: null,
        password: STAFF_PASSWORD,
      })),
    ),
    ...[...sections.values()].slice(0, 2).flatMap(({ students }) =>
      students.slice(0, 1).map((student) => ({
        role: 'student' as const,
        name: `${student.givenName} ${student.familyName}`,
        email: null,
        schoolCode: plan.code,
        localId: student.localId,
        password: STUDENT_PASSPHRASE,
      })),
    ),
  ]);
}
