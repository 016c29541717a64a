import 'server-only';
import type { Actor } from '@/lib/auth/actor';
import type { MoveChoices, VersionChoice } from '@/lib/contracts/moves';
import { previewMove } from '@/lib/data/sittings/preview-move';
import type { PublicationPreview } from '@/lib/data/sittings/preview-publication';
import { readMoveChoices } from '@/lib/data/sittings/read-move-choices';
import { pageValue } from '@/lib/transport/page';

export interface VersionSince {
  /** The publication that told the version before. */
  publication: number;
  from: number;
  to: number;
  /** By moves that let nobody drop. */
  held: boolean;
  /** Scores that are out and that the version alone makes different. */
  changed: number;
}

/** What moving the sitting since its latest publication does to what that one told; null where it was not moved. */
export async function readVersionSince(
  actor: Actor,
  { sittingId, number, lastPublishedAt }: PublicationPreview,
): Promise<VersionSince | null> {
  if (lastPublishedAt === null) return null;
  const choices = pageValue(await readMoveChoices(actor, { sittingId }));
  const moved = movedSince(choices, lastPublishedAt);
  if (!moved) return null;
  const back = pageValue(await previewMove(actor, { sittingId, versionId: moved.told.versionId }));
  return {
    publication: number - 1,
    from: moved.told.number,
    to: choices.version.number,
    held: moved.held,
    changed: back.students.filter(({ told, change }) => told && change !== null && change !== 0).length,
  };
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
