import type { Metadata } from 'next';
import { readTask } from '@/lib/data/own/read-task';
import { pageActor, pageValue } from '@/lib/transport/page';
import { Measuring } from './_components/measuring';

export const metadata: Metadata = { title: 'own readings' };

export default async function MeasurePage({ params }: PageProps<'/my/[sittingId]/measure'>) {
  const { sittingId } = await params;
  const view = pageValue(await readTask(await pageActor(), { sittingId }));
  return <Measuring task={view} />;
}
