import 'server-only';
import { endApprovals, selectApproval } from '@/db/queries/approvals';
import { lockPractical } from '@/db/queries/practicals';
import { endApprovalInput } from '@/lib/contracts/department';
import { practicalSubject } from '../practicals/practical-subject';
import { defineVerb } from '../verb';

/** Ends an approval; what was given under it, and the version itself, stay as they are. */
export const endApproval = defineVerb({
  action: 'rubric.approve',
  input: endApprovalInput,
  async run({ actor, input, tx, found, authorize, log }): Promise<{ versionId: string }> {
    const { schoolId, personId } = actor;
    const approval = found(await selectApproval(tx, schoolId, input.approvalId));
    const practical = found(await lockPractical(tx, schoolId, approval.practicalId));
    authorize(practicalSubject(practical));
    const { versionId, number, endedAt } = approval;
    if (endedAt) return { versionId };
    await endApprovals(tx, schoolId, [input.approvalId], personId);
    await log({
      subjectKind: 'rubric version',
      subjectId: versionId,
      details: { approvalEnded: practical.title, version: number },
    });
    return { versionId };
  },
});
