import { and, asc, desc, eq, gte, lte, ne, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { sections, terms } from '@/db/schema';

export function selectTerms(tx: Transaction, schoolId: string) {
  return tx
    .select({
      termId: terms.id,
      name: terms.name,
      startsOn: terms.startsOn,
      endsOn: terms.endsOn,
      sectionCount: sql<number>`(
        select count(*)::int from ${sections} held
        where held.school_id = terms.school_id and held.term_id = terms.id and held.archived_at is null)`,
    })
    .from(terms)
    .where(eq(terms.schoolId, schoolId))
    .orderBy(desc(terms.startsOn), asc(terms.name));
}

export async function selectTerm(tx: Transaction, schoolId: string, termId: string) {
  const [row] = await tx
    .select({ schoolId: terms.schoolId, termId: terms.id, name: terms.name })
    .from(terms)
    .where(and(eq(terms.schoolId, schoolId), eq(terms.id, termId)));
  return row;
}

/** The term that a day lies in; of several the one that began last. */
export async function selectTermOn(tx: Transaction, schoolId: string, day: string) {
  const [row] = await tx
    .select({ termId: terms.id, name: terms.name, startsOn: terms.startsOn, endsOn: terms.endsOn })
    .from(terms)
    .where(and(eq(terms.schoolId, schoolId), lte(terms.startsOn, day), gte(terms.endsOn, day)))
    .orderBy(desc(terms.startsOn))
    .limit(1);
  return row;
}

/** Whether another term of the school has this name, in any case. */
export async function isTermNameTaken(
  tx: Transaction,
  schoolId: string,
  name: string,
  exceptId: string | null,
): Promise<boolean> {
  const [row] = await tx
    .select({ id: terms.id })
    .from(terms)
    .where(
      and(
        eq(terms.schoolId, schoolId),
        sql`lower(${terms.name}) = lower(${name})`,
        exceptId === null ? undefined : ne(terms.id, exceptId),
      ),
    );
  return row !== undefined;
}

export async function insertTerm(tx: Transaction, row: typeof terms.$inferInsert): Promise<string> {
  const [made] = await tx.insert(terms).values(row).returning({ id: terms.id });
  if (!made) throw new Error('The database kept no term.');
  return made.id;
}

export async function updateTerm(
  tx: Transaction,
  schoolId: string,
  termId: string,
  values: { name: string; startsOn: string; endsOn: string },
): Promise<void> {
  await tx
    .update(terms)
    .set(values)
    .where(and(eq(terms.schoolId, schoolId), eq(terms.id, termId)));
}
