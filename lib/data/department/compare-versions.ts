import 'server-only';
import { selectVersionsById } from '@/db/queries/department';
import { compareVersionsInput } from '@/lib/contracts/department';
import { compareRubrics, cutListSignature } from '@/lib/practicals/compare-rubrics';
import type { RubricComparison } from '@/lib/practicals/compare-types';
import { storedVersion } from '../practicals/stored';
import { defineVerb } from '../verb';

export interface ComparedVersion {
  versionId: string;
  /** As short as it can be and still tell the compared ones apart. */
  label: string;
  note: string;
  title: string;
}

export interface VersionsComparison {
  title: string;
  unit: 'in' | 'mm';
  versions: ComparedVersion[];
  comparison: RubricComparison;
}

export const NOT_ONE_TASK =
  'These rubrics ask for different pieces, so their prices cannot be laid side by side. Choose rubrics of one cut list.';

/** Two or more of the department's rubrics side by side, in the order asked for. */
export const compareVersions = defineVerb({
  action: 'rubric.compare',
  input: compareVersionsInput,
  async run({ actor, input, tx, found, authorize, refuseFields }): Promise<VersionsComparison> {
    const stored = await selectVersionsById(tx, actor.schoolId, input.versionIds);
    const rows = input.versionIds.map((id) => {
      const row = found(stored.find(({ versionId }) => versionId === id));
      authorize({ schoolId: row.schoolId, departmentId: row.departmentId });
      return { ...row, ...storedVersion(row) };
    });
    if (new Set(rows.map(({ task }) => cutListSignature(task))).size > 1) {
      refuseFields({ versionIds: [NOT_ONE_TASK] });
    }
    const [first] = rows;
    const labels = labelVersions(rows);
    const compared = rows.map(({ task, form, rubric }, index) => ({
      label: labels[index] ?? '',
      task,
      form,
      rubric,
    }));
    return {
      title: found(first).task.title,
      unit: found(first).rubric.unit,
      versions: rows.map(({ versionId, number, task }, index) => {
        const label = labels[index] ?? '';
        return { versionId, label, note: `version ${number}`, title: task.title };
      }),
      comparison: compareRubrics(compared),
    };
  },
});

/** Family names where each is another person's, else with the version, so that a sentence can name each. */
function labelVersions(rows: readonly { ownerName: string; familyName: string; number: number }[]): string[] {
  const family = rows.map(({ familyName }) => familyName);
  if (new Set(family).size === rows.length) return family;
  if (new Set(family).size === 1) return rows.map(({ number }) => `version ${number}`);
  return rows.map(({ ownerName, number }) => `${ownerName} ${number}`);
}
