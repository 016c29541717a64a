import { LinkButton } from '@/components/ui/link-button';
import type { RoundRow } from '@/lib/data/rounds/list-rounds';

/** One row a sitting, by period, with how far it has come. */
export function RoundList({ rounds }: { rounds: readonly RoundRow[] }) {
  return (
    <ul>
      {rounds.map((round) => (
        <li
          key={round.sittingId}
          className="grid items-center gap-x-6 gap-y-2 border-b border-hair py-3 sm:grid-cols-[7rem_1fr_auto]"
        >
          <p className="text-heading">Period {round.period}</p>
          <div className="min-w-0">
            <h2 className="font-title text-verdict">{round.title}</h2>
            <p className="text-label text-ink-2">
              {round.sectionName}, version {round.versionNumber}, {progress(round)}
            </p>
          </div>
          <LinkButton href={`/round/${round.sittingId}`} kind={round.published ? 'plain' : 'act'}>
            {round.begun + round.finished > 0 ? 'go on' : 'begin'}
            <span className="sr-only">
              , {round.title}, period {round.period}
            </span>
          </LinkButton>
        </li>
      ))}
    </ul>
  );
}

function progress({ students, finished, begun, absent, conflicts, published }: RoundRow): string {
  const parts = [
    students === 1 ? 'one student' : `${students} students`,
    finished > 0 ? `${finished} finished` : null,
    begun > 0 ? `${begun} begun` : null,
    absent > 0 ? `${absent} absent` : null,
    conflicts > 0
      ? conflicts === 1
        ? 'one cell with two readings'
        : `${conflicts} cells with two readings`
      : null,
    published ? 'published' : null,
  ];
  return parts.filter(Boolean).join(', ');
}
