import 'server-only';
import type { Transaction } from '@/db/client';
import { selectTeachersUnder } from '@/db/queries/versions';
import type { Subject } from '@/lib/auth/policy';
import { practicalSubject } from './practical-subject';

/** Who teaches a section whose sitting stands or stood under which version of a practical. */
export type TeachersUnder = Awaited<ReturnType<typeof selectTeachersUnder>>;

/** What permission to read one version depends on: besides its practical, whose sittings stand or stood under it. */
export function versionSubject(
  practical: Parameters<typeof practicalSubject>[0],
  versionId: string,
  under: TeachersUnder,
): Subject {
  const { teacherIds = [], ...subject } = practicalSubject(practical);
  const teachers = under.filter((each) => each.versionId === versionId).map(({ personId }) => personId);
  return { ...subject, teacherIds: [...teacherIds, ...teachers] };
}

/** The same, from the database. */
export async function loadVersionSubject(
  tx: Transaction,
  row: Parameters<typeof practicalSubject>[0] & { practicalId: string; versionId: string },
): Promise<Subject> {
  return versionSubject(row, row.versionId, await selectTeachersUnder(tx, row.schoolId, row.practicalId));
}
