import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { readSchool } from '@/lib/data/school/read-school';
import { pageActor, pageValue } from '@/lib/transport/page';
import { SchoolForm } from '../_components/school-form';

export const metadata: Metadata = { title: 'Change the school' };

const zones = ['UTC', ...Intl.supportedValuesOf('timeZone').filter((zone) => zone !== 'UTC')];

export default async function SettingsPage() {
  const { name, timeZone, unit, code } = pageValue(await readSchool(await pageActor(), {}));
  return (
    <DeskPage
      title="Change the school"
      note="The code stays: it stands on your students’ slips."
      titleBlock={[{ label: 'code that students type', value: code, wide: true }]}
    >
      <SchoolForm school={{ name, timeZone, unit }} zones={zones} />
    </DeskPage>
  );
}
