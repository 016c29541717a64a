import { OtherLength, OtherSize } from '@/components/other-unit/other-unit';
import { LengthText, SizeText } from '@/components/ui/fraction';
import { Heading } from '@/components/ui/titles';
import { countTask, type Task } from '@/lib/practicals/task';

/** What it is cut from, what a cut takes, and what the teacher wrote. */
export function StockOfTask({ task }: { task: Task }) {
  const { blank, kerf, material, unit, instructions } = task;
  const { pieces } = countTask(task);
  return (
    <section>
      <Heading className="border-b-outline border-ink pb-1">From one blank</Heading>
      <dl className="grid grid-cols-[auto_1fr] gap-x-6 [&>*]:border-b [&>*]:border-hair [&>*]:py-2 [&>dt]:text-ink-2">
        <dt>blank</dt>
        <dd>
          {blank ? <SizeText {...blank} unit={unit} /> : 'as your teacher gives it'}
          {material ? `, ${material}` : ''}
          {blank ? <OtherSize size={blank} unit={unit} className="block text-label" /> : null}
        </dd>
        <dt>pieces</dt>
        <dd>{pieces}</dd>
        <dt>kerf</dt>
        <dd>
          {kerf === null ? (
            'as the saw takes it'
          ) : (
            <>
              <LengthText ticks={kerf} unit={unit} withUnit /> at every cut: it comes out of the waste, not
              out of a piece
              <OtherLength ticks={kerf} unit={unit} className="block text-label" />
            </>
          )}
        </dd>
      </dl>
      {instructions ? <p className="mt-3 max-w-[62ch] whitespace-pre-line">{instructions}</p> : null}
    </section>
  );
}
