import 'server-only';
import { selectDraft } from '@/db/queries/practicals';
import { may } from '@/lib/auth/policy';
import { listVersionsInput } from '@/lib/contracts/versions';
import { changesSince } from '@/lib/practicals/changes-since';
import type { Phrase } from '@/lib/practicals/compare-types';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { type Context, defineVerb } from '../verb';
import { loadVersions, type TracedVersion } from './load-versions';
import { practicalSubject } from './practical-subject';
import { storedDraft, storedVersion } from './stored';

export interface ListedVersion {
  versionId: string;
  number: number;
  publishedAt: string;
  publisherName: string;
  sittings: number;
  ownSittings: TracedVersion['ownSittings'];
  /** What it changes of the version before it; null for the first, or when that one is not to be read. */
  changes: Phrase[] | null;
  differenceReason: string | null;
}

export interface VersionList {
  practicalId: string;
  title: string;
  unit: 'in' | 'mm';
  versions: ListedVersion[];
  /** One's own draft: what it changes of the newest version, or the fields that cannot be read yet. */
  draft: { savedAt: string; changes: Phrase[] | null; wrong: string[] } | null;
}

/** Every version of a practical that may be read, newest first, each with what it changed. */
export const listVersions = defineVerb({
  action: 'version.read',
  input: listVersionsInput,
  async run(context): Promise<VersionList> {
    const { actor, input, authorize } = context;
    const { practical, versions } = await loadVersions(context, input.practicalId);
    if (versions.length === 0) authorize(practicalSubject(practical));
    const isOwn = may(actor, 'practical.change', practicalSubject(practical));
    return {
      practicalId: practical.id,
      title: practical.title,
      unit: practical.unit,
      versions: versions.map(listed),
      draft: isOwn ? await draftState(context, versions[0]) : null,
    };
  },
});

function listed({ row, changes, ownSittings }: TracedVersion): ListedVersion {
  const { id, number, publishedAt, publisherName, sittings, differenceReason } = row;
  return {
    ...{ versionId: id, number, publisherName, sittings, ownSittings, changes, differenceReason },
    publishedAt: publishedAt.toISOString(),
  };
}

async function draftState(
  { actor, input, tx, found }: Context<{ practicalId: string }>,
  newest: TracedVersion | undefined,
): Promise<VersionList['draft']> {
  const kept = found(await selectDraft(tx, actor.schoolId, input.practicalId));
  const parsed = parseDraft(storedDraft(kept.content));
  const savedAt = kept.savedAt.toISOString();
  if (!parsed.ok) return { savedAt, changes: null, wrong: Object.keys(parsed.errors) };
  const before = newest && { ...storedVersion(newest.row), number: newest.row.number };
  return { savedAt, changes: before ? changesSince(before, parsed) : null, wrong: [] };
}
