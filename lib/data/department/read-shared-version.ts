import 'server-only';
import { type StandingApproval, selectStandingApprovals } from '@/db/queries/approvals';
import { selectVersion } from '@/db/queries/practicals';
import { selectDepartmentSittings, selectReadAttempts } from '@/db/queries/recorded-work';
import { sharedVersionInput } from '@/lib/contracts/department';
import { cutListSignature } from '@/lib/practicals/compare-rubrics';
import { type EffectScale, type GroupEffect, rubricEffect } from '@/lib/practicals/rubric-effect';
import { countTask, type Task, taskSchema } from '@/lib/practicals/task';
import { type Rubric, rubricSchema } from '@/lib/scoring';
import { modificationSchema } from '@/lib/scoring/modification-schema';
import { practicalSubject } from '../practicals/practical-subject';
import { storedVersion } from '../practicals/stored';
import { storedAttempt } from '../pricing/stored-attempt';
import { type Context, defineVerb } from '../verb';

/** A section with recorded readings of the cut list: its figures, or from fewer than ten students their number alone. */
export interface SectionEffect {
  sittingId: string;
  sectionName: string;
  period: string;
  termName: string;
  /** The rubric it stands under now. */
  ownerName: string;
  versionNumber: number;
  students: number;
  effect: GroupEffect | null;
}

export interface SharedVersionView {
  versionId: string;
  practicalId: string;
  title: string;
  number: number;
  ownerName: string;
  unit: 'in' | 'mm';
  offered: boolean;
  publishedAt: string;
  lines: number;
  pieces: number;
  approval: { approvalId: string; approvedBy: string; approvedAt: string } | null;
  /** What an approval would end: the one of this practical, or of this cut list, that stands now. */
  standing: { ownerName: string; number: number; title: string }[];
  scale: EffectScale;
  sections: SectionEffect[];
}

/** A version as the head weighs it: what it would make of every section's recorded readings of the same cut list. */
export const readSharedVersion = defineVerb({
  action: 'rubric.compare',
  input: sharedVersionInput,
  async run(context): Promise<SharedVersionView> {
    const { actor, input, tx, found, authorize, logView } = context;
    const { schoolId } = actor;
    const row = found(await selectVersion(tx, schoolId, input.versionId));
    authorize(practicalSubject(row));
    const { task, rubric } = storedVersion(row);
    const { versionId, practicalId, number, ownerName, departmentId } = row;
    const approvals = await selectStandingApprovals(tx, schoolId, departmentId);
    const approval = approvals.find((each) => each.versionId === versionId);
    const { scale, sections } = await loadEffect(context, departmentId, task, rubric);
    await logView({
      subjectKind: 'rubric version',
      subjectId: versionId,
      details: { sections: sections.length },
    });
    return {
      ...{ versionId, practicalId, number, ownerName, scale, sections },
      title: task.title,
      unit: task.unit,
      offered: row.offeredAt !== null,
      publishedAt: row.publishedAt.toISOString(),
      lines: task.cutList.lines.length,
      pieces: countTask(task).pieces,
      approval: approval
        ? {
            approvalId: approval.approvalId,
            approvedBy: approval.approvedBy,
            approvedAt: approval.approvedAt.toISOString(),
          }
        : null,
      standing: replacedBy(approvals, { versionId, practicalId, task }).map((each) => ({
        ownerName: each.ownerName,
        number: each.number,
        title: taskSchema.parse(each.task).title,
      })),
    };
  },
});

/** The approvals that end when a version is approved: another version of its practical, or one of its cut list. */
export function replacedBy(
  approvals: readonly StandingApproval[],
  { versionId, practicalId, task }: { versionId: string; practicalId: string; task: Task },
): StandingApproval[] {
  const signature = cutListSignature(task);
  return approvals.filter(
    (each) =>
      each.versionId !== versionId &&
      (each.practicalId === practicalId || cutListSignature(taskSchema.parse(each.task)) === signature),
  );
}

async function loadEffect(
  { actor, tx }: Pick<Context<unknown>, 'actor' | 'tx'>,
  departmentId: string,
  task: Task,
  rubric: Rubric,
): Promise<Pick<SharedVersionView, 'scale' | 'sections'>> {
  const signature = cutListSignature(task);
  const all = await selectDepartmentSittings(tx, actor.schoolId, departmentId);
  const sittings = all.filter((sitting) => cutListSignature(taskSchema.parse(sitting.task)) === signature);
  const ids = sittings.map(({ sittingId }) => sittingId);
  const read = await selectReadAttempts(tx, actor.schoolId, ids);
  const recorded = sittings.filter(({ sittingId }) => read.some((each) => each.sittingId === sittingId));
  const { scale, groups } = rubricEffect(
    rubric,
    recorded.map((sitting) => ({
      rubric: rubricSchema.parse(sitting.rubric),
      work: read
        .filter(({ sittingId }) => sittingId === sitting.sittingId)
        .map(({ recorded: attempt, modification }) => ({
          attempt: storedAttempt(attempt),
          modification: modification === null ? null : modificationSchema.parse(modification),
        })),
    })),
  );
  return {
    scale,
    sections: recorded.map((sitting, index) => {
      const { sittingId, sectionName, period, termName, ownerName, versionNumber } = sitting;
      const { students, effect } = groups[index] ?? { students: 0, effect: null };
      return {
        ...{ sittingId, sectionName, period, termName, ownerName, versionNumber },
        ...{ students, effect },
      };
    }),
  };
}
