import 'server-only';
import { selectDraft, selectVersion } from '@/db/queries/practicals';
import { may } from '@/lib/auth/policy';
import { readVersionSheetInput } from '@/lib/contracts/versions';
import type { Phrase } from '@/lib/practicals/compare-types';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { type Context, defineVerb } from '../verb';
import { loadVersions } from './load-versions';
import { practicalSubject } from './practical-subject';
import { storedDraft, storedVersion } from './stored';

export interface VersionSheet {
  practicalId: string;
  versionId: string;
  number: number;
  publishedAt: string;
  publisherName: string;
  differenceReason: string | null;
  sittings: number;
  ownSittings: { sittingId: string; sectionName: string; period: string }[];
  task: Task;
  form: RubricForm;
  rubric: Rubric;
  /** What it changes of the version before it, and that one's prices; null when there is none to be read. */
  since: { versionId: string; number: number; changes: Phrase[]; rubric: Rubric } | null;
  /** The numbers of the versions that may be read, newest first. */
  numbers: number[];
  mayCopy: boolean;
  /** One's own practical: the draft that would give way if this version were taken back into it. */
  draft: { content: PracticalDraft; revision: number } | null;
}

/** One version of a practical to be read in full, as published, with what it changed. */
export const readVersionSheet = defineVerb({
  action: 'version.read',
  input: readVersionSheetInput,
  async run(context): Promise<VersionSheet> {
    const { actor, tx, found } = context;
    const asked = await whichVersion(context);
    const { practical, versions } = await loadVersions(context, asked.practicalId);
    const { row, changes, ownSittings } = found(versions.find((each) => each.row.number === asked.number));
    const before = versions.find((each) => each.row.number === row.number - 1);
    const subject = practicalSubject(practical);
    const draft = may(actor, 'practical.change', subject)
      ? found(await selectDraft(tx, actor.schoolId, practical.id))
      : null;
    const { number, publisherName, differenceReason, sittings } = row;
    return {
      ...{ practicalId: practical.id, versionId: row.id, number, publisherName, differenceReason },
      ...{ sittings, ownSittings, publishedAt: row.publishedAt.toISOString() },
      ...storedVersion(row),
      since:
        before && changes
          ? {
              versionId: before.row.id,
              number: before.row.number,
              changes,
              rubric: storedVersion(before.row).rubric,
            }
          : null,
      numbers: versions.map((each) => each.row.number),
      mayCopy: may(actor, 'practical.copy', subject),
      draft: draft && { content: storedDraft(draft.content), revision: draft.revision },
    };
  },
});

type Asked = { practicalId: string; number: number } | { versionId: string };

async function whichVersion({ actor, input, tx, found }: Context<Asked>) {
  if ('number' in input) return input;
  const { practicalId, number } = found(await selectVersion(tx, actor.schoolId, input.versionId));
  return { practicalId, number };
}
