import type { Metadata } from 'next';
import { EmptyState } from '@/components/ui/empty-state';
import { PageTitle } from '@/components/ui/titles';
import { listTasks, type TaskStage } from '@/lib/data/own/list-tasks';
import { pageActor, pageValue } from '@/lib/transport/page';
import { TaskList } from './_components/task-list';
import { Unsent } from './_components/unsent';

export const metadata: Metadata = { title: 'my practicals' };

const STAGES: { title: string; stages: TaskStage[] }[] = [
  { title: 'To do', stages: ['to do'] },
  { title: 'Locked, the bench is next', stages: ['locked'] },
  { title: 'Published', stages: ['published', 'closed'] },
];

export default async function MyPage() {
  const actor = await pageActor();
  const tasks = pageValue(await listTasks(actor, {}));
  return (
    <>
      <PageTitle>Your practicals</PageTitle>
      <Unsent personId={actor.personId} />
      {tasks.length === 0 ? (
        <EmptyState title="Nothing has been given to you yet">
          A practical stands here as soon as your teacher opens it for your period. Until then there is
          nothing to do.
        </EmptyState>
      ) : null}
      {STAGES.map(({ title, stages }) => (
        <TaskList key={title} title={title} tasks={tasks.filter(({ stage }) => stages.includes(stage))} />
      ))}
    </>
  );
}
