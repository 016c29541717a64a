import type { Metadata } from 'next';
import { OtherUnitProvider } from '@/components/other-unit/other-unit';
import { readOtherUnit } from '@/components/other-unit/read-other-unit';
import { PhoneActions } from '@/components/shell/phone-actions';
import { LinkButton } from '@/components/ui/link-button';
import type { TaskStage } from '@/lib/data/own/list-tasks';
import { readTask } from '@/lib/data/own/read-task';
import { pageActor, pageValue } from '@/lib/transport/page';
import { CautionsList } from '../_components/cautions-list';
import { TaskHead } from '../_components/task-head';
import { PieceChecklist } from './_components/piece-checklist';
import { RulesOfTask } from './_components/rules-of-task';
import { SizeChooser } from './_components/size-chooser';
import { StockOfTask } from './_components/stock-of-task';

export const metadata: Metadata = { title: 'task' };

const NEXT: Record<TaskStage, { to: string; label: string }> = {
  'to do': { to: '/measure', label: 'measure your pieces' },
  locked: { to: '/measure', label: 'receipt and predicted score' },
  published: { to: '/result', label: 'see your result' },
  closed: { to: '/measure', label: 'your own readings' },
};

export default async function TaskPage({ params }: PageProps<'/my/[sittingId]'>) {
  const { sittingId } = await params;
  const view = pageValue(await readTask(await pageActor(), { sittingId }));
  const { task, rubric, policies, stage } = view;
  const next = NEXT[stage];
  return (
    <OtherUnitProvider isOn={await readOtherUnit()}>
      <TaskHead {...view} title={task.title} dueOn={stage === 'to do' ? view.dueOn : null} />
      <div className="mt-4 grid grid-cols-[minmax(0,1fr)] gap-8 pb-8">
        <SizeChooser rubric={rubric} lineNotes={task.lineNotes} />
        <StockOfTask task={task} />
        <CautionsList />
        <PieceChecklist rubric={rubric} personId={view.studentId} attemptId={view.attemptId} />
        <RulesOfTask rubric={rubric} policies={policies} />
      </div>
      <PhoneActions>
        <LinkButton kind="act" href={`/my/${sittingId}${next.to}`}>
          {next.label}
        </LinkButton>
      </PhoneActions>
    </OtherUnitProvider>
  );
}
