import 'server-only';
import { type PracticalRow, selectPractical } from '@/db/queries/practicals';
import { selectTeachersUnder, selectVersionsInFull } from '@/db/queries/versions';
import { may } from '@/lib/auth/policy';
import { changesSince } from '@/lib/practicals/changes-since';
import type { Phrase } from '@/lib/practicals/compare-types';
import type { Context } from '../verb';
import { storedVersion } from './stored';
import { versionSubject } from './version-subject';

export type FullVersion = Awaited<ReturnType<typeof selectVersionsInFull>>[number];

/** A version with what it changes of the one before it; null for the first, or when that one is not to be read. */
export interface TracedVersion {
  row: FullVersion;
  changes: Phrase[] | null;
  /** One's own sittings that stand on it. */
  ownSittings: { sittingId: string; sectionName: string; period: string }[];
}

/** The versions of a practical that the actor may read, newest first. */
export async function loadVersions(
  { actor, tx, found }: Pick<Context<unknown>, 'actor' | 'tx' | 'found'>,
  practicalId: string,
): Promise<{ practical: PracticalRow; versions: TracedVersion[] }> {
  const { schoolId, personId } = actor;
  const practical = found(await selectPractical(tx, schoolId, practicalId));
  const under = await selectTeachersUnder(tx, schoolId, practicalId);
  const rows = (await selectVersionsInFull(tx, schoolId, practicalId)).filter(({ id }) =>
    may(actor, 'version.read', versionSubject(practical, id, under)),
  );
  const versions = rows.map((row) => ({
    row,
    changes: changesOf(
      rows.find(({ number }) => number === row.number - 1),
      row,
    ),
    ownSittings: under
      .filter((each) => each.versionId === row.id && each.personId === personId && each.stands)
      .map(({ sittingId, sectionName, period }) => ({ sittingId, sectionName, period })),
  }));
  return { practical, versions };
}

function changesOf(before: FullVersion | undefined, row: FullVersion): Phrase[] | null {
  if (!before) return null;
  return changesSince({ ...storedVersion(before), number: before.number }, storedVersion(row));
}
