import Link from 'next/link';
import { sayDayOf } from '@/components/ui/days';
import type { MoveChoices, VersionChoice } from '@/lib/contracts/moves';
import { VersionChanges } from './version-changes';

/** The version that is looked at, and what it changes of the one the sitting stands on. */
export function ChosenVersion({ choices, chosen }: { choices: MoveChoices; chosen: VersionChoice }) {
  const { sittingId, others, version, timeZone, unit } = choices;
  return (
    <section aria-label={`version ${chosen.number}`} className="border-b border-hair pb-4">
      <p className="mb-2 flex flex-wrap items-baseline gap-x-4">
        <span>
          from version {version.number} to <strong className="text-heading">version {chosen.number}</strong>
        </span>
        <span className="text-label text-ink-2">published {sayDayOf(chosen.publishedAt, timeZone)}</span>
        {others.length > 1 ? (
          <Link className="link text-label" href={`/sittings/${sittingId}/move`}>
            another version
          </Link>
        ) : null}
      </p>
      <VersionChanges choice={chosen} unit={unit} />
    </section>
  );
}
