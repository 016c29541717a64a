import type { Metadata } from 'next';
import Link from 'next/link';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { pageActor, pageValue } from '@/lib/transport/page';
import { Bench } from '../../../_components/bench';
import { practiceBundle } from './practice-bundle';

export const metadata: Metadata = { title: 'practice round' };

/** The bench on a made-up round: to try a practical before a class does, or to learn the bench. */
export default async function PracticePage({ params }: PageProps<'/practicals/[practicalId]/practice'>) {
  const { practicalId } = await params;
  const actor = await pageActor();
  const practical = pageValue(await readPractical(actor, { practicalId }));
  const bundle = practiceBundle(practical);
  if (!bundle) return <NotYet practicalId={practicalId} title={practical.title} />;
  return (
    <Bench personId={actor.personId} round={{ practice: bundle, leaveTo: `/practicals/${practicalId}` }} />
  );
}

function NotYet({ practicalId, title }: { practicalId: string; title: string }) {
  return (
    <main className="mx-auto max-w-2xl p-6">
      <h1 className="border-b-edge border-ink pb-2 font-title text-title">No practice round yet</h1>
      <p className="mt-4 text-lead">
        The draft of “{title}” cannot be read as it stands: a line, a size or a price is missing. Complete it,
        then come back.
      </p>
      <p className="mt-4">
        <Link href={`/practicals/${practicalId}`} className="link text-lead">
          back to the practical
        </Link>
      </p>
    </main>
  );
}
