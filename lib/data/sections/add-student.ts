import 'server-only';
import { lockRosters } from '@/db/queries/rosters';
import { selectSection } from '@/db/queries/sections';
import { addStudentInput } from '@/lib/contracts/sections';
import { idProblems } from '@/lib/csv/read-roster';
import { tidyName } from '@/lib/csv/split-name';
import { defineVerb } from '../verb';
import type { JudgedLine } from './judge-roster';
import { planImport } from './plan-import';
import { judgeLines } from './roster-preview';
import { sectionSubject } from './section-view';
import { writeRoster } from './write-roster';

export interface AddedStudentView {
  familyName: string;
  givenName: string;
  localId: string;
}

/** One student into the section: somebody new, or by the ID somebody whom the school has. */
export const addStudent = defineVerb({
  action: 'roster.change',
  input: addStudentInput,
  async run({ actor, input, tx, authorize, found, refuse, refuseFields, log }): Promise<AddedStudentView> {
    const localId = tidyName(input.localId);
    const name = { familyName: tidyName(input.familyName), givenName: tidyName(input.givenName) };
    await lockRosters(tx, actor.schoolId);
    const section = found(await selectSection(tx, actor.schoolId, input.sectionId));
    authorize(sectionSubject(section));
    const problems = idProblems(localId);
    if (problems.length > 0) refuseFields({ localId: problems });
    if (/\p{Cc}|\p{Cs}/u.test(name.familyName + name.givenName)) {
      refuseFields({ familyName: ['The name has a character that cannot be seen. Type it again.'] });
    }
    const [line] = await judgeLines(tx, actor, section, [{ line: 1, localId, ...name, problems: [] }]);
    if (!line) return refuse('conflict', 'Nothing was added. Try again.');
    const why = refusal(line);
    if (why) refuseFields(why);
    const planned = planImport([line], {}, false);
    if (!planned.ok) return refuseFields({ localId: ['Check the ID.'] });
    const [made] = await writeRoster(tx, section, planned.plan);
    const known = planned.plan.enrolled[0];
    const studentId = made?.personId ?? known?.personId ?? null;
    await log({
      subjectKind: 'section',
      subjectId: section.sectionId,
      aboutPersonId: studentId,
      details: { added: true },
    });
    return { ...name, localId: made?.localId ?? known?.localId ?? localId };
  },
});

function refusal({ verdict, localId }: JudgedLine): Record<string, string[]> | null {
  switch (verdict.kind) {
    case 'problem':
      return { localId: verdict.problems };
    case 'unchanged':
      return { familyName: ['This student is on the roster already.'] };
    case 'name-conflict': {
      const { familyName, givenName, mine } = verdict.person;
      // The ID alone does not tell who a student of another teacher is.
      if (!mine) {
        return {
          localId: [
            `The ID ${localId} belongs to a student of another name. Check both against the school’s list.`,
          ],
        };
      }
      return {
        localId: [
          `The ID ${localId} belongs to ${familyName}, ${givenName}. If that is who you mean, type the name so; otherwise check the ID.`,
        ],
      };
    }
    case 'id-conflict':
      return {
        localId: [
          `The roster has this name under ${verdict.person.localId ?? 'no ID'}. For another student of the same name, or a new ID, import the roster as CSV: it asks which.`,
        ],
      };
    default:
      return null;
  }
}
