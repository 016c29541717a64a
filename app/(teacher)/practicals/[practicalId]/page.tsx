import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { pageValue } from '@/lib/transport/page';
import { PracticalEditor } from './_components/practical-editor';

interface PracticalPageProps {
  params: Promise<{ practicalId: string }>;
}

export const metadata: Metadata = { title: 'Practical' };

export default async function PracticalPage({ params }: PracticalPageProps) {
  const { practicalId } = await params;
  const view = pageValue(await readPractical(await actorInRole('teacher'), { practicalId }));
  return <PracticalEditor key={practicalId} view={view} />;
}
