import 'server-only';
import { selectRoster } from '@/db/queries/rosters';
import { selectSection } from '@/db/queries/sections';
import { sectionInput } from '@/lib/contracts/sections';
import { defineVerb } from '../verb';
import { asSectionView, type SectionView, sectionSubject } from './section-view';

export interface RosterStudentView {
  studentId: string;
  localId: string | null;
  familyName: string;
  givenName: string;
  joinedOn: string;
  leftOn: string | null;
  /** False once they have left the section. */
  here: boolean;
  /** `none`: cannot sign in yet; `first`: has words that were handed out; `own`: has chosen own ones. */
  passphrase: 'none' | 'first' | 'own';
  /** Also works in the school, so that their password is no teacher's matter. */
  isStaff: boolean;
}

export interface RosterView extends SectionView {
  today: string;
  students: RosterStudentView[];
}

/** A section with everybody who is or was in it. */
export const readSectionRoster = defineVerb({
  action: 'roster.read',
  input: sectionInput,
  async run({ actor, input, tx, authorize, found, logView }): Promise<RosterView> {
    const section = found(await selectSection(tx, actor.schoolId, input.sectionId));
    authorize(sectionSubject(section));
    const rows = await selectRoster(tx, actor.schoolId, input.sectionId);
    await logView({
      subjectKind: 'section',
      subjectId: input.sectionId,
      details: { students: rows.length },
    });
    return {
      ...asSectionView(section),
      today: section.today,
      students: rows.map(({ mustChange, leftSchool, here, ...row }) => ({
        ...row,
        here: here && !leftSchool,
        passphrase: mustChange === null ? 'none' : mustChange ? 'first' : 'own',
      })),
    };
  },
});
