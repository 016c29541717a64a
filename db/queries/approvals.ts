import { and, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Transaction } from '@/db/client';
import { people, practicals, rubricApprovals, rubricVersions } from '@/db/schema';

const owners = alias(people, 'owners');
const heads = alias(people, 'heads');
const nameOf = (person: typeof owners | typeof heads) =>
  sql<string>`btrim(${person.givenName} || ' ' || ${person.familyName})`;

/** The versions that stand approved as a department's, the latest approval first. */
export function selectStandingApprovals(tx: Transaction, schoolId: string, departmentId: string) {
  return tx
    .select({
      approvalId: rubricApprovals.id,
      practicalId: rubricApprovals.practicalId,
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      ownerId: practicals.ownerId,
      ownerName: nameOf(owners),
      approvedBy: nameOf(heads),
      approvedAt: rubricApprovals.approvedAt,
      task: rubricVersions.task,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
    })
    .from(rubricApprovals)
    .innerJoin(
      rubricVersions,
      and(
        eq(rubricVersions.schoolId, rubricApprovals.schoolId),
        eq(rubricVersions.id, rubricApprovals.rubricVersionId),
      ),
    )
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, rubricApprovals.schoolId), eq(practicals.id, rubricApprovals.practicalId)),
    )
    .innerJoin(owners, and(eq(owners.schoolId, practicals.schoolId), eq(owners.id, practicals.ownerId)))
    .innerJoin(
      heads,
      and(eq(heads.schoolId, rubricApprovals.schoolId), eq(heads.id, rubricApprovals.approvedBy)),
    )
    .where(
      and(
        eq(rubricApprovals.schoolId, schoolId),
        eq(practicals.departmentId, departmentId),
        isNull(rubricApprovals.endedAt),
      ),
    )
    .orderBy(desc(rubricApprovals.approvedAt), rubricApprovals.id);
}

export type StandingApproval = Awaited<ReturnType<typeof selectStandingApprovals>>[number];

export async function insertApproval(
  tx: Transaction,
  row: typeof rubricApprovals.$inferInsert,
): Promise<string> {
  const [made] = await tx.insert(rubricApprovals).values(row).returning({ id: rubricApprovals.id });
  if (!made) throw new Error('The database kept no approval.');
  return made.id;
}

/** Ends approvals that stand; those that have ended already stay as they are. */
export async function endApprovals(
  tx: Transaction,
  schoolId: string,
  approvalIds: readonly string[],
  endedBy: string,
): Promise<void> {
  if (approvalIds.length === 0) return;
  await tx
    .update(rubricApprovals)
    .set({ endedBy, endedAt: sql`now()` })
    .where(
      and(
        eq(rubricApprovals.schoolId, schoolId),
        inArray(rubricApprovals.id, [...approvalIds]),
        isNull(rubricApprovals.endedAt),
      ),
    );
}

/** The practical and those it was taken from, the nearest first. */
export async function selectOrigins(
  tx: Transaction,
  schoolId: string,
  practicalId: string,
): Promise<string[]> {
  const rows = await tx.execute<{ id: string }>(sql`
    with recursive origins as (
      select p.id, p.copied_from_version_id, 0 as steps from ${practicals} p
      where p.school_id = ${schoolId} and p.id = ${practicalId}
      union all
      select p.id, p.copied_from_version_id, o.steps + 1
      from origins o
      join ${rubricVersions} v on v.school_id = ${schoolId} and v.id = o.copied_from_version_id
      join ${practicals} p on p.school_id = ${schoolId} and p.id = v.practical_id)
    cycle id set is_again using path
    select id from origins where not is_again order by steps`);
  return rows.map(({ id }) => id);
}

/** The practical and everything that was taken from it, at first or second hand. */
export async function selectTakenFrom(
  tx: Transaction,
  schoolId: string,
  practicalId: string,
): Promise<Set<string>> {
  const rows = await tx.execute<{ id: string }>(sql`
    with recursive taken as (
      select ${practicalId}::uuid as id
      union
      select p.id
      from taken t
      join ${rubricVersions} v on v.school_id = ${schoolId} and v.practical_id = t.id
      join ${practicals} p on p.school_id = ${schoolId} and p.copied_from_version_id = v.id)
    select id from taken`);
  return new Set(rows.map(({ id }) => id));
}

/** An approval, standing or ended, with its version. */
export async function selectApproval(tx: Transaction, schoolId: string, approvalId: string) {
  const [row] = await tx
    .select({
      practicalId: rubricApprovals.practicalId,
      versionId: rubricVersions.id,
      number: rubricVersions.number,
      endedAt: rubricApprovals.endedAt,
    })
    .from(rubricApprovals)
    .innerJoin(
      rubricVersions,
      and(
        eq(rubricVersions.schoolId, rubricApprovals.schoolId),
        eq(rubricVersions.id, rubricApprovals.rubricVersionId),
      ),
    )
    .where(and(eq(rubricApprovals.schoolId, schoolId), eq(rubricApprovals.id, approvalId)));
  return row;
}
