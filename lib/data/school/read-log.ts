import 'server-only';
import { selectLog, selectLogChoices } from '@/db/queries/log';
import { selectSchool } from '@/db/queries/school';
import type { Role } from '@/lib/auth/roles';
import { readLogInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';

export const ENTRIES_A_PAGE = 50;

export interface LogEntryView {
  id: string;
  at: string;
  action: string;
  actor: { name: string; role: Role | null } | null;
  about: { personId: string; name: string } | null;
  subjectKind: string;
  /** The practical, or the practical and period of a sitting; null for other subjects. */
  subjectName: string | null;
  details: unknown;
}

export interface LogView {
  timeZone: string;
  entries: LogEntryView[];
  total: number;
  page: number;
  pageCount: number;
  choices: { actions: string[]; people: { personId: string; name: string }[] };
}

/** The access log, the newest entries first, by day, action, who acted and whom it was about. */
export const readLog = defineVerb({
  action: 'log.read',
  input: readLogInput,
  async run({ actor, input, tx, authorize, found, log }): Promise<LogView> {
    const school = found(await selectSchool(tx, actor.schoolId));
    authorize({ schoolId: school.id });
    const { page, ...filter } = input;
    const { rows, total } = await selectLog(tx, school, filter, { page, pageSize: ENTRIES_A_PAGE });
    const { actions, who } = await selectLogChoices(tx, school.id);
    await log({ subjectKind: 'log', details: { ...filter, page } });
    return {
      timeZone: school.timeZone,
      entries: rows.map(
        ({
          id,
          at,
          action,
          actorRole,
          actorName,
          aboutPersonId,
          aboutName,
          subjectKind,
          subjectName,
          details,
        }) => ({
          id,
          at: at.toISOString(),
          action,
          actor: actorName === null ? null : { name: actorName, role: actorRole },
          about: aboutPersonId && aboutName !== null ? { personId: aboutPersonId, name: aboutName } : null,
          subjectKind,
          subjectName,
          details,
        }),
      ),
      total,
      page,
      pageCount: Math.max(1, Math.ceil(total / ENTRIES_A_PAGE)),
      choices: {
        actions,
        people: who.map(({ personId, givenName, familyName }) => ({
          personId,
          name: `${givenName} ${familyName}`.trim(),
        })),
      },
    };
  },
});
