import type { Metadata } from 'next';
import { OtherUnitProvider } from '@/components/other-unit/other-unit';
import { readOtherUnit } from '@/components/other-unit/read-other-unit';
import { readTask } from '@/lib/data/own/read-task';
import { pageActor, pageValue } from '@/lib/transport/page';
import { Measuring } from './_components/measuring';

export const metadata: Metadata = { title: 'own readings' };

export default async function MeasurePage({ params }: PageProps<'/my/[sittingId]/measure'>) {
  const { sittingId } = await params;
  const view = pageValue(await readTask(await pageActor(), { sittingId }));
  return (
    <OtherUnitProvider isOn={await readOtherUnit()}>
      <Measuring task={view} />
    </OtherUnitProvider>
  );
}
