import 'server-only';
import { selectStandingApprovals } from '@/db/queries/approvals';
import { countTaken, selectSharedVersions } from '@/db/queries/department';
import { listSharedInput } from '@/lib/contracts/department';
import { countTask, taskSchema } from '@/lib/practicals/task';
import { defineVerb } from '../verb';

export interface SharedVersion {
  versionId: string;
  number: number;
  publishedAt: string;
  /** The periods whose sittings stand under it. */
  periods: string[];
  /** Who approved it as the department's, and when. */
  approval: { approvedBy: string; approvedAt: string } | null;
}

/** A practical that its teacher offers, or of which a version stands approved; its versions, the newest first. */
export interface SharedPractical {
  practicalId: string;
  title: string;
  unit: 'in' | 'mm';
  ownerName: string;
  offered: boolean;
  lines: number;
  pieces: number;
  /** Practicals of colleagues that were taken from it. */
  copies: number;
  versions: SharedVersion[];
}

/** What the department shares: each practical on offer with its versions, and which of them is the department's. */
export const listShared = defineVerb({
  action: 'rubric.compare',
  input: listSharedInput,
  async run({ actor, tx, authorize, found }): Promise<{ practicals: SharedPractical[] }> {
    const { schoolId } = actor;
    const departmentId = found(actor.departmentId);
    authorize({ schoolId, departmentId });
    const standing = await selectStandingApprovals(tx, schoolId, departmentId);
    const copies = await countTaken(tx, schoolId);
    const practicals = new Map<string, SharedPractical>();
    for (const row of await selectSharedVersions(tx, schoolId, departmentId)) {
      const { versionId, practicalId, number, periods, ownerName, unit } = row;
      const task = taskSchema.parse(row.task);
      const practical = practicals.get(practicalId) ?? {
        ...{ practicalId, title: task.title, unit, ownerName },
        offered: row.offeredAt !== null,
        lines: task.cutList.lines.length,
        pieces: countTask(task).pieces,
        copies: copies.get(practicalId) ?? 0,
        versions: [],
      };
      const approval = standing.find((each) => each.versionId === versionId);
      practical.versions.push({
        ...{ versionId, number, periods },
        publishedAt: row.publishedAt.toISOString(),
        approval: approval
          ? { approvedBy: approval.approvedBy, approvedAt: approval.approvedAt.toISOString() }
          : null,
      });
      practicals.set(practicalId, practical);
    }
    return { practicals: [...practicals.values()] };
  },
});
