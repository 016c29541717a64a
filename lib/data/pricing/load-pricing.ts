import 'server-only';
import type { Transaction } from '@/db/client';
import { selectModifications, selectStandingAccommodations } from '@/db/queries/accommodations';
import { selectStandingMoves } from '@/db/queries/moves';
import { selectAttemptVersions, selectPricedVersions } from '@/db/queries/sheets';
import { rubricSchema } from '@/lib/scoring';
import type { Modification } from '@/lib/scoring/modification';
import { modificationSchema } from '@/lib/scoring/modification-schema';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { heldVersions } from './held-versions';
import { PriceBook, type Pricing, type PublishedVersion, type StandingAccommodation } from './pricing';

/**
 * By what each of the attempts is priced: the version its sitting stands under, the versions that its moves hold, and
 * the modified rubric that stands for the student. The one place that says so.
 */
export async function loadPricing(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
): Promise<Map<string, Pricing>> {
  if (attemptIds.length === 0) return new Map();
  const attempts = await selectAttemptVersions(tx, schoolId, attemptIds);
  const sittings = new Map(attempts.map(({ sittingId, rubricVersionId }) => [sittingId, rubricVersionId]));
  const moves = await selectStandingMoves(tx, schoolId, [...sittings.keys()]);
  const held = new Map(
    [...sittings].map(([sittingId, versionId]) => [
      sittingId,
      heldVersions(
        versionId,
        moves.filter((move) => move.sittingId === sittingId),
      ),
    ]),
  );
  const book = await openPriceBook(tx, schoolId, [...sittings.values(), ...[...held.values()].flat()]);
  const accommodations = await loadAccommodations(tx, schoolId, attemptIds);
  return new Map(
    attempts.map(({ attemptId, sittingId, rubricVersionId }) => [
      attemptId,
      book.pricing(rubricVersionId, held.get(sittingId) ?? [], accommodations.get(attemptId)),
    ]),
  );
}

/** A price book over these versions. */
export async function openPriceBook(
  tx: Transaction,
  schoolId: string,
  versionIds: readonly string[],
): Promise<PriceBook> {
  const rows = await selectPricedVersions(tx, schoolId, [...new Set(versionIds)]);
  return new PriceBook(rows.map(asPublished));
}

export function asPublished(row: {
  versionId: string;
  number: number;
  form: unknown;
  rubric: unknown;
}): PublishedVersion {
  return {
    versionId: row.versionId,
    number: row.number,
    rubric: rubricSchema.parse(row.rubric),
    policy: rubricFormSchema.parse(row.form).policies.prediction,
  };
}

/** The modified rubrics that stand, by attempt; those of one student are one. */
export async function loadAccommodations(
  tx: Transaction,
  schoolId: string,
  attemptIds: readonly string[],
): Promise<Map<string, StandingAccommodation>> {
  const rows = await selectStandingAccommodations(tx, schoolId, attemptIds);
  return new Map(
    rows.map(({ attemptId, accommodationId, modification }) => [
      attemptId,
      { accommodationId, modification: modificationSchema.parse(modification) },
    ]),
  );
}

/** The modifications that results name, by accommodation, whether they still stand or not. */
export async function loadModifications(
  tx: Transaction,
  schoolId: string,
  accommodationIds: readonly (string | null)[],
): Promise<Map<string, Modification>> {
  const ids = [...new Set(accommodationIds.filter((id) => id !== null))];
  const rows = ids.length > 0 ? await selectModifications(tx, schoolId, ids) : [];
  return new Map(
    rows.map(({ accommodationId, modification }) => [
      accommodationId,
      modificationSchema.parse(modification),
    ]),
  );
}
