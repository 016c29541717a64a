import 'server-only';
import { selectDraft, selectLatestVersion, selectPractical, selectVersions } from '@/db/queries/practicals';
import { selectSittingsBehind } from '@/db/queries/versions';
import { readPracticalInput } from '@/lib/contracts/practicals';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { parseDraft } from '@/lib/practicals/parse-draft';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { defineVerb } from '../verb';
import { type DepartmentRubric, departmentRubricOf } from './department-rubric';
import { readSource, type SourceView } from './practical-source';
import { practicalSubject } from './practical-subject';
import { storedDraft, storedReplaced, storedVersion } from './stored';

export interface PracticalView {
  practicalId: string;
  title: string;
  unit: 'in' | 'mm';
  archived: boolean;
  /** What is published of it can be copied by the department. */
  offered: boolean;
  /** The version it was taken from; null for one that was not. */
  source: SourceView | null;
  /** The number of the version that was taken over, while the draft it replaced can be put back. */
  tookOver: number | null;
  /** The rubric that the department approved for this task. */
  department: DepartmentRubric | null;
  draft: { content: PracticalDraft; revision: number; savedAt: string };
  versions: { versionId: string; number: number; publishedAt: string; sittings: number }[];
  /** The reader's own sittings that stand on an older version than the newest. */
  behind: SittingBehind[];
  latest: {
    versionId: string;
    number: number;
    task: Task;
    form: RubricForm;
    rubric: Rubric;
    /** Why it differs from the department's, where its author said so. */
    differenceReason: string | null;
  } | null;
}

export interface SittingBehind {
  sittingId: string;
  sectionName: string;
  period: string;
  number: number;
}

/** A practical as its owner edits it: the draft as typed, and what has been published of it. */
export const readPractical = defineVerb({
  action: 'practical.read',
  input: readPracticalInput,
  async run(context): Promise<PracticalView> {
    const { actor, input, tx, found, authorize } = context;
    const { schoolId } = actor;
    const row = found(await selectPractical(tx, schoolId, input.practicalId));
    authorize(practicalSubject(row));
    const draft = found(await selectDraft(tx, schoolId, row.id));
    const versions = await selectVersions(tx, schoolId, row.id);
    const latest = await selectLatestVersion(tx, schoolId, row.id);
    const content = storedDraft(draft.content);
    const published = latest ? storedVersion(latest) : null;
    return {
      practicalId: row.id,
      title: row.title,
      unit: row.unit,
      archived: row.archivedAt !== null,
      offered: row.offeredAt !== null,
      source: await readSource(context, row),
      tookOver: storedReplaced(draft.replaced)?.takenNumber ?? null,
      department: await departmentRubricOf(tx, row, tasksOf(content, published)),
      draft: {
        content,
        revision: draft.revision,
        savedAt: draft.savedAt.toISOString(),
      },
      versions: versions.map((version) => ({ ...version, publishedAt: version.publishedAt.toISOString() })),
      behind: await selectSittingsBehind(tx, schoolId, row.id, actor.personId),
      latest:
        latest && published
          ? {
              versionId: latest.id,
              number: latest.number,
              differenceReason: latest.differenceReason,
              ...published,
            }
          : null,
    };
  },
});

/** What the practical asks for: as it is typed, if that can be read, and as it was published last. */
function tasksOf(content: PracticalDraft, published: { task: Task } | null): Task[] {
  const parsed = parseDraft(content);
  return [...(parsed.ok ? [parsed.task] : []), ...(published ? [published.task] : [])];
}
