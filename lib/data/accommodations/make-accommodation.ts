import 'server-only';
import type { Transaction } from '@/db/client';
import {
  endStanding,
  insertAccommodation,
  lockConcerned,
  lockStanding,
  selectSectionSittings,
} from '@/db/queries/accommodation-lists';
import { selectRoster } from '@/db/queries/rosters';
import { type SectionRow, selectSection } from '@/db/queries/sections';
import { makeAccommodationInput } from '@/lib/contracts/accommodations';
import { modifiesNothing } from '@/lib/scoring/modification-schema';
import { rubricSchema } from '@/lib/scoring/schemas';
import { rebuildSheets } from '../rounds/rebuild-sheets';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { whyNotForSitting, whyNotForTerm } from './judge-modification';

/**
 * Modifies the rubric for one student, for the term or for one sitting; the one it replaces ends with it. Sheets
 * follow in the same transaction, results that are out do not.
 */
export const makeAccommodation = defineVerb({
  action: 'accommodation.change',
  input: makeAccommodationInput,
  async run({ actor, input, tx, authorize, found, refuse, refuseFields, log }) {
    const { schoolId, personId } = actor;
    const { sectionId, studentId, sittingId, replaces, modification, reason } = input;
    const section = found(await selectSection(tx, schoolId, sectionId));
    authorize(sectionSubject(section));
    if (!(await isHere(tx, section, studentId))) {
      refuseFields({ studentId: ['This student is not in the section today.'] });
    }
    if (modifiesNothing(modification)) refuseFields({ modification: ['Nothing is modified yet.'] });
    const rubric = sittingId === null ? null : found(await readRubric(tx, section, sittingId));
    const why = rubric ? whyNotForSitting(modification, rubric) : whyNotForTerm(modification);
    if (why) refuseFields({ [`modification.${why.field}`]: [why.message] });

    const scope = { studentId, departmentId: section.departmentId, termId: section.termId, sittingId };
    const standing = await lockStanding(tx, schoolId, scope);
    if (standing?.accommodationId !== (replaces ?? undefined))
      refuse('conflict', STANDING[replaces ? 'gone' : 'there']);
    if (standing) await endStanding(tx, schoolId, standing.accommodationId, personId);
    const accommodationId = await insertAccommodation(
      tx,
      { schoolId, ...scope, modification, madeBy: personId },
      reason,
    );
    await rebuildSheets(tx, schoolId, await lockConcerned(tx, schoolId, scope));
    await log({
      subjectKind: 'accommodation',
      subjectId: accommodationId,
      aboutPersonId: studentId,
      details: { modifiedRubric: standing ? 'changed' : 'made' },
    });
    return { accommodationId };
  },
});

const STANDING = {
  there: 'This student has a modified rubric for this already. Change that one; nothing you typed is lost.',
  gone: 'The one you are changing has been ended or changed meanwhile. Look at the list again; nothing you typed is lost.',
};

async function isHere(
  tx: Transaction,
  { schoolId, sectionId }: SectionRow,
  studentId: string,
): Promise<boolean> {
  const roster = await selectRoster(tx, schoolId, sectionId);
  return roster.some((row) => row.studentId === studentId && row.here && !row.leftSchool);
}

async function readRubric(tx: Transaction, { schoolId, sectionId }: SectionRow, sittingId: string) {
  const rows = await selectSectionSittings(tx, schoolId, sectionId);
  const row = rows.find((each) => each.sittingId === sittingId);
  return row && rubricSchema.parse(row.rubric);
}
