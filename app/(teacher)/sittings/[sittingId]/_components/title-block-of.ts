import type { TitleBlockCell } from '@/components/shell/title-block';
import { sayDay, sayDayOf } from '@/components/ui/days';
import type { MoveChoices } from '@/lib/contracts/moves';
import type { SittingView } from '@/lib/data/sittings/read-sitting';
import { sayMoved } from './moved-words';

export function sittingTitleBlock(sitting: SittingView, choices: MoveChoices): TitleBlockCell[] {
  const { students, publications, dueOn, today, timeZone, termName } = sitting;
  const current = students.filter((student) => student.current);
  const read = current.filter(({ progress }) => progress === 'read').length;
  const [latest] = publications;
  return [
    { label: 'due', value: dueOn ? sayDay(dueOn, today) : 'no day' },
    { label: 'read', value: `${read} of ${current.length}` },
    { label: 'term', value: termName },
    {
      label: 'published',
      value: latest
        ? `${sayDayOf(latest.publishedAt, timeZone)}${latest.number > 1 ? `, time ${latest.number}` : ''}`
        : 'not yet',
    },
    { label: 'rubric', value: sayMoved(choices), wide: true },
  ];
}
