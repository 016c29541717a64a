import type { Metadata } from 'next';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { pageActor, pageValue } from '@/lib/transport/page';
import { Gradebook } from './_components/gradebook';

export const metadata: Metadata = { title: 'Gradebook' };

export default async function SectionGradebookPage({ params }: PageProps<'/gradebook/[sectionId]'>) {
  const { sectionId } = await params;
  const first = pageValue(await readGradebook(await pageActor(), { sectionId }));
  return <Gradebook key={sectionId} first={first} />;
}
