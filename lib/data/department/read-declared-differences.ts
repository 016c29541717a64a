import 'server-only';
import {
  type StandingApproval,
  selectOrigins,
  selectStandingApprovals,
  selectTakenFrom,
} from '@/db/queries/approvals';
import { selectDepartmentVersions, selectVersionsById } from '@/db/queries/department';
import { selectVersion } from '@/db/queries/practicals';
import { sharedVersionInput } from '@/lib/contracts/department';
import type { Phrase } from '@/lib/practicals/compare-types';
import { departmentDifferences } from '@/lib/practicals/department-differences';
import { taskSchema } from '@/lib/practicals/task';
import { approvalFor } from '../practicals/department-rubric';
import { practicalSubject } from '../practicals/practical-subject';
import { storedVersion } from '../practicals/stored';
import { type Context, defineVerb } from '../verb';

/** A version that is in use or is its practical's newest, and where it differs from the department's. */
export interface DeclaredVersion {
  versionId: string;
  practicalId: string;
  ownerName: string;
  title: string;
  number: number;
  isNewest: boolean;
  /** The periods whose sittings stand under it. */
  periods: string[];
  same: boolean;
  sentences: Phrase[];
  /** Why, in its teacher's words. */
  reason: string | null;
}

/**
 * Every version of the department that was taken from the approved one or prices its cut list, and where each differs
 * from it; one that another approval is nearer to is declared there. Empty while the version is not approved.
 */
export const readDeclaredDifferences = defineVerb({
  action: 'rubric.compare',
  input: sharedVersionInput,
  async run(context): Promise<{ versions: DeclaredVersion[] }> {
    const { actor, input, tx, found, authorize } = context;
    const { schoolId } = actor;
    const row = found(await selectVersion(tx, schoolId, input.versionId));
    authorize(practicalSubject(row));
    const approvals = await selectStandingApprovals(tx, schoolId, row.departmentId);
    const approval = approvals.find(({ versionId }) => versionId === row.versionId);
    if (!approval) return { versions: [] };
    const belonging = await versionsUnder(context, row.departmentId, approvals, approval);
    const ids = belonging.map(({ versionId }) => versionId);
    const stored = ids.length > 0 ? await selectVersionsById(tx, schoolId, ids) : [];
    const approved = storedVersion(approval);
    return {
      versions: belonging.map((version) => {
        const { versionId, practicalId, ownerName, number, isNewest, periods } = version;
        const full = found(stored.find((each) => each.versionId === versionId));
        const own = { ...storedVersion(full), label: 'this version' };
        const { same, sentences } = departmentDifferences(approved, own);
        return {
          ...{ versionId, practicalId, ownerName, number, isNewest, periods, same, sentences },
          title: own.task.title,
          reason: full.differenceReason,
        };
      }),
    };
  },
});

async function versionsUnder(
  { actor, tx }: Pick<Context<unknown>, 'actor' | 'tx'>,
  departmentId: string,
  approvals: readonly StandingApproval[],
  approval: StandingApproval,
) {
  const { schoolId } = actor;
  const taken = await selectTakenFrom(tx, schoolId, approval.practicalId);
  const belonging = [];
  for (const version of await selectDepartmentVersions(tx, schoolId, departmentId)) {
    if (version.versionId === approval.versionId) continue;
    const origins = taken.has(version.practicalId)
      ? await selectOrigins(tx, schoolId, version.practicalId)
      : [];
    const nearest = approvalFor(approvals, [taskSchema.parse(version.task)], origins);
    if (nearest?.approvalId === approval.approvalId) belonging.push(version);
  }
  return belonging;
}
