import { PieceFace } from '@/components/part/piece-face';
import { countTask, type Task } from '@/lib/practicals/task';

const ROOM = { width: 132, height: 76, gap: 5 };
const SLIMMEST = 9;

/** All pieces of a task in a row, on one scale. */
export function TaskDrawing({ task }: { task: Task }) {
  const { lines } = task.cutList;
  const { pieces } = countTask(task);
  const free = ROOM.width - pieces * ROOM.gap;
  const across = lines.reduce((sum, { quantity, target }) => sum + quantity * target.width, 0);
  const tallest = Math.max(...lines.map(({ target }) => target.length));
  const scale = Math.min(ROOM.height / tallest, Math.max(free, pieces * SLIMMEST) / across);
  return (
    <div aria-hidden className="flex items-end self-start border-b-outline border-ink" style={{ gap: 1 }}>
      {lines.flatMap(({ id, quantity, target }) =>
        Array.from({ length: quantity }, (_, index) => (
          <PieceFace key={`${id}-${index.toString()}`} size={target} scale={scale} />
        )),
      )}
    </div>
  );
}
