import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { listDepartments } from '@/lib/data/school/list-departments';
import { pageActor, pageValue } from '@/lib/transport/page';
import { DepartmentForm } from '../../_components/department-form';

export const metadata: Metadata = { title: 'Rename a department' };

export default async function DepartmentPage({ params }: { params: Promise<{ departmentId: string }> }) {
  const { departmentId } = await params;
  const departments = pageValue(await listDepartments(await pageActor(), {}));
  const department = departments.find((each) => each.departmentId === departmentId);
  if (!department) notFound();
  return (
    <DeskPage
      title={department.name}
      actions={<LinkButton href="/school/departments">all departments</LinkButton>}
    >
      <DepartmentForm department={{ departmentId, name: department.name }} />
    </DeskPage>
  );
}
