import 'server-only';
import { selectOthersPublished, selectOwnPracticals } from '@/db/queries/practical-lists';
import { listPracticalsInput } from '@/lib/contracts/practicals';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { countTask, taskSchema } from '@/lib/practicals/task';
import { defineVerb } from '../verb';
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
}

export interface DepartmentPractical {
  practicalId: string;
  versionId: string;
  number: number;
  title: string;
  unit: 'in' | 'mm';
  ownerName: string;
  lines: number;
  pieces: number;
}

export interface PracticalList {
  own: PracticalListItem[];
  department: DepartmentPractical[];
}

export const listPracticals = defineVerb({
  action: 'practical.list',
  input: listPracticalsInput,
  async run({ actor, input, tx, authorize }): Promise<PracticalList> {
    const { schoolId, personId, departmentId } = actor;
    authorize({ schoolId });
    const own = await selectOwnPracticals(tx, schoolId, personId, input);
    const others = departmentId ? await selectOthersPublished(tx, schoolId, departmentId, personId) : [];
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
        };
      }),
    };
  },
});

/** Pieces as far as their numbers can be read yet. */
function countDraft(draft: PracticalDraft): { lines: number; pieces: number } {
  const pieces = draft.lines.reduce((sum, { quantity }) => sum + (Number.parseInt(quantity, 10) || 0), 0);
  return { lines: draft.lines.length, pieces };
}
