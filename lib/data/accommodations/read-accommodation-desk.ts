import 'server-only';
import type { Transaction } from '@/db/client';
import {
  selectAccommodation,
  selectAccommodations,
  selectRecorded,
  selectSectionSittings,
} from '@/db/queries/accommodation-lists';
import { selectRoster } from '@/db/queries/rosters';
import { selectSection } from '@/db/queries/sections';
import { accommodationDeskInput } from '@/lib/contracts/accommodations';
import { type Attempt, projectAttempt, type Rubric } from '@/lib/scoring';
import type { Modification } from '@/lib/scoring/modification';
import { modificationSchema } from '@/lib/scoring/modification-schema';
import { rubricSchema } from '@/lib/scoring/schemas';
import { storedAttempt } from '../pricing/stored-attempt';
import { asSectionView, type SectionView, sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { accommodationSubject } from './accommodation-view';

export interface DeskSitting {
  sittingId: string;
  title: string;
  versionNumber: number;
  /** The sitting's own rubric, as everybody else is priced by it. */
  rubric: Rubric;
  /** What the bench has recorded of the chosen student, by attempt. */
  attempts: { attemptNumber: number; recorded: Attempt }[];
}

export interface AccommodationDeskView extends SectionView {
  students: { studentId: string; familyName: string; givenName: string }[];
  chosen: string | null;
  sittings: DeskSitting[];
  /** What stands for the chosen student in this section already, by its sitting; null: for the term. */
  standing: { accommodationId: string; sittingId: string | null }[];
  /** The one that is to be replaced; its student and its scope stay. */
  change: { accommodationId: string; sittingId: string | null; modification: Modification } | null;
}

/** All that is needed to modify the rubric for a student of a section and to see at once what it does. */
export const readAccommodationDesk = defineVerb({
  action: 'accommodation.change',
  input: accommodationDeskInput,
  async run({ actor, input, tx, authorize, found, logView }): Promise<AccommodationDeskView> {
    const { schoolId } = actor;
    const { sectionId } = input;
    const section = found(await selectSection(tx, schoolId, sectionId));
    authorize(sectionSubject(section));
    const change =
      input.change === null ? null : found(await selectAccommodation(tx, schoolId, input.change));
    if (change) {
      authorize(accommodationSubject(change));
      found(change.endedAt === null && change.sectionIds.includes(sectionId) ? change : null);
    }
    const roster = await selectRoster(tx, schoolId, sectionId);
    const students = roster.filter(({ here, leftSchool }) => here && !leftSchool);
    const wanted = change?.studentId ?? input.studentId;
    const chosen = students.find(({ studentId }) => studentId === wanted)?.studentId ?? null;
    if (chosen) {
      const look = { subjectKind: 'person', subjectId: chosen, aboutPersonId: chosen };
      await logView(look, 'accommodation.list');
    }
    return {
      ...asSectionView(section),
      students: students.map(({ studentId, familyName, givenName }) => ({
        studentId,
        familyName,
        givenName,
      })),
      chosen,
      sittings: await readSittings(tx, schoolId, sectionId, chosen),
      standing: (await selectAccommodations(tx, schoolId, { departmentId: section.departmentId, sectionId }))
        .filter(({ studentId, endedAt }) => studentId === chosen && endedAt === null)
        .map(({ accommodationId, sittingId }) => ({ accommodationId, sittingId })),
      change: change && {
        accommodationId: change.accommodationId,
        sittingId: change.sittingId,
        modification: modificationSchema.parse(change.modification),
      },
    };
  },
});

async function readSittings(
  tx: Transaction,
  schoolId: string,
  sectionId: string,
  studentId: string | null,
): Promise<DeskSitting[]> {
  const rows = await selectSectionSittings(tx, schoolId, sectionId);
  const sittingIds = rows.map(({ sittingId }) => sittingId);
  const recorded = studentId === null ? [] : await selectRecorded(tx, schoolId, { studentId, sittingIds });
  return rows.map(({ sittingId, title, versionNumber, ...row }) => {
    const rubric = rubricSchema.parse(row.rubric);
    const attempts = recorded
      .filter((each) => each.sittingId === sittingId)
      .map((each) => ({
        attemptNumber: each.number,
        recorded: projectAttempt(rubric, storedAttempt(each.recorded)).attempt,
      }));
    return { sittingId, title, versionNumber, rubric, attempts };
  });
}
