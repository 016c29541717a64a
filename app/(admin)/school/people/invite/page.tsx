import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { listDepartments } from '@/lib/data/school/list-departments';
import { pageActor, pageValue } from '@/lib/transport/page';
import { InviteForm } from '../_components/invite-form';

export const metadata: Metadata = { title: 'Invite' };

export default async function InvitePage() {
  const departments = pageValue(await listDepartments(await pageActor(), {}));
  return (
    <DeskPage title="Invite" note="They get a link by mail and choose their own password.">
      <InviteForm departments={departments.map(({ departmentId, name }) => ({ departmentId, name }))} />
    </DeskPage>
  );
}
