import { LengthText, SizeText } from '@/components/ui/fraction';
import { HazardSign } from '@/components/ui/refusal';
import { Heading } from '@/components/ui/titles';
import { COMES_FIRST } from '@/lib/practicals/cautions';
import type { Task } from '@/lib/practicals/task';

/** What a version asks for, and from which wood. */
export function VersionTask({ task }: { task: Task }) {
  const { blank, kerf, material, unit, instructions } = task;
  return (
    <section aria-labelledby="task-heading">
      <Heading id="task-heading">Task</Heading>
      <div className="mt-2 grid gap-x-12 gap-y-4 lg:grid-cols-[minmax(0,1fr)_20rem]">
        {instructions ? (
          <p className="max-w-[68ch] whitespace-pre-line">{instructions}</p>
        ) : (
          <p className="text-ink-2">No words were written for it.</p>
        )}
        <dl className="grid grid-cols-[auto_1fr] content-start gap-x-6 border-t border-hair [&>*]:border-b [&>*]:border-hair [&>*]:py-2 [&>dt]:text-ink-2">
          <dt>wood</dt>
          <dd>{material || 'not named'}</dd>
          <dt>blank</dt>
          <dd>{blank ? <SizeText {...blank} unit={unit} /> : 'not given'}</dd>
          <dt>kerf</dt>
          <dd>{kerf === null ? 'not given' : <LengthText ticks={kerf} unit={unit} withUnit />}</dd>
        </dl>
      </div>
      <p className="mt-3 text-label">
        <HazardSign className="mr-1.5" />
        {COMES_FIRST}
      </p>
    </section>
  );
}
