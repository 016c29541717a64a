import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  foreignKey,
  index,
  pgTable,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { ROLES } from '@/lib/auth/roles';
import { createdAt, moment, rowId, schoolId } from './columns';

export const schools = pgTable(
  'schools',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    code: text('code').notNull().unique(),
    name: text('name').notNull(),
    timeZone: text('time_zone').notNull(),
    unit: text('unit', { enum: ['in', 'mm'] }).notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    check('schools_code', sql`${t.code} ~ '^[a-z0-9][a-z0-9-]{2,31}$'`),
    check('schools_name', sql`length(btrim(${t.name})) between 1 and 120`),
    check('schools_unit', sql`${t.unit} in ('in', 'mm')`),
  ],
);

export const departments = pgTable(
  'departments',
  {
    schoolId: schoolId().references(() => schools.id),
    id: rowId(),
    name: text('name').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    uniqueIndex('departments_name').on(t.schoolId, sql`lower(${t.name})`),
    check('departments_name_length', sql`length(btrim(${t.name})) between 1 and 120`),
  ],
);

export const people = pgTable(
  'people',
  {
    schoolId: schoolId().references(() => schools.id),
    id: rowId(),
    familyName: text('family_name').notNull(),
    givenName: text('given_name').notNull(),
    email: text('email'),
    localId: text('local_id'),
    leftAt: moment('left_at'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    uniqueIndex('people_id').on(t.id),
    uniqueIndex('people_email').on(sql`lower(${t.email})`),
    uniqueIndex('people_local_id').on(t.schoolId, t.localId),
    check('people_known_by', sql`${t.email} is not null or ${t.localId} is not null`),
    check('people_local_id_text', sql`${t.localId} ~ '^[^[:cntrl:]]{1,40}$' and ${t.localId} !~ '^[-=+@]'`),
    check(
      'people_names',
      sql`length(${t.familyName}) between 0 and 80 and length(${t.givenName}) between 0 and 80 and length(btrim(${t.familyName} || ${t.givenName})) > 0`,
    ),
  ],
);

export const personRoles = pgTable(
  'person_roles',
  {
    schoolId: schoolId(),
    personId: uuid('person_id').notNull(),
    role: text('role', { enum: ROLES }).notNull(),
    departmentId: uuid('department_id'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.personId, t.role] }),
    foreignKey({ columns: [t.schoolId, t.personId], foreignColumns: [people.schoolId, people.id] }),
    foreignKey({
      columns: [t.schoolId, t.departmentId],
      foreignColumns: [departments.schoolId, departments.id],
    }),
    check('person_roles_role', sql`${t.role} in ('teacher', 'student', 'head', 'aide', 'admin')`),
    check('person_roles_head', sql`${t.role} <> 'head' or ${t.departmentId} is not null`),
  ],
);

export const credentials = pgTable(
  'credentials',
  {
    schoolId: schoolId(),
    personId: uuid('person_id').notNull(),
    passwordHash: text('password_hash').notNull(),
    mustChange: boolean('must_change').notNull(),
    changedAt: moment('changed_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.personId] }),
    foreignKey({ columns: [t.schoolId, t.personId], foreignColumns: [people.schoolId, people.id] }),
  ],
);

export const sessions = pgTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    schoolId: schoolId(),
    userId: uuid('user_id').notNull(),
    activeRole: text('active_role', { enum: ROLES }).notNull(),
    expiresAt: moment('expires_at').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({ columns: [t.schoolId, t.userId], foreignColumns: [people.schoolId, people.id] }),
    index('sessions_user').on(t.schoolId, t.userId),
  ],
);

/** Single-use links to one person; only the hash of the secret is kept. */
export const tokens = pgTable(
  'tokens',
  {
    schoolId: schoolId(),
    id: rowId(),
    personId: uuid('person_id').notNull(),
    kind: text('kind', { enum: ['invitation', 'reset'] }).notNull(),
    secretHash: text('secret_hash').notNull().unique(),
    expiresAt: moment('expires_at').notNull(),
    usedAt: moment('used_at'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.schoolId, t.id] }),
    foreignKey({ columns: [t.schoolId, t.personId], foreignColumns: [people.schoolId, people.id] }),
    check('tokens_kind', sql`${t.kind} in ('invitation', 'reset')`),
  ],
);

/** Links that make a school and its first admin; they stand before any school, so outside the tenants. */
export const setupTokens = pgTable('setup_tokens', {
  secretHash: text('secret_hash').primaryKey(),
  expiresAt: moment('expires_at').notNull(),
  usedAt: moment('used_at'),
  createdAt: createdAt(),
});
