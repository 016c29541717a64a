import Link from 'next/link';
import type { SittingBehind } from '@/lib/data/practicals/read-practical';

/** The sittings that a newer version has left behind, each with the way to see what moving it would do. */
export function SittingsBehind({ sittings }: { sittings: readonly SittingBehind[] }) {
  if (sittings.length === 0) return null;
  return (
    <ul className="mt-2 text-label">
      {sittings.map(({ sittingId, sectionName, period, number }) => (
        <li key={sittingId}>
          <Link className="link inline-block py-1" href={`/sittings/${sittingId}/move`}>
            move {sectionName}, period {period}
          </Link>
          , which stands on version {number}
        </li>
      ))}
    </ul>
  );
}
