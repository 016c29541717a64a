import Link from 'next/link';
import { Heading } from '@/components/ui/titles';
import type { OwnTaskRow } from '@/lib/data/own/list-tasks';
import { DayText } from './day-text';

export function TaskList({ title, tasks }: { title: string; tasks: OwnTaskRow[] }) {
  if (tasks.length === 0) return null;
  return (
    <section className="mt-6">
      <Heading className="border-b-outline border-ink pb-1">{title}</Heading>
      <ul>
        {tasks.map((task) => (
          <TaskRow key={task.sittingId} task={task} />
        ))}
      </ul>
    </section>
  );
}

function TaskRow({ task }: { task: OwnTaskRow }) {
  const { href, words } = nextStep(task);
  return (
    <li className="relative border-b border-hair py-3">
      <p className="flex flex-wrap items-baseline justify-between gap-x-4">
        <span className="font-title text-[1.5rem] leading-8 font-[620]">{task.title}</span>
        <span className="text-label text-ink-2">
          {task.sectionName}, period {task.period}
          {task.attemptNumber > 1 ? `, attempt ${task.attemptNumber}` : ''}
        </span>
      </p>
      {task.dueOn && task.stage === 'to do' ? (
        <p className="text-label text-ink-2">
          due <DayText day={task.dueOn} />
        </p>
      ) : null}
      {task.redo ? (
        <p className="mt-1">
          Attempt {task.attemptNumber} is open to you: cut again what lost points, and hand it in.
        </p>
      ) : null}
      {task.scoreChanged ? <p className="mt-1 font-[620]">Your result changed.</p> : null}
      {task.stage === 'to do' && task.sizes.done > 0 ? <Measured sizes={task.sizes} /> : null}
      {href ? (
        <Link
          href={href}
          className="link mt-1 inline-flex min-h-11 items-center after:absolute after:inset-0"
        >
          {words}
        </Link>
      ) : (
        <p className="mt-1 text-ink-2">{words}</p>
      )}
    </li>
  );
}

/** How much of the measuring is done, as a rule filling up. */
function Measured({ sizes: { of, done } }: { sizes: OwnTaskRow['sizes'] }) {
  return (
    <div className="mt-2 flex items-center gap-3">
      <svg aria-hidden="true" viewBox="0 0 120 10" preserveAspectRatio="none" className="h-[10px] flex-1">
        <rect x="0" y="1" width={(120 * done) / of} height="8" className="fill-ink" />
        <path d="M0 1V9H120V1" className="fill-none stroke-ink" vectorEffect="non-scaling-stroke" />
      </svg>
      <span className="tnum text-label">
        {done} of {of} sizes
      </span>
    </div>
  );
}

function nextStep({ sittingId, stage, sizes }: OwnTaskRow): { href: string | null; words: string } {
  const task = `/my/${sittingId}`;
  switch (stage) {
    case 'published':
      return { href: `${task}/result`, words: 'see your result' };
    case 'closed':
      return { href: null, words: 'The results are out, and there is none for you. Ask your teacher.' };
    case 'locked':
      return { href: `${task}/measure`, words: 'your receipt and predicted score' };
    case 'to do':
      if (sizes.done === 0) return { href: task, words: 'look at the task, then cut' };
      return {
        href: `${task}/measure`,
        words: sizes.done === sizes.of ? 'lock your readings' : 'go on measuring',
      };
  }
}
