import type { Actor } from './actor';
import type { Role } from './roles';

/** What a verb knows of the row it loaded, as far as permission depends on it. */
export interface Subject {
  schoolId: string;
  /** The department of the section, practical or rubric. */
  departmentId?: string | null;
  /** The teachers of the section, or the owner of the practical. */
  teacherIds?: readonly string[];
  /** The aides of the section whose given days include today. */
  aideIds?: readonly string[];
  /** The practical's owner offers it to the department. */
  offered?: boolean;
  /** The student the record is about. */
  studentId?: string | null;
}

type Rule = (actor: Actor, subject: Subject) => boolean;

const anyone: Rule = () => true;
const ofSection: Rule = (actor, subject) => subject.teacherIds?.includes(actor.personId) ?? false;
const aideToday: Rule = (actor, subject) => subject.aideIds?.includes(actor.personId) ?? false;
const ofDepartment: Rule = (actor, subject) =>
  actor.departmentId !== null && actor.departmentId === subject.departmentId;
const offeredToDepartment: Rule = (actor, subject) =>
  ofSection(actor, subject) || (subject.offered === true && ofDepartment(actor, subject));
const self: Rule = (actor, subject) => subject.studentId === actor.personId;

/**
 * Every action and, for each role that may do it at all, on which rows.
 * A role that is not named may not; a row of another school is refused before a rule is asked.
 */
const RULES = {
  'school.read': { admin: anyone },
  'school.change': { admin: anyone },
  'person.list': { admin: anyone },
  'person.invite': { admin: anyone },
  'person.change': { admin: anyone },
  'term.list': { admin: anyone, teacher: anyone, head: anyone },
  'term.add': { admin: anyone, teacher: anyone },
  'term.change': { admin: anyone },
  'log.read': { admin: anyone },
  'section.create': { teacher: anyone },
  'section.list': { teacher: anyone, admin: anyone, head: anyone, aide: anyone },
  'section.read': { teacher: ofSection, admin: anyone, head: ofDepartment },
  'section.change': { teacher: ofSection, admin: anyone },
  'roster.read': { teacher: ofSection, admin: anyone },
  'roster.change': { teacher: ofSection, admin: anyone },
  'passphrase.reset': { teacher: ofSection, admin: anyone },
  'practical.create': { teacher: anyone },
  'practical.list': { teacher: anyone, head: anyone },
  'practical.read': { teacher: ofSection, head: ofDepartment },
  'practical.change': { teacher: ofSection },
  'practical.copy': { teacher: offeredToDepartment },
  'version.read': { teacher: offeredToDepartment, head: ofDepartment },
  'sitting.open': { teacher: ofSection },
  'sitting.list': { teacher: anyone, aide: anyone },
  'sitting.read': { teacher: ofSection, head: ofDepartment },
  'sitting.change': { teacher: ofSection },
  'sitting.publish': { teacher: ofSection },
  'sitting.move': { teacher: ofSection },
  'accommodation.list': { teacher: ofSection, head: ofDepartment },
  'accommodation.change': { teacher: ofSection },
  'accommodation.reason': { teacher: ofSection, head: ofDepartment },
  'round.read': { teacher: ofSection, aide: aideToday },
  'round.record': { teacher: ofSection, aide: aideToday },
  'round.finish': { teacher: ofSection },
  'round.settle': { teacher: ofSection },
  'gradebook.read': { teacher: ofSection, head: ofDepartment },
  'grades.export': { teacher: ofSection, admin: anyone },
  'task.read': { student: self },
  'own.read': { student: self },
  'own.record': { student: self },
  'result.read': { student: self },
  'rubric.compare': { head: ofDepartment },
  'rubric.approve': { head: ofDepartment },
} as const satisfies Record<string, Partial<Record<Role, Rule>>>;

export type Action = keyof typeof RULES;

export const ACTIONS = Object.keys(RULES).filter((key): key is Action => key in RULES);

/** Whether the role may do this at all; asked before any row is loaded. */
export function mayEver(role: Role, action: Action): boolean {
  return role in RULES[action];
}

/** Whether this actor may do this to this row. Denies by default. */
export function may(actor: Actor, action: Action, subject: Subject): boolean {
  if (actor.mustChangePassword || subject.schoolId !== actor.schoolId) return false;
  const rules: Partial<Record<Role, Rule>> = RULES[action];
  return rules[actor.role]?.(actor, subject) ?? false;
}
