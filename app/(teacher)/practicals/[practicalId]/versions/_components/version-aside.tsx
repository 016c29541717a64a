import Link from 'next/link';
import { LocalTime } from '@/components/ui/local-time';
import { Heading } from '@/components/ui/titles';
import type { VersionSheet } from '@/lib/data/practicals/read-version-sheet';

const MOST_SHOWN = 8;

/** Who published the version and when, which sittings stand under it, and the way to the others. */
export function VersionAside({ view }: { view: VersionSheet }) {
  const { practicalId, number, numbers, ownSittings, sittings } = view;
  const others = numbers.filter((each) => each !== number).slice(0, MOST_SHOWN);
  return (
    <div className="grid content-start gap-8">
      <section aria-labelledby="published-heading">
        <Heading id="published-heading">Published</Heading>
        <p className="mt-1">
          <LocalTime at={view.publishedAt} style="day" /> by {view.publisherName}. It never changes.
        </p>
        {view.differenceReason ? (
          <p className="mt-2">
            Differs from the department’s: <q>{view.differenceReason}</q>
          </p>
        ) : null}
      </section>
      <section aria-labelledby="sittings-heading">
        <Heading id="sittings-heading">Sittings under it</Heading>
        {ownSittings.length > 0 ? (
          <ul className="mt-1 border-t border-hair">
            {ownSittings.map(({ sittingId, sectionName, period }) => (
              <li key={sittingId} className="border-b border-hair py-1.5">
                <Link className="link" href={`/sittings/${sittingId}`}>
                  {sectionName}, period {period}
                </Link>
              </li>
            ))}
          </ul>
        ) : null}
        <p className="mt-1 text-label text-ink-2">{sittingsText(sittings, ownSittings.length)}</p>
      </section>
      <section aria-labelledby="others-heading">
        <Heading id="others-heading">Versions</Heading>
        <ul className="mt-1 border-t border-hair">
          {others.map((each) => (
            <li key={each} className="border-b border-hair py-1.5">
              <Link className="link" href={`/practicals/${practicalId}/versions/${each}`}>
                version {each}
              </Link>
            </li>
          ))}
          <li className="py-1.5">
            <Link className="link" href={`/practicals/${practicalId}/versions`}>
              all versions
            </Link>
          </li>
        </ul>
      </section>
    </div>
  );
}

function sittingsText(all: number, own: number): string {
  if (all === 0) return 'None.';
  const others = all - own;
  if (others === 0) return own === 1 ? 'One, yours.' : `${own}, all yours.`;
  return own === 0 ? `${others} of colleagues.` : `${others} more of colleagues.`;
}
