import { describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { ACTIONS, type Action, may, mayEver, type Subject } from '@/lib/auth/policy';
import { ROLES, type Role } from '@/lib/auth/roles';

const ME = 'me';
const SCHOOL = 'our school';
const DEPARTMENT = 'our department';

const actorAs = (role: Role, more: Partial<Actor> = {}): Actor => ({
  personId: ME,
  schoolId: SCHOOL,
  role,
  roles: [role],
  departmentId: role === 'head' ? DEPARTMENT : null,
  givenName: 'Rut',
  familyName: 'Lindqvist',
  schoolName: 'Cedar Fork High School',
  mustChangePassword: false,
  ...more,
});

/** Whose a row can be, seen from the person who asks. */
const ROWS = {
  'nobody’s': { schoolId: SCHOOL },
  'my section’s': { schoolId: SCHOOL, teacherIds: ['another', ME], aideIds: [], studentId: 'another' },
  'a section’s that I aid today': {
    schoolId: SCHOOL,
    teacherIds: ['another'],
    aideIds: [ME],
    studentId: 'another',
  },
  'my department’s': {
    schoolId: SCHOOL,
    departmentId: DEPARTMENT,
    teacherIds: ['another'],
    studentId: 'another',
  },
  'offered to my department': {
    schoolId: SCHOOL,
    departmentId: DEPARTMENT,
    teacherIds: ['another'],
    offered: true,
  },
  'about me': { schoolId: SCHOOL, teacherIds: ['another'], studentId: ME },
  'another’s': {
    schoolId: SCHOOL,
    departmentId: 'another department',
    teacherIds: ['another'],
    aideIds: ['another'],
    studentId: 'another',
  },
} as const satisfies Record<string, Subject>;

type RowKind = keyof typeof ROWS;

const EVERY = Object.keys(ROWS) as RowKind[];
const SECTION: RowKind[] = ['my section’s'];
const AIDED: RowKind[] = ['a section’s that I aid today'];
const LED: RowKind[] = ['my department’s', 'offered to my department'];
const OWN: RowKind[] = ['about me'];

/** Which rows each role may do an action on; a role that is not named may do it on none. */
const ALLOWED: Record<Action, Partial<Record<Role, RowKind[]>>> = {
  'school.read': { admin: EVERY },
  'school.change': { admin: EVERY },
  'person.list': { admin: EVERY },
  'person.invite': { admin: EVERY },
  'person.change': { admin: EVERY },
  'term.list': { teacher: EVERY, head: EVERY, admin: EVERY },
  'term.add': { teacher: EVERY, admin: EVERY },
  'term.change': { admin: EVERY },
  'log.read': { admin: EVERY },
  'section.create': { teacher: EVERY },
  'section.list': { teacher: EVERY, head: EVERY, aide: EVERY, admin: EVERY },
  'section.read': { teacher: SECTION, head: LED, admin: EVERY },
  'section.change': { teacher: SECTION, admin: EVERY },
  'roster.read': { teacher: SECTION, admin: EVERY },
  'roster.change': { teacher: SECTION, admin: EVERY },
  'passphrase.reset': { teacher: SECTION, admin: EVERY },
  'practical.create': { teacher: EVERY },
  'practical.list': { teacher: EVERY, head: EVERY },
  'practical.read': { teacher: SECTION, head: LED },
  'practical.change': { teacher: SECTION },
  'practical.copy': { teacher: SECTION },
  'version.read': { teacher: SECTION, head: LED },
  'sitting.open': { teacher: SECTION },
  'sitting.list': { teacher: EVERY, aide: EVERY },
  'sitting.read': { teacher: SECTION, head: LED },
  'sitting.change': { teacher: SECTION },
  'sitting.publish': { teacher: SECTION },
  'sitting.move': { teacher: SECTION },
  'accommodation.list': { teacher: SECTION, head: LED },
  'accommodation.change': { teacher: SECTION },
  'accommodation.reason': { teacher: SECTION, head: LED },
  'round.read': { teacher: SECTION, aide: AIDED },
  'round.record': { teacher: SECTION, aide: AIDED },
  'round.finish': { teacher: SECTION },
  'round.settle': { teacher: SECTION },
  'gradebook.read': { teacher: SECTION, head: LED },
  'grades.export': { teacher: SECTION, admin: EVERY },
  'task.read': { student: OWN },
  'own.read': { student: OWN },
  'own.record': { student: OWN },
  'result.read': { student: OWN },
  'rubric.compare': { head: LED },
  'rubric.approve': { head: LED },
};

const CASES = ACTIONS.flatMap((action) =>
  ROLES.flatMap((role) =>
    EVERY.map((rows) => ({ action, role, rows, allowed: ALLOWED[action]?.[role]?.includes(rows) ?? false })),
  ),
);

it('names every action that there is', () => {
  expect([...ACTIONS].sort()).toEqual(Object.keys(ALLOWED).sort());
});

describe('who may do what to whose rows', () => {
  it.each(CASES)('$role, $action, $rows: $allowed', ({ action, role, rows, allowed }) => {
    expect(may(actorAs(role), action, ROWS[rows])).toBe(allowed);
  });
});

describe('whatever the role and the action', () => {
  const pairs = ACTIONS.flatMap((action) => ROLES.map((role) => ({ action, role })));

  it.each(pairs)('$role, $action: nothing on rows of another school', ({ action, role }) => {
    for (const row of Object.values(ROWS)) {
      expect(may(actorAs(role), action, { ...row, schoolId: 'another school' })).toBe(false);
    }
  });

  it.each(pairs)('$role, $action: nothing before a handed-out passphrase is changed', ({ action, role }) => {
    for (const row of Object.values(ROWS)) {
      expect(may(actorAs(role, { mustChangePassword: true }), action, row)).toBe(false);
    }
  });

  it.each(pairs)(
    '$role, $action: asked before a row is loaded, agrees with what some row allows',
    ({ action, role }) => {
      const some = EVERY.some((rows) => may(actorAs(role), action, ROWS[rows]));
      expect(mayEver(role, action)).toBe(some);
    },
  );
});

it('gives a head without a department nothing of a row without one', () => {
  const head = actorAs('head', { departmentId: null });
  expect(may(head, 'section.read', { schoolId: SCHOOL, departmentId: null })).toBe(false);
  expect(may(head, 'rubric.compare', { schoolId: SCHOOL })).toBe(false);
});

it('asks for the role that is acted in, not for the others that are held', () => {
  const teacherAsAide = actorAs('aide', { roles: ['teacher', 'aide'] });
  expect(may(teacherAsAide, 'sitting.publish', ROWS['my section’s'])).toBe(false);
});

it('lets a teacher copy, but neither read nor change, what is the department’s', () => {
  const teacher = actorAs('teacher', { departmentId: DEPARTMENT });
  expect(may(teacher, 'practical.copy', ROWS['offered to my department'])).toBe(true);
  expect(may(teacher, 'version.read', ROWS['offered to my department'])).toBe(true);
  expect(may(teacher, 'practical.copy', ROWS['my department’s'])).toBe(false);
  expect(may(teacher, 'practical.read', ROWS['offered to my department'])).toBe(false);
  expect(may(teacher, 'practical.read', ROWS['my department’s'])).toBe(false);
  expect(may(teacher, 'practical.change', ROWS['my department’s'])).toBe(false);
  expect(may(teacher, 'practical.copy', ROWS['another’s'])).toBe(false);
});
