import 'server-only';
import type { Transaction } from '@/db/client';
import { type AttemptRow, selectAttempts } from '@/db/queries/attempts';
import { selectSittingsOf, selectVersion } from '@/db/queries/gradebook';
import {
  type PublicationRow,
  type ResultRow,
  selectPublications,
  selectResults,
} from '@/db/queries/publications';
import { type Task, taskSchema } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import { rubricSchema } from '@/lib/scoring/schemas';
import { loadPricing } from '../pricing/load-pricing';
import type { Pricing } from '../pricing/pricing';

export interface LoadedVersion {
  versionId: string;
  number: number;
  task: Task;
  form: RubricForm;
  rubric: Rubric;
}

export interface LoadedSitting {
  sittingId: string;
  title: string;
  open: boolean;
  openedAt: Date;
  /** The version the sitting stands under. */
  version: LoadedVersion;
  attempts: AttemptRow[];
  /** By what an attempt is priced as it stands. */
  pricingOf(attemptId: string): Pricing;
  latest: { publication: PublicationRow; version: LoadedVersion; results: Map<string, ResultRow> } | null;
}

/** The sittings of a section, the first one first, with attempts and what was last published. */
export async function loadSittings(
  tx: Transaction,
  schoolId: string,
  sectionId: string,
): Promise<LoadedSitting[]> {
  const sittings = await selectSittingsOf(tx, schoolId, sectionId);
  if (sittings.length === 0) return [];
  const ids = sittings.map(({ sittingId }) => sittingId);
  const attempts = await selectAttempts(tx, schoolId, ids);
  const latest = await loadLatest(tx, schoolId, ids);
  const pricings = await loadPricing(
    tx,
    schoolId,
    attempts.map(({ attemptId }) => attemptId),
  );
  const pricingOf = (attemptId: string) => {
    const pricing = pricings.get(attemptId);
    if (!pricing) throw new Error(`attempt ${attemptId} has no price`);
    return pricing;
  };
  const versionOf = versionReader(tx, schoolId);
  const loaded: LoadedSitting[] = [];
  for (const { sittingId, title, state, openedAt, rubricVersionId } of sittings) {
    const told = latest.get(sittingId);
    loaded.push({
      sittingId,
      title,
      open: state === 'open',
      openedAt,
      version: await versionOf(rubricVersionId),
      attempts: attempts.filter((row) => row.sittingId === sittingId),
      pricingOf,
      latest: told ? { ...told, version: await versionOf(told.publication.rubricVersionId) } : null,
    });
  }
  return loaded;
}

interface Told {
  publication: PublicationRow;
  results: Map<string, ResultRow>;
}

/** The latest publication of each sitting that has one, with its results by attempt. */
async function loadLatest(
  tx: Transaction,
  schoolId: string,
  sittingIds: readonly string[],
): Promise<Map<string, Told>> {
  const latest = new Map<string, Told>();
  for (const publication of await selectPublications(tx, schoolId, sittingIds)) {
    if (latest.has(publication.sittingId)) continue;
    latest.set(publication.sittingId, { publication, results: new Map() });
  }
  const byPublication = new Map([...latest.values()].map((told) => [told.publication.publicationId, told]));
  const ids = [...byPublication.keys()];
  const results = ids.length > 0 ? await selectResults(tx, schoolId, ids) : [];
  for (const row of results) byPublication.get(row.publicationId)?.results.set(row.attemptId, row);
  return latest;
}

/** Each version is read once. */
function versionReader(tx: Transaction, schoolId: string): (versionId: string) => Promise<LoadedVersion> {
  const known = new Map<string, LoadedVersion>();
  return async (versionId) => {
    const read = known.get(versionId);
    if (read) return read;
    const row = await selectVersion(tx, schoolId, versionId);
    if (!row) throw new Error(`rubric version ${versionId} is not there`);
    const version = {
      versionId,
      number: row.number,
      task: taskSchema.parse(row.task),
      form: rubricFormSchema.parse(row.form),
      rubric: rubricSchema.parse(row.rubric),
    };
    known.set(versionId, version);
    return version;
  };
}
