import type { Metadata } from 'next';
import { pageActor } from '@/lib/transport/page';
import { Bench } from '../../_components/bench';

export const metadata: Metadata = { title: 'bench' };

/** The round itself comes by a route of its own, so that this page holds nothing of any student. */
export default async function RoundPage({ params }: PageProps<'/round/[sittingId]'>) {
  const [{ personId }, { sittingId }] = [await pageActor(), await params];
  return <Bench personId={personId} round={{ sittingId }} />;
}
