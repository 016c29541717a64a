import { aliasedTable, and, asc, count, desc, eq, gt, not, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { accessLog, people, practicals, sections, sittings } from '@/db/schema';

export interface LogFilter {
  /** First and last day, in the school's own time zone. */
  from?: string | undefined;
  to?: string | undefined;
  action?: string | undefined;
  actorId?: string | undefined;
  aboutPersonId?: string | undefined;
}

const actors = aliasedTable(people, 'log_actors');
const subjects = aliasedTable(people, 'log_subjects');

/** Whose rubric is modified is for the teacher and the head alone; that somebody's was stays in the log. */
const isUnnamed = sql`${accessLog.action} like 'accommodation.%'`;

function filtered(schoolId: string, timeZone: string, filter: LogFilter) {
  const { from, to, action, actorId, aboutPersonId } = filter;
  return and(
    eq(accessLog.schoolId, schoolId),
    from ? sql`${accessLog.at} >= ${from}::date::timestamp at time zone ${timeZone}` : undefined,
    to ? sql`${accessLog.at} < (${to}::date + 1)::timestamp at time zone ${timeZone}` : undefined,
    action ? eq(accessLog.action, action) : undefined,
    actorId ? eq(accessLog.actorId, actorId) : undefined,
    aboutPersonId ? and(eq(accessLog.aboutPersonId, aboutPersonId), not(isUnnamed)) : undefined,
  );
}

const given = aliasedTable(practicals, 'log_given');

/** The practical, or what a sitting gave and to which period. */
const subjectName = sql<string | null>`coalesce(
  ${practicals.title}, ${given.title} || ', period ' || ${sections.period})`;

/** Entries of the access log, the newest first, with the names of who acted, whom and what it was about. */
export async function selectLog(
  tx: Transaction,
  { id: schoolId, timeZone }: { id: string; timeZone: string },
  filter: LogFilter,
  { page, pageSize }: { page: number; pageSize: number },
) {
  const where = filtered(schoolId, timeZone, filter);
  const rows = await tx
    .select({
      id: accessLog.id,
      at: accessLog.at,
      action: accessLog.action,
      actorId: accessLog.actorId,
      actorRole: accessLog.actorRole,
      actorName: sql<string | null>`btrim(${actors.givenName} || ' ' || ${actors.familyName})`,
      aboutPersonId: subjects.id,
      aboutName: sql<string | null>`btrim(${subjects.givenName} || ' ' || ${subjects.familyName})`,
      subjectKind: accessLog.subjectKind,
      subjectName,
      details: accessLog.details,
    })
    .from(accessLog)
    .leftJoin(actors, and(eq(actors.schoolId, accessLog.schoolId), eq(actors.id, accessLog.actorId)))
    .leftJoin(
      subjects,
      and(
        eq(subjects.schoolId, accessLog.schoolId),
        eq(subjects.id, accessLog.aboutPersonId),
        not(isUnnamed),
      ),
    )
    .leftJoin(
      practicals,
      and(
        eq(practicals.schoolId, accessLog.schoolId),
        eq(accessLog.subjectKind, 'practical'),
        eq(practicals.id, accessLog.subjectId),
      ),
    )
    .leftJoin(
      sittings,
      and(
        eq(sittings.schoolId, accessLog.schoolId),
        eq(accessLog.subjectKind, 'sitting'),
        eq(sittings.id, accessLog.subjectId),
      ),
    )
    .leftJoin(given, and(eq(given.schoolId, sittings.schoolId), eq(given.id, sittings.practicalId)))
    .leftJoin(sections, and(eq(sections.schoolId, sittings.schoolId), eq(sections.id, sittings.sectionId)))
    .where(where)
    .orderBy(desc(accessLog.at), desc(accessLog.id))
    .limit(pageSize)
    .offset((page - 1) * pageSize);
  const [total] = await tx.select({ found: count() }).from(accessLog).where(where);
  return { rows, total: total?.found ?? 0 };
}

/** The actions and the people that occur in the log, to choose from. */
export async function selectLogChoices(tx: Transaction, schoolId: string) {
  const ofSchool = eq(accessLog.schoolId, schoolId);
  const actions = await tx
    .selectDistinct({ action: accessLog.action })
    .from(accessLog)
    .where(ofSchool)
    .orderBy(asc(accessLog.action));
  const who = await tx
    .selectDistinct({ personId: people.id, givenName: people.givenName, familyName: people.familyName })
    .from(accessLog)
    .innerJoin(people, and(eq(people.schoolId, accessLog.schoolId), eq(people.id, accessLog.actorId)))
    .where(ofSchool)
    .orderBy(asc(people.familyName), asc(people.givenName));
  return { actions: actions.map(({ action }) => action), who };
}

/** Whether the person's look at this subject was logged within the hour. */
export async function wasViewLogged(
  tx: Transaction,
  schoolId: string,
  { actorId, action, subjectId }: { actorId: string; action: string; subjectId: string },
): Promise<boolean> {
  const rows = await tx
    .select({ id: accessLog.id })
    .from(accessLog)
    .where(
      and(
        eq(accessLog.schoolId, schoolId),
        gt(accessLog.at, sql`now() - interval '1 hour'`),
        eq(accessLog.actorId, actorId),
        eq(accessLog.action, action),
        eq(accessLog.subjectId, subjectId),
      ),
    )
    .limit(1);
  return rows.length > 0;
}
