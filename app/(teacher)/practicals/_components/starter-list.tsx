import { SizeText } from '@/components/ui/fraction';
import { Heading } from '@/components/ui/titles';
import { parseDraft } from '@/lib/practicals/parse-draft';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { listStarters, starterDraft } from '@/lib/practicals/starters';
import { countTask, type Task } from '@/lib/practicals/task';
import { copyStarterAction } from '../actions';
import { PressForm } from './press-form';
import { sayPieces } from './say-pieces';
import { TaskDrawing } from './task-drawing';

/** The six practicals that come with the product, each to be copied and made one’s own. */
export function StarterList({ heading }: { heading: string }) {
  return (
    <section aria-labelledby="starters-heading">
      <Heading id="starters-heading">{heading}</Heading>
      <ul className="mt-3 grid gap-x-8 sm:grid-cols-2 xl:grid-cols-3">
        {listStarters().map(({ id, about }) => {
          const read = parseDraft(starterDraft(id));
          return read.ok ? <Starter key={id} id={id} about={about} task={read.task} /> : null;
        })}
      </ul>
    </section>
  );
}

function Starter({ id, about, task }: { id: StarterId; about: string; task: Task }) {
  return (
    <li className="grid grid-cols-[9rem_minmax(0,1fr)] gap-4 border-t border-hair py-4">
      <TaskDrawing task={task} />
      <div className="grid content-start gap-2">
        <h3 className="font-title text-[1.25rem] leading-6 font-[620]">{task.title}</h3>
        <p>{about}</p>
        <p className="text-label text-ink-2">
          {task.material} {task.blank ? <SizeText {...task.blank} unit={task.unit} /> : null}{' '}
          {task.unit === 'in' ? 'in' : 'mm'}
          <span className="block">{sayPieces(task.cutList.lines.length, countTask(task).pieces)}</span>
        </p>
        <PressForm
          action={copyStarterAction}
          fields={{ starter: id }}
          label="copy it"
          fullLabel={`copy the starter ${task.title}`}
        />
      </div>
    </li>
  );
}
