import { bigint, timestamp, uuid } from 'drizzle-orm/pg-core';

/** The tenant of a row: part of every tenant table's primary key, so that tables can be partitioned by school. */
export const schoolId = () => uuid('school_id').notNull();

export const rowId = () => uuid('id').notNull().defaultRandom();

export const moment = (name: string) => timestamp(name, { withTimezone: true });

export const createdAt = () => moment('created_at').notNull().defaultNow();

/** A length in ticks of 0.1 nm; whole numbers up to 10 m are exact in a JS number. */
export const ticks = (name: string) => bigint(name, { mode: 'number' });
