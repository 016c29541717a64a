import type { AccommodationRow } from '@/db/queries/accommodation-lists';
import type { Subject } from '@/lib/auth/policy';
import { modificationSchema } from '@/lib/scoring/modification-schema';
import { sayModification } from '@/lib/scoring/modification-words';
import { rubricSchema } from '@/lib/scoring/schemas';

/** A modified rubric as its list shows it; never with its reason. */
export interface AccommodationView {
  accommodationId: string;
  studentId: string;
  familyName: string;
  givenName: string;
  /** The practical it is for; null: for every sitting of the term that has none of its own. */
  sittingTitle: string | null;
  termName: string;
  /** What is modified, a phrase for each thing. */
  words: string[];
  madeBy: string;
  madeAt: string;
  ended: { by: string; at: string } | null;
}

export function asAccommodationView(row: AccommodationRow): AccommodationView {
  const { accommodationId, studentId, familyName, givenName, sittingTitle, termName, madeBy } = row;
  const lines = row.rubric === null ? [] : rubricSchema.parse(row.rubric).lines;
  return {
    accommodationId,
    studentId,
    familyName,
    givenName,
    sittingTitle,
    termName,
    words: sayModification(
      modificationSchema.parse(row.modification),
      lines.map(({ id, label }) => ({ lineId: id, label })),
    ),
    madeBy,
    madeAt: row.madeAt.toISOString(),
    ended: row.endedAt ? { by: row.endedBy ?? '', at: row.endedAt.toISOString() } : null,
  };
}

/** A modified rubric as the policy asks for it: its teachers are those of the sections it is at home in. */
export function accommodationSubject({
  schoolId,
  departmentId,
  teacherIds,
  studentId,
}: AccommodationRow): Subject {
  return { schoolId, departmentId, teacherIds, studentId };
}
