import { and, asc, desc, eq, inArray, isNotNull, isNull, or, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import {
  people,
  practicals,
  rubricApprovals,
  rubricVersions,
  schools,
  sections,
  sittings,
  terms,
} from '@/db/schema';
import { schoolToday, teacherIds } from './sections';

/** A sitting with its section, its version and what permission depends on. */
export async function selectSitting(tx: Transaction, schoolId: string, sittingId: string) {
  const [row] = await tx
    .select({
      sittingId: sittings.id,
      schoolId: sittings.schoolId,
      sectionId: sittings.sectionId,
      practicalId: sittings.practicalId,
      rubricVersionId: sittings.rubricVersionId,
      state: sittings.state,
      dueOn: sittings.dueOn,
      openedAt: sittings.openedAt,
      sectionName: sections.name,
      period: sections.period,
      departmentId: sections.departmentId,
      termName: terms.name,
      timeZone: schools.timeZone,
      today: sql<string>`${schoolToday}::text`,
      title: practicals.title,
      versionNumber: rubricVersions.number,
      form: rubricVersions.form,
      rubric: rubricVersions.rubric,
      teacherIds,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(terms, and(eq(terms.schoolId, sections.schoolId), eq(terms.id, sections.termId)))
    .innerJoin(schools, eq(schools.id, sittings.schoolId))
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)));
  return row;
}

export type SittingRow = NonNullable<Awaited<ReturnType<typeof selectSitting>>>;

/** Two that publish the same sitting, or publish and change it, go one after the other. */
export async function lockSitting(tx: Transaction, schoolId: string, sittingId: string): Promise<void> {
  await tx
    .select({ id: sittings.id })
    .from(sittings)
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)))
    .for('update');
}

const isApproved = sql<boolean>`exists (select from ${rubricApprovals} approval
  where approval.school_id = ${rubricVersions.schoolId} and approval.rubric_version_id = ${rubricVersions.id}
    and approval.ended_at is null)`;

/**
 * Published versions that a person may give in a department: of own practicals and of those on offer, and the one that
 * stands approved as the department's, offered or not. A person's own first, the latest of each first.
 */
export function selectVersionsToGive(
  tx: Transaction,
  schoolId: string,
  { departmentId, personId }: { departmentId: string; personId: string },
) {
  const offered = and(isNull(practicals.archivedAt), isNotNull(practicals.offeredAt));
  const own = and(isNull(practicals.archivedAt), eq(practicals.ownerId, personId));
  return tx
    .select({
      versionId: rubricVersions.id,
      practicalId: practicals.id,
      title: practicals.title,
      number: rubricVersions.number,
      publishedAt: rubricVersions.publishedAt,
      approved: isApproved,
      own: sql<boolean>`${practicals.ownerId} = ${personId}`,
      ownerName: sql<string>`btrim(${people.givenName} || ' ' || ${people.familyName})`,
    })
    .from(rubricVersions)
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, rubricVersions.schoolId), eq(practicals.id, rubricVersions.practicalId)),
    )
    .innerJoin(people, and(eq(people.schoolId, practicals.schoolId), eq(people.id, practicals.ownerId)))
    .where(
      and(
        eq(rubricVersions.schoolId, schoolId),
        eq(practicals.departmentId, departmentId),
        or(own, offered, isApproved),
      ),
    )
    .orderBy(
      desc(sql`${practicals.ownerId} = ${personId}`),
      asc(sql`lower(${practicals.title})`),
      asc(practicals.id),
      desc(rubricVersions.number),
    );
}

/** The practicals that each of these sections already has. */
export function selectGivenPracticals(tx: Transaction, schoolId: string, sectionIds: readonly string[]) {
  return tx
    .select({ sectionId: sittings.sectionId, practicalId: sittings.practicalId, sittingId: sittings.id })
    .from(sittings)
    .where(and(eq(sittings.schoolId, schoolId), inArray(sittings.sectionId, [...sectionIds])));
}

export async function insertSitting(tx: Transaction, row: typeof sittings.$inferInsert): Promise<string> {
  const [made] = await tx.insert(sittings).values(row).returning({ id: sittings.id });
  if (!made) throw new Error('The database kept no sitting.');
  return made.id;
}

export async function updateSitting(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  values: { dueOn?: string | null; state?: 'open' | 'published' },
): Promise<void> {
  await tx
    .update(sittings)
    .set(values)
    .where(and(eq(sittings.schoolId, schoolId), eq(sittings.id, sittingId)));
}

/** The sittings of the sections that a person teaches, the open ones first, by period. */
export function selectSittingsOfTeacher(tx: Transaction, schoolId: string, personId: string) {
  return tx
    .select({
      sittingId: sittings.id,
      sectionId: sections.id,
      title: practicals.title,
      sectionName: sections.name,
      period: sections.period,
      versionNumber: rubricVersions.number,
      dueOn: sittings.dueOn,
      state: sittings.state,
      timeZone: schools.timeZone,
    })
    .from(sittings)
    .innerJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .innerJoin(schools, eq(schools.id, sittings.schoolId))
    .innerJoin(
      practicals,
      and(eq(practicals.schoolId, sittings.schoolId), eq(practicals.id, sittings.practicalId)),
    )
    .innerJoin(
      rubricVersions,
      and(eq(rubricVersions.schoolId, sittings.schoolId), eq(rubricVersions.id, sittings.rubricVersionId)),
    )
    .where(
      and(
        eq(sittings.schoolId, schoolId),
        isNull(sections.archivedAt),
        sql`${personId}::uuid = any(${teacherIds})`,
      ),
    )
    .orderBy(
      asc(sittings.state),
      sql`substring(${sections.period} from '^[0-9]+')::numeric nulls last`,
      asc(sections.period),
      asc(sections.name),
      desc(sittings.openedAt),
    );
}
