import 'server-only';
import { selectDepartmentVersions } from '@/db/queries/department';
import { listRubricsInput } from '@/lib/contracts/department';
import { cutListSignature } from '@/lib/practicals/compare-rubrics';
import { countTask, taskSchema } from '@/lib/practicals/task';
import { defineVerb } from '../verb';

export interface RubricInUse {
  versionId: string;
  practicalId: string;
  ownerName: string;
  number: number;
  publishedAt: string;
  isNewest: boolean;
  sittings: number;
  periods: string[];
}

/** Rubrics that price one and the same cut list, whoever wrote them. */
export interface ComparableRubrics {
  title: string;
  unit: 'in' | 'mm';
  lines: number;
  pieces: number;
  rubrics: RubricInUse[];
}

/** The department's rubrics in use, gathered by what they ask for, so that each group can be laid side by side. */
export const listRubrics = defineVerb({
  action: 'rubric.compare',
  input: listRubricsInput,
  async run({ actor, tx, authorize, found }): Promise<{ groups: ComparableRubrics[] }> {
    const { schoolId } = actor;
    const departmentId = found(actor.departmentId);
    authorize({ schoolId, departmentId });
    const groups = new Map<string, ComparableRubrics>();
    for (const row of await selectDepartmentVersions(tx, schoolId, departmentId)) {
      const task = taskSchema.parse(row.task);
      const key = cutListSignature(task);
      const { versionId, practicalId, ownerName, number, isNewest, sittings, periods } = row;
      const group = groups.get(key) ?? {
        title: task.title,
        unit: row.unit,
        lines: task.cutList.lines.length,
        pieces: countTask(task).pieces,
        rubrics: [],
      };
      const publishedAt = row.publishedAt.toISOString();
      group.rubrics.push({
        versionId,
        practicalId,
        ownerName,
        number,
        publishedAt,
        isNewest,
        sittings,
        periods,
      });
      groups.set(key, group);
    }
    return { groups: [...groups.values()] };
  },
});
