import type { TitleBlockCell } from '@/components/shell/title-block';
import { pointsAsText } from '@/components/ui/points-text';
import { possiblePoints } from '@/lib/practicals/both-scales';
import { countTask, type Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';

interface Titled {
  number: number;
  sittings: number;
  task: Task;
  rubric: Rubric;
}

const counted = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** What a version's sheet is about, in its corner. */
export function versionTitleBlock({ number, sittings, task, rubric }: Titled): TitleBlockCell[] {
  const worth = pointsAsText(possiblePoints(rubric));
  return [
    {
      label: 'cut list',
      value: `${counted(task.cutList.lines.length, 'line')}, ${counted(countTask(task).pieces, 'piece')}`,
    },
    {
      label: rubric.basis === 'start' ? 'starts from' : 'worth',
      value: rubric.outOf === null ? worth : `${worth}, scaled to ${pointsAsText(rubric.outOf)}`,
    },
    { label: 'rubric', value: `version ${number}, published` },
    { label: 'stands under', value: sittings === 0 ? 'no sitting' : counted(sittings, 'sitting') },
  ];
}
