import type { Transaction } from '@/db/client';
import {
  credentials,
  departments,
  enrollments,
  people,
  personRoles,
  schools,
  sectionStaff,
  sections,
  terms,
} from '@/db/schema';
import type { Name } from './names';
import type { SchoolPlan, StaffPlan } from './plan';
import type { Random } from './random';

export interface SeededStudent extends Name {
  id: string;
  localId: string;
}

export interface SeededSection {
  id: string;
  key: string;
  period: string;
  teacherId: string;
  students: SeededStudent[];
}

export interface SeededSchool {
  id: string;
  plan: SchoolPlan;
  departmentId: string;
  staff: Map<string, string>;
  sections: Map<string, SeededSection>;
}

export interface Hashes {
  staff: string;
  student: string;
}

const TERM = { name: 'fall 2026', startsOn: '2026-08-24', endsOn: '2026-12-18' };
const LAST_TERM = { name: 'spring 2026', startsOn: '2026-01-12', endsOn: '2026-06-05' };

/** A school with its department, terms, staff, sections and students. */
export async function seedSchool(
  tx: Transaction,
  random: Random,
  plan: SchoolPlan,
  nextName: () => Name,
  hashes: Hashes,
): Promise<SeededSchool> {
  const id = random.uuid();
  const { code, name, timeZone, unit } = plan;
  await tx.insert(schools).values({ id, code, name, timeZone, unit });
  const departmentId = random.uuid();
  await tx.insert(departments).values({ schoolId: id, id: departmentId, name: 'Wood and design' });
  const termId = random.uuid();
  await tx.insert(terms).values([
    { schoolId: id, id: termId, ...TERM },
    { schoolId: id, id: random.uuid(), ...LAST_TERM },
  ]);
  const school: SeededSchool = { id, plan, departmentId, staff: new Map(), sections: new Map() };
  for (const person of plan.staff) await seedStaff(tx, random, school, person, hashes.staff);
  let localId = plan.firstLocalId;
  for (const section of plan.sections) {
    const students = Array.from({ length: section.students }, () => {
      localId += random.whole(1, 4);
      return { id: random.uuid(), localId: String(localId).padStart(5, '0'), ...nextName() };
    });
    await seedSection(tx, random, school, termId, section, students, hashes.student);
  }
  await seedAide(tx, school);
  return school;
}

export function emailOf(plan: SchoolPlan, person: StaffPlan): string {
  return `${person.givenName}.${person.familyName}@${plan.domain}`.toLowerCase();
}

async function seedStaff(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  person: StaffPlan,
  passwordHash: string,
) {
  const id = random.uuid();
  school.staff.set(person.key, id);
  const { familyName, givenName } = person;
  await tx
    .insert(people)
    .values({ schoolId: school.id, id, familyName, givenName, email: emailOf(school.plan, person) });
  await tx.insert(personRoles).values(
    person.roles.map((role) => ({
      schoolId: school.id,
      personId: id,
      role,
      departmentId: role === 'head' || role === 'teacher' ? school.departmentId : null,
    })),
  );
  await tx.insert(credentials).values({ schoolId: school.id, personId: id, passwordHash, mustChange: false });
}

async function seedSection(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  termId: string,
  plan: SchoolPlan['sections'][number],
  students: SeededStudent[],
  passwordHash: string,
) {
  const schoolId = school.id;
  const id = random.uuid();
  const teacherId = school.staff.get(plan.teacher);
  if (!teacherId) throw new Error(`${plan.teacher} is not on the staff`);
  await tx.insert(sections).values({
    schoolId,
    id,
    departmentId: school.departmentId,
    termId,
    name: plan.name,
    period: plan.period,
  });
  await tx.insert(sectionStaff).values({ schoolId, sectionId: id, personId: teacherId, duty: 'teacher' });
  await tx.insert(people).values(students.map((student) => ({ schoolId, ...student })));
  await tx
    .insert(personRoles)
    .values(students.map((student) => ({ schoolId, personId: student.id, role: 'student' as const })));
  await tx
    .insert(credentials)
    .values(students.map((student) => ({ schoolId, personId: student.id, passwordHash, mustChange: false })));
  await tx.insert(enrollments).values(
    students.map((student) => ({
      schoolId,
      sectionId: id,
      studentId: student.id,
      joinedOn: TERM.startsOn,
    })),
  );
  school.sections.set(plan.key, { id, key: plan.key, period: plan.period, teacherId, students });
}

/** The aide records in two periods of the first teacher until the term ends. */
async function seedAide(tx: Transaction, school: SeededSchool): Promise<void> {
  const aide = school.plan.staff.find(({ roles }) => roles.includes('aide'));
  const personId = aide && school.staff.get(aide.key);
  if (!personId) return;
  await tx.insert(sectionStaff).values(
    [...school.sections.values()].slice(0, 2).map((section) => ({
      ...{ schoolId: school.id, sectionId: section.id, personId },
      ...{ duty: 'aide' as const, fromDay: '2026-11-30', toDay: TERM.endsOn },
    })),
  );
}
