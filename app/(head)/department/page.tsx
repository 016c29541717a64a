import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { listRubrics } from '@/lib/data/department/list-rubrics';
import { pageValue } from '@/lib/transport/page';
import { RubricGroup } from './_components/rubric-group';

export const metadata: Metadata = { title: 'Department' };

const count = (of: number, one: string) => `${of} ${one}${of === 1 ? '' : 's'}`;

export default async function DepartmentPage() {
  const { groups } = pageValue(await listRubrics(await actorInRole('head'), {}));
  const rubrics = groups.flatMap((group) => group.rubrics);
  const sittings = rubrics.reduce((sum, rubric) => sum + rubric.sittings, 0);
  const teachers = new Set(rubrics.map(({ ownerName }) => ownerName)).size;
  return (
    <DeskPage
      title="Rubrics in use"
      note={
        rubrics.length > 0
          ? 'Rubrics of one cut list stand together and can be laid side by side.'
          : undefined
      }
      titleBlock={[
        { label: 'practicals', value: groups.length },
        { label: 'rubrics', value: rubrics.length },
        { label: 'teachers', value: teachers },
        { label: 'sittings', value: sittings },
      ]}
    >
      {groups.length === 0 ? (
        <EmptyState title="Nothing is published yet">
          As soon as a teacher of your department publishes a practical, its rubric stands here. Two rubrics
          of one cut list can then be compared, price by price.
        </EmptyState>
      ) : (
        <ul className="grid gap-8">
          {groups.map((group) => (
            <li key={group.rubrics[0]?.versionId}>
              <RubricGroup
                group={group}
                about={`${count(group.lines, 'line')}, ${count(group.pieces, 'piece')}, ${
                  group.unit === 'in' ? 'inches' : 'millimetres'
                }`}
              />
            </li>
          ))}
        </ul>
      )}
    </DeskPage>
  );
}
