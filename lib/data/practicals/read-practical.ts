import 'server-only';
import { selectDraft, selectLatestVersion, selectPractical, selectVersions } from '@/db/queries/practicals';
import { readPracticalInput } from '@/lib/contracts/practicals';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { defineVerb } from '../verb';
import { practicalSubject } from './practical-subject';
import { storedDraft, storedVersion } from './stored';

export interface PracticalView {
  practicalId: string;
  title: string;
  unit: 'in' | 'mm';
  archived: boolean;
  draft: { content: PracticalDraft; revision: number; savedAt: string };
  versions: { versionId: string; number: number; publishedAt: string; sittings: number }[];
  latest: { versionId: string; number: number; task: Task; form: RubricForm; rubric: Rubric } | null;
}

/** A practical as its owner edits it: the draft as typed, and what has been published of it. */
export const readPractical = defineVerb({
  action: 'practical.read',
  input: readPracticalInput,
  async run({ actor, input, tx, found, authorize }): Promise<PracticalView> {
    const { schoolId } = actor;
    const row = found(await selectPractical(tx, schoolId, input.practicalId));
    authorize(practicalSubject(row));
    const draft = found(await selectDraft(tx, schoolId, row.id));
    const versions = await selectVersions(tx, schoolId, row.id);
    const latest = await selectLatestVersion(tx, schoolId, row.id);
    return {
      practicalId: row.id,
      title: row.title,
      unit: row.unit,
      archived: row.archivedAt !== null,
      draft: {
        content: storedDraft(draft.content),
        revision: draft.revision,
        savedAt: draft.savedAt.toISOString(),
      },
      versions: versions.map((version) => ({ ...version, publishedAt: version.publishedAt.toISOString() })),
      latest: latest ? { versionId: latest.id, number: latest.number, ...storedVersion(latest) } : null,
    };
  },
});
