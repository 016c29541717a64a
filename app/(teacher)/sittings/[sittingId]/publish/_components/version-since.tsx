import { Notice } from '@/components/ui/notice';
import type { Actor } from '@/lib/auth/actor';
import type { MoveChoices, VersionChoice } from '@/lib/contracts/moves';
import { previewMove } from '@/lib/data/sittings/preview-move';
import { readMoveChoices } from '@/lib/data/sittings/read-move-choices';
import { pageValue } from '@/lib/transport/page';
import { count } from '../../../../_components/names';

interface VersionSinceProps {
  actor: Actor;
  sittingId: string;
  /** The number of the latest publication and when it was; null before the first. */
  last: { number: number; publishedAt: string } | null;
}

/** Says when the version is another than that of the latest publication, and what that alone changes. */
export async function VersionSince({ actor, sittingId, last }: VersionSinceProps) {
  if (!last) return null;
  const choices = pageValue(await readMoveChoices(actor, { sittingId }));
  const moved = movedSince(choices, last.publishedAt);
  if (!moved) return null;
  const back = pageValue(await previewMove(actor, { sittingId, versionId: moved.told.versionId }));
  const changed = back.students.filter(({ told, change }) => told && change !== null && change !== 0).length;
  return (
    <Notice
      className="mb-8"
      title={`The version changed since publication ${last.number}: from ${moved.told.number} to ${choices.version.number}${moved.held ? ', nobody drops' : ''}.`}
    >
      {changed === 0
        ? 'By itself that changes no score that is out.'
        : `By itself that changes ${count(changed, 'score', 'scores')} of those that are out; whoever has one of them is told.`}
    </Notice>
  );
}

/** The version that the latest publication told, where another one stands now. */
function movedSince(
  { moves, others }: MoveChoices,
  publishedAt: string,
): { told: VersionChoice; held: boolean } | null {
  const since = moves.filter(({ undone, movedAt }) => undone === null && movedAt > publishedAt);
  const told = others.find(({ number }) => number === since.at(-1)?.from);
  return told ? { told, held: since.every(({ holdHarmless }) => holdHarmless) } : null;
}
