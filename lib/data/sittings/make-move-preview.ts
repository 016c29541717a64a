import 'server-only';
import { createHash } from 'node:crypto';
import type { Transaction } from '@/db/client';
import type { SittingRow } from '@/db/queries/sittings';
import type { MovedAttempt, MovePreview } from '@/lib/contracts/moves';
import { totalPoints } from '@/lib/practicals/both-scales';
import type { Dropped, Rubric } from '@/lib/scoring';
import { ENGINE_VERSION } from '@/lib/scoring/engine-version';
import { hasCell } from '@/lib/sync/cells';
import { holdPoints, leftOut, pricerOf, type RecordedWork } from '../pricing/price-work';
import type { Pricing, PublishedVersion } from '../pricing/pricing';
import type { Following } from '../verb';
import { changeBetween, type Result, sumUpChanges } from './compare-move';
import { loadMoveMaterial, type MoveMaterial } from './move-material';
import { asksForMore, type Recorded, readRecorded } from './read-recorded';

/**
 * Prices every attempt of the sitting as it stands and as it would under the version, with the bonus of predictions
 * in time; late ones count where the latest publication counted them. Tells how far it has come, and stops when it is
 * called off.
 */
export async function makeMovePreview(
  tx: Transaction,
  sitting: SittingRow,
  to: PublishedVersion,
  { onProgress, signal }: Following = {},
): Promise<MovePreview> {
  const material = await loadMoveMaterial(tx, sitting, to.versionId);
  const { heads, stood } = material;
  const [from] = stood;
  if (!from) throw new Error('a sitting stands under a version');
  const fromEvents = material.movedBefore && asksForMore(to.rubric, from);
  const students: MovedAttempt[] = [];
  const dropped: Dropped[][] = [];
  onProgress?.(0, heads.length);
  for await (const some of readRecorded(tx, sitting.schoolId, heads, { fromEvents })) {
    signal?.throwIfAborted();
    for (const recorded of some) {
      students.push(moveAttempt(material, recorded));
      if (recorded.bench) dropped.push(leftOut(material.after(recorded.head.attemptId), recorded.bench));
    }
    onProgress?.(students.length, heads.length);
  }
  const preview = {
    sittingId: sitting.sittingId,
    from: { versionId: sitting.rubricVersionId, number: sitting.versionNumber, total: totalPoints(from) },
    to: { versionId: to.versionId, number: to.number, total: totalPoints(to.rubric) },
    students,
    ...sumUpChanges(students),
    notAsked: countNotAsked(stood, dropped),
  };
  return { ...preview, seen: fingerprintOf(preview, material) };
}

function moveAttempt(material: MoveMaterial, recorded: Recorded): MovedAttempt {
  const { attemptId, studentId, attemptNumber, familyName, givenName } = recorded.head;
  const now = material.now(attemptId);
  const next = material.after(attemptId);
  const work = workOf(material, recorded);
  const priceBy = work && pricerOf(work);
  const before = isStored(now, recorded, work)
    ? { score: recorded.head.scorePoints, total: recorded.head.totalPoints ?? 0 }
    : resultOf(now, recorded, priceBy, true);
  const after = resultOf(next, recorded, priceBy, false);
  return {
    ...{ attemptId, studentId, familyName, givenName, attemptNumber },
    before: before.score,
    after: after.score,
    held: resultOf(next, recorded, priceBy, true).score,
    change: changeBetween(before, after),
    told: (material.told.get(attemptId)?.scorePoints ?? null) !== null,
    modified: next.accommodationId !== null,
  };
}

function workOf({ late, told }: MoveMaterial, { head, bench, own }: Recorded): RecordedWork | null {
  if (!bench) return null;
  const counts = !late.has(head.attemptId) || (told.get(head.attemptId)?.bonusPoints ?? 0) > 0;
  return { bench, own: counts ? own : null };
}

/** Whether the stored score is of this very pricing, and no bonus comes on top. */
function isStored(pricing: Pricing, { head }: Recorded, work: RecordedWork | null): boolean {
  return (
    head.standing === 'expected' &&
    work?.own === null &&
    head.engineVersion === ENGINE_VERSION &&
    head.versionId === pricing.versionId &&
    head.accommodationId === pricing.accommodationId
  );
}

/** A zero is a number; absent, excused and what is not read to the end are none. */
function resultOf(
  pricing: Pricing,
  { head, conflicts }: Recorded,
  priceBy: ReturnType<typeof pricerOf> | null,
  hold: boolean,
): Result {
  if (head.standing === 'zero') return { score: 0, total: totalPoints(pricing.rubric) };
  const torn = conflicts.some((cell) => hasCell(pricing.published, cell));
  if (head.standing !== 'expected' || !priceBy || torn) return { score: null, total: 0 };
  const priced = priceBy(pricing);
  if (priced.score === null) return { score: null, total: 0 };
  const held = hold ? holdPoints(pricing, priced, priceBy).points : 0;
  return { score: priced.score + held, total: priced.total };
}

/** By name: a whole line where pieces are left out, a check by its own. The most attempts first. */
function countNotAsked(stood: readonly Rubric[], dropped: readonly Dropped[][]): MovePreview['notAsked'] {
  const counts = new Map<string, number>();
  for (const ofOne of dropped) {
    for (const label of new Set(ofOne.map((each) => labelOf(stood, each)))) {
      counts.set(label, (counts.get(label) ?? 0) + 1);
    }
  }
  return [...counts]
    .map(([label, attempts]) => ({ label, attempts }))
    .sort((a, b) => b.attempts - a.attempts || (a.label < b.label ? -1 : 1));
}

function labelOf(stood: readonly Rubric[], { lineId, what }: Dropped): string {
  const lines = stood.flatMap((rubric) => rubric.lines.filter(({ id }) => id === lineId));
  if (what === 'piece') return lines[0]?.label ?? lineId;
  const checks =
    lineId === '' ? stood.flatMap(({ workChecks }) => workChecks) : lines.flatMap((line) => line.checks);
  return checks.find(({ id }) => id === what)?.label ?? what;
}

/** Of everything the preview says but people's names, and of what a move would be held and undone by. */
function fingerprintOf(preview: Omit<MovePreview, 'seen'>, { moves, latest, after }: MoveMaterial): string {
  const students = preview.students.map((student) => {
    const { attemptId, before, after: next, held, change, told } = student;
    const { accommodationId, held: versions } = after(attemptId);
    return [
      attemptId,
      before,
      next,
      held,
      change,
      told,
      accommodationId,
      versions.map(({ versionId }) => versionId),
    ];
  });
  const { from, to, notAsked } = preview;
  const standing = moves.map(({ moveId }) => moveId);
  return createHash('sha256')
    .update(JSON.stringify([from, to, students, notAsked, standing, latest?.number ?? 0]))
    .digest('hex');
}
