import 'server-only';
import { endApprovals, insertApproval, selectStandingApprovals } from '@/db/queries/approvals';
import { lockDepartment } from '@/db/queries/departments';
import { lockPractical, selectVersion } from '@/db/queries/practicals';
import { sharedVersionInput } from '@/lib/contracts/department';
import { taskSchema } from '@/lib/practicals/task';
import { practicalSubject } from '../practicals/practical-subject';
import { defineVerb } from '../verb';
import { replacedBy } from './read-shared-version';

/**
 * Approves a version on offer as the department's. It ends the approval of another version of the practical and of
 * another rubric of the cut list, and changes nothing for any sitting.
 */
export const approveVersion = defineVerb({
  action: 'rubric.approve',
  input: sharedVersionInput,
  async run({ actor, input, tx, found, authorize, refuse, log }): Promise<{ approvalId: string }> {
    const { schoolId, personId } = actor;
    const row = found(await selectVersion(tx, schoolId, input.versionId));
    authorize(practicalSubject(row));
    const { versionId, practicalId, number } = row;
    await lockDepartment(tx, schoolId, row.departmentId);
    const practical = found(await lockPractical(tx, schoolId, practicalId));
    const approvals = await selectStandingApprovals(tx, schoolId, row.departmentId);
    const already = approvals.find((each) => each.versionId === versionId);
    if (already) return { approvalId: already.approvalId };
    if (!practical.offeredAt) {
      refuse('conflict', 'This practical is not on offer any more. Ask its teacher to offer it again.');
    }
    const task = taskSchema.parse(row.task);
    const ended = replacedBy(approvals, { versionId, practicalId, task });
    const endedIds = ended.map(({ approvalId }) => approvalId);
    await endApprovals(tx, schoolId, endedIds, personId);
    const approvalId = await insertApproval(tx, {
      ...{ schoolId, practicalId },
      rubricVersionId: versionId,
      approvedBy: personId,
    });
    await log({
      subjectKind: 'rubric version',
      subjectId: versionId,
      details: { approved: task.title, version: number, ended: endedIds.length },
    });
    return { approvalId };
  },
});
