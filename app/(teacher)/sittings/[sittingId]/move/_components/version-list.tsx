import { sayDayOf } from '@/components/ui/days';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Refusal } from '@/components/ui/refusal';
import { Heading } from '@/components/ui/titles';
import type { MoveChoices } from '@/lib/contracts/moves';
import { VersionChanges } from './version-changes';

interface VersionListProps {
  choices: MoveChoices;
  /** The address names a version that cannot be moved to. */
  unknown: boolean;
}

/** The practical's other versions, each with what it changes; or the next step where there is none. */
export function VersionList({ choices, unknown }: VersionListProps) {
  const { sittingId, others, version, timeZone, unit } = choices;
  return (
    <div className="grid gap-6">
      {unknown ? (
        <Refusal title="This address names no version to move to.">
          It is the one that this sitting stands on, or none of this practical. Nothing was changed
          {others.length > 0 ? '; choose one below.' : '.'}
        </Refusal>
      ) : null}
      {others.length === 0 ? (
        <EmptyState
          title={`Version ${version.number} is the only one`}
          action={<LinkButton href="/practicals">to the practicals</LinkButton>}
        >
          Edit the practical and publish the next version. Then you see here who would gain and who would
          drop, before anything moves.
        </EmptyState>
      ) : (
        <ol>
          {others.map((choice) => (
            <li
              key={choice.versionId}
              className="grid gap-x-8 gap-y-3 border-b border-hair py-5 first:pt-0 md:grid-cols-[10rem_minmax(0,1fr)_auto]"
            >
              <div>
                <Heading>version {choice.number}</Heading>
                <p className="text-label text-ink-2">published {sayDayOf(choice.publishedAt, timeZone)}</p>
              </div>
              <VersionChanges choice={choice} unit={unit} />
              <div>
                <LinkButton
                  href={`/sittings/${sittingId}/move?version=${choice.versionId}`}
                  aria-label={`who moves under version ${choice.number}`}
                >
                  who moves
                </LinkButton>
              </div>
            </li>
          ))}
        </ol>
      )}
    </div>
  );
}
