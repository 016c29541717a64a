import type { TitleBlockCell } from '@/components/shell/title-block';
import { SizeText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import type { PracticalDraft } from '@/lib/practicals/draft';
import type { ParsedDraft } from '@/lib/practicals/parse-draft';
import { sameInEffect } from '@/lib/practicals/same-in-effect';
import { countTask } from '@/lib/practicals/task';

const plural = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** What this sheet is about, in its corner. */
export function titleBlockOf(
  view: PracticalView,
  parsed: ParsedDraft,
  draft: PracticalDraft,
): TitleBlockCell[] {
  const { latest } = view;
  if (!parsed.ok) {
    return [
      { label: 'cut list', value: plural(draft.lines.length, 'line') },
      { label: 'not readable yet', value: plural(Object.keys(parsed.errors).length, 'field') },
      { label: 'rubric', value: `version ${(latest?.number ?? 0) + 1}, draft`, wide: true },
    ];
  }
  const { task, rubric } = parsed;
  const worth = rubric.start ?? rubric.lines.reduce((sum, line) => sum + line.worth * line.quantity, 0);
  const state = latest && sameInEffect(latest, parsed) ? `version ${latest.number}, published` : null;
  return [
    {
      label: 'cut list',
      value: `${plural(task.cutList.lines.length, 'line')}, ${plural(countTask(task).pieces, 'piece')}`,
    },
    {
      label: 'worth',
      value:
        rubric.outOf === null
          ? pointsAsText(worth)
          : `${pointsAsText(worth)}, scaled to ${pointsAsText(rubric.outOf)}`,
    },
    {
      label: 'blank',
      value: task.blank ? (
        <>
          {task.material} <SizeText {...task.blank} unit={task.unit} />
        </>
      ) : (
        task.material || 'not given'
      ),
    },
    { label: 'rubric', value: state ?? `version ${(latest?.number ?? 0) + 1}, draft` },
  ];
}
