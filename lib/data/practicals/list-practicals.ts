import 'server-only';
import { selectOffered, selectOwnPracticals } from '@/db/queries/practical-lists';
import { listPracticalsInput } from '@/lib/contracts/practicals';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { countTask, taskSchema } from '@/lib/practicals/task';
import { defineVerb } from '../verb';
import { readSource, type SourceView } from './practical-source';
import { storedDraft } from './stored';

export interface PracticalListItem {
  practicalId: string;
  title: string;
  unit: 'in' | 'mm';
  lines: number;
  pieces: number;
  savedAt: string;
  version: { versionId: string; number: number; publishedAt: string } | null;
  sittings: number;
  offered: boolean;
  /** The number of the version that the department approved. */
  approvedNumber: number | null;
  source: ListedSource | null;
}

/** What a practical was taken from, and what its original has changed since. */
export type ListedSource = Pick<SourceView, 'kind' | 'ownerName' | 'title' | 'number' | 'isOpen' | 'newest'>;

export interface DepartmentPractical {
  practicalId: string;
  versionId: string;
  number: number;
  title: string;
  unit: 'in' | 'mm';
  ownerName: string;
  lines: number;
  pieces: number;
  /** The version that the department approved, the one on offer or an earlier one. */
  approved: { versionId: string; number: number } | null;
  /** The person has a copy of it already. */
  taken: boolean;
}

export interface PracticalList {
  own: PracticalListItem[];
  department: DepartmentPractical[];
}

export const listPracticals = defineVerb({
  action: 'practical.list',
  input: listPracticalsInput,
  async run(context): Promise<PracticalList> {
    const { actor, input, tx, authorize } = context;
    const { schoolId, personId, departmentId } = actor;
    authorize({ schoolId });
    const own = await selectOwnPracticals(tx, schoolId, personId, input);
    const sources = new Map<string, ListedSource | null>();
    for (const row of own) sources.set(row.practicalId, await listSource(context, row));
    const others = departmentId ? await selectOffered(tx, schoolId, departmentId, personId) : [];
    return {
      own: own.map((row) => ({
        practicalId: row.practicalId,
        title: row.title,
        unit: row.unit,
        ...countDraft(storedDraft(row.content)),
        savedAt: row.savedAt.toISOString(),
        version:
          row.versionId && row.number && row.publishedAt
            ? { versionId: row.versionId, number: row.number, publishedAt: row.publishedAt.toISOString() }
            : null,
        sittings: row.sittings,
        offered: row.offeredAt !== null,
        approvedNumber: row.approvedNumber,
        source: sources.get(row.practicalId) ?? null,
      })),
      department: others.map((row) => {
        const task = taskSchema.parse(row.task);
        return {
          practicalId: row.practicalId,
          versionId: row.versionId,
          number: row.number,
          title: task.title,
          unit: row.unit,
          ownerName: row.ownerName,
          lines: task.cutList.lines.length,
          pieces: countTask(task).pieces,
          approved:
            row.approvedVersionId && row.approvedNumber
              ? { versionId: row.approvedVersionId, number: row.approvedNumber }
              : null,
          taken: row.taken,
        };
      }),
    };
  },
});

async function listSource(
  context: Parameters<typeof readSource>[0],
  row: Parameters<typeof readSource>[1],
): Promise<ListedSource | null> {
  const source = await readSource(context, row);
  if (!source) return null;
  const { kind, ownerName, title, number, isOpen, newest } = source;
  return { kind, ownerName, title, number, isOpen, newest };
}

/** Pieces as far as their numbers can be read yet. */
function countDraft(draft: PracticalDraft): { lines: number; pieces: number } {
  const pieces = draft.lines.reduce((sum, { quantity }) => sum + (Number.parseInt(quantity, 10) || 0), 0);
  return { lines: draft.lines.length, pieces };
}
