import 'server-only';
import { selectPeople } from '@/db/queries/people';
import { listPeopleInput } from '@/lib/contracts/school';
import { defineVerb } from '../verb';
import { type PersonView, viewPerson } from './person-view';

export const PEOPLE_A_PAGE = 50;

export interface PeopleView {
  people: PersonView[];
  total: number;
  page: number;
  pageCount: number;
}

/** People of the school by name, a page at a time: staff, students or those who left. Looking is logged. */
export const listPeople = defineVerb({
  action: 'person.list',
  input: listPeopleInput,
  async run({ actor, input, tx, authorize, log }): Promise<PeopleView> {
    authorize({ schoolId: actor.schoolId });
    const { shown, search, page } = input;
    const { rows, total } = await selectPeople(
      tx,
      actor.schoolId,
      { shown, search },
      { page, pageSize: PEOPLE_A_PAGE },
    );
    await log({ subjectKind: 'people', details: { shown, search, page } });
    return {
      people: rows.map((row) => viewPerson(row, actor.personId)),
      total,
      page,
      pageCount: Math.max(1, Math.ceil(total / PEOPLE_A_PAGE)),
    };
  },
});
