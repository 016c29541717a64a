import 'server-only';
import type { Transaction } from '@/db/client';
import { type StandingApproval, selectOrigins, selectStandingApprovals } from '@/db/queries/approvals';
import { cutListSignature } from '@/lib/practicals/compare-rubrics';
import { type Task, taskSchema } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { storedVersion } from './stored';

/** The version that the department approved for what a practical asks for. */
export interface DepartmentRubric {
  versionId: string;
  practicalId: string;
  number: number;
  ownerName: string;
  approvedBy: string;
  approvedAt: string;
  task: Task;
  form: RubricForm;
  rubric: Rubric;
}

interface Practical {
  schoolId: string;
  departmentId: string;
  id: string;
}

/**
 * The department's rubric for one of these tasks of a practical, the first that has one; else the one that stands for
 * the nearest practical it was taken from.
 */
export async function departmentRubricOf(
  tx: Transaction,
  practical: Practical,
  tasks: readonly Task[],
): Promise<DepartmentRubric | null> {
  const { schoolId, departmentId, id } = practical;
  const standing = await selectStandingApprovals(tx, schoolId, departmentId);
  if (standing.length === 0) return null;
  const origins = await selectOrigins(tx, schoolId, id);
  const found = approvalFor(standing, tasks, origins);
  return found ? asDepartmentRubric(found) : null;
}

/** Of the approvals that stand, the one that prices this cut list, else the nearest origin's. */
export function approvalFor(
  standing: readonly StandingApproval[],
  tasks: readonly Task[],
  origins: readonly string[],
): StandingApproval | undefined {
  const bySignature = new Map(
    standing.map((approval) => [cutListSignature(taskSchema.parse(approval.task)), approval]),
  );
  const priced = tasks.map((task) => bySignature.get(cutListSignature(task))).find(Boolean);
  const nearest = origins
    .map((origin) => standing.find(({ practicalId }) => practicalId === origin))
    .find(Boolean);
  return priced ?? nearest;
}

function asDepartmentRubric(approval: StandingApproval): DepartmentRubric {
  const { versionId, practicalId, number, ownerName, approvedBy, approvedAt } = approval;
  return {
    ...{ versionId, practicalId, number, ownerName, approvedBy },
    approvedAt: approvedAt.toISOString(),
    ...storedVersion(approval),
  };
}
