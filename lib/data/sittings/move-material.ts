import 'server-only';
import type { Transaction } from '@/db/client';
import { type MoveHead, selectMoveHeads, selectToldNumbers } from '@/db/queries/move-heads';
import { type StandingMove, selectMoves, selectStandingMoves, selectStoodVersions } from '@/db/queries/moves';
import { type PublicationRow, selectPublications } from '@/db/queries/publications';
import type { SittingRow } from '@/db/queries/sittings';
import { type Rubric, rubricSchema } from '@/lib/scoring';
import { heldVersions } from '../pricing/held-versions';
import { loadAccommodations, openPriceBook } from '../pricing/load-pricing';
import type { Pricing } from '../pricing/pricing';
import { lateLocks } from './late-locks';

export interface ToldNumbers {
  scorePoints: number | null;
  bonusPoints: number;
}

/** What a move's preview is worked out from, without what was recorded. */
export interface MoveMaterial {
  heads: MoveHead[];
  /** By what an attempt is priced now, and by what after the move if nobody may drop. */
  now(attemptId: string): Pricing;
  after(attemptId: string): Pricing;
  /** Every rubric that the sitting stood under, the present one first. */
  stood: Rubric[];
  /** The sitting has been moved before, so that there may be readings that its version does not ask for. */
  movedBefore: boolean;
  moves: StandingMove[];
  latest: PublicationRow | null;
  told: ReadonlyMap<string, ToldNumbers>;
  /** Predictions that were locked late: they count only where the latest publication counted them. */
  late: ReadonlySet<string>;
}

/** Loads what moving the sitting to a version depends on. Those who left are in it only with something of theirs. */
export async function loadMoveMaterial(
  tx: Transaction,
  sitting: SittingRow,
  versionId: string,
): Promise<MoveMaterial> {
  const { schoolId, sittingId, rubricVersionId } = sitting;
  const [latest = null] = await selectPublications(tx, schoolId, [sittingId]);
  const numbers = latest ? await selectToldNumbers(tx, schoolId, latest.publicationId) : [];
  const told = new Map(numbers.map((row) => [row.attemptId, row]));
  const heads = (await selectMoveHeads(tx, schoolId, sittingId)).filter(
    (row) => row.here || row.versionId !== null || row.standing !== 'expected' || told.has(row.attemptId),
  );
  const moves = await selectStandingMoves(tx, schoolId, [sittingId]);
  const heldNow = heldVersions(rubricVersionId, moves);
  const next = { number: Number.MAX_SAFE_INTEGER, fromVersionId: rubricVersionId, holdHarmless: true };
  const heldAfter = heldVersions(versionId, [...moves, next]);
  const book = await openPriceBook(tx, schoolId, [rubricVersionId, versionId, ...heldNow, ...heldAfter]);
  const accommodations = await loadAccommodations(
    tx,
    schoolId,
    heads.map(({ attemptId }) => attemptId),
  );
  const pricingsOf = (id: string, held: string[]) => {
    const plain = book.pricing(id, held);
    return (attemptId: string) => {
      const accommodation = accommodations.get(attemptId);
      return accommodation ? book.pricing(id, held, accommodation) : plain;
    };
  };
  const stood = await selectStoodVersions(tx, schoolId, sittingId);
  return {
    heads,
    now: pricingsOf(rubricVersionId, heldNow),
    after: pricingsOf(versionId, heldAfter),
    stood: stood.map(({ rubric }) => rubricSchema.parse(rubric)),
    movedBefore: (await selectMoves(tx, schoolId, sittingId)).length > 0,
    moves,
    latest,
    told,
    late: heads.some(({ lockedAt }) => lockedAt !== null) ? await lateLocks(tx, sitting) : new Set(),
  };
}
