import { LocalTime } from '@/components/ui/local-time';
import { Notice } from '@/components/ui/notice';
import type { SharedVersionView } from '@/lib/data/department/read-shared-version';

/** Whether this version is the department's, or which one is. */
export function ApprovalNote({ view }: { view: SharedVersionView }) {
  const { approval, standing, offered } = view;
  if (approval) {
    return (
      <Notice title="This is the department’s rubric.">
        Approved by {approval.approvedBy} on <LocalTime at={approval.approvedAt} style="day" />.
        {offered
          ? ''
          : ' Its teacher does not offer it any more; it can still be given while it is approved.'}
      </Notice>
    );
  }
  const [other] = standing;
  if (!other) return null;
  return (
    <Notice title={`The department’s rubric is ${other.ownerName}’s version ${other.number}.`}>
      Approving this one ends that.
    </Notice>
  );
}
