import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { ROLE_NAMES } from '@/lib/auth/roles';
import type { PersonView } from '@/lib/data/school/person-view';
import { STATE_WORDS } from './state-words';

export function PeopleTable({ people, students }: { people: PersonView[]; students: boolean }) {
  return (
    <Table caption="people of the school, by name">
      <TableHead>
        <tr>
          <HeadCell>name</HeadCell>
          {students ? <HeadCell>ID</HeadCell> : <HeadCell className="max-sm:hidden">email</HeadCell>}
          {students ? null : <HeadCell>roles</HeadCell>}
          {students ? null : <HeadCell className="max-md:hidden">department</HeadCell>}
          <HeadCell>
            <span className="sr-only">state</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody fives>
        {people.map((person) => (
          <tr key={person.personId}>
            <RowHead className="whitespace-nowrap">
              <Link className="link" href={`/school/people/${person.personId}`}>
                {nameOf(person)}
              </Link>
              {person.isSelf ? <span className="ml-2 text-label font-[480] text-ink-2">you</span> : null}
            </RowHead>
            <Cell className={students ? undefined : 'max-sm:hidden'}>
              {students ? person.localId : (person.email ?? person.localId)}
            </Cell>
            {students ? null : <Cell>{person.roles.map((role) => ROLE_NAMES[role]).join(', ')}</Cell>}
            {students ? null : <Cell className="max-md:hidden">{person.department?.name}</Cell>}
            <Cell className="text-label text-ink-2">{STATE_WORDS[person.state]}</Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}

function nameOf({ familyName, givenName }: PersonView): string {
  return [familyName, givenName].filter(Boolean).join(', ');
}
