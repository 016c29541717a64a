import type { Metadata } from 'next';
import Link from 'next/link';
import { DeskPage } from '@/components/shell/desk-page';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { EmptyState } from '@/components/ui/empty-state';
import { Heading } from '@/components/ui/titles';
import { listDepartments } from '@/lib/data/school/list-departments';
import { pageActor, pageValue } from '@/lib/transport/page';
import { DepartmentForm } from '../_components/department-form';

export const metadata: Metadata = { title: 'Departments' };

export default async function DepartmentsPage() {
  const departments = pageValue(await listDepartments(await pageActor(), {}));
  return (
    <DeskPage title="Departments">
      <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_20rem]">
        {departments.length === 0 ? (
          <EmptyState title="No departments yet">
            Practicals and sections belong to a department, and its head compares them. Add the first one.
          </EmptyState>
        ) : (
          <Table caption="departments of the school">
            <TableHead>
              <tr>
                <HeadCell>department</HeadCell>
                <HeadCell>head</HeadCell>
                <HeadCell align="right">sections</HeadCell>
                <HeadCell>
                  <span className="sr-only">rename</span>
                </HeadCell>
              </tr>
            </TableHead>
            <TableBody>
              {departments.map(({ departmentId, name, heads, sectionCount }) => (
                <tr key={departmentId}>
                  <RowHead>{name}</RowHead>
                  <Cell>
                    {heads.length > 0 ? (
                      heads.join(', ')
                    ) : (
                      <Link className="link" href="/school/people/invite">
                        invite one
                      </Link>
                    )}
                  </Cell>
                  <Cell align="right">{sectionCount}</Cell>
                  <Cell align="right">
                    <Link
                      className="link"
                      href={`/school/departments/${departmentId}`}
                      aria-label={`rename ${name}`}
                    >
                      rename
                    </Link>
                  </Cell>
                </tr>
              ))}
            </TableBody>
          </Table>
        )}
        <section>
          <Heading className="mb-4 border-b border-ink pb-1">add a department</Heading>
          <DepartmentForm />
        </section>
      </div>
    </DeskPage>
  );
}
