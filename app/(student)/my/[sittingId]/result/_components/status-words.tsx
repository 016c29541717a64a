import { Verdict } from '@/components/ui/titles';
import type { OwnResultView } from '@/lib/data/own/read-result';

const WORDS: Record<OwnResultView['status'], { title: string; text: string }> = {
  scored: {
    title: 'Scored, without its sheet.',
    text: 'The score stands, but how it came about was not kept with it. Ask your teacher to publish it again.',
  },
  absent: {
    title: 'Absent.',
    text: 'You were marked absent when this was measured. There is no score, and that is not a zero.',
  },
  excused: {
    title: 'Excused.',
    text: 'This practical does not count for you or against you. There is no score.',
  },
  'not read': {
    title: 'Not read.',
    text: 'The bench has not measured all that your score needs. There is no score yet, and that is not a zero.',
  },
  zero: {
    title: 'Zero.',
    text: 'Your teacher gave a zero; it was not measured. Ask your teacher what it is for and whether you can still hand something in.',
  },
};

/** Why there is no measured score, in words: four different things. */
export function StatusWords({ status }: { status: OwnResultView['status'] }) {
  const { title, text } = WORDS[status];
  return (
    <div className="mt-3">
      <Verdict>{title}</Verdict>
      <p className="mt-1 max-w-[56ch]">{text}</p>
    </div>
  );
}
