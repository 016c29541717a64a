import { pointsAsText } from '@/components/ui/points-text';
import type { GradebookCell, GradebookView } from '@/lib/contracts/gradebook';
import { count } from '../../../_components/names';

/** The word that stands where there is no number; null where there is one. */
export function wordOf(cell: GradebookCell | null): string | null {
  if (cell === null) return 'not given';
  if (cell.status === 'conflict') return 'two readings';
  return cell.score === null ? cell.status : null;
}

/** What stands small beside a number. */
export function notesOf(cell: GradebookCell): string[] {
  const notes = [
    cell.notArrived > 0 ? `${cell.notArrived} not sent` : null,
    cell.held > 0 ? `${cell.held} held` : null,
    cell.missing > 0 ? `${cell.missing} missing` : null,
    cell.daysLate > 0 ? `${count(cell.daysLate, 'day', 'days')} late` : null,
    cell.changed ? 'changed since' : null,
    cell.status === 'reading' && cell.held === 0 ? 'begun' : null,
  ];
  return notes.filter((note) => note !== null);
}

/** Everything of a cell, for those who hear it; `whose` is the student and the practical. */
export function cellSaid(whose: string, cell: GradebookCell): string {
  const number =
    cell.score === null
      ? wordOf(cell)
      : `${pointsAsText(cell.score)}${cell.published ? ', published' : ', still being recorded'}`;
  const attempt = cell.attemptNumber > 1 ? [`attempt ${cell.attemptNumber}`] : [];
  const zero = cell.status === 'zero' ? ['a zero'] : [];
  return [whose, number, ...zero, ...attempt, ...notesOf(cell)].join(', ');
}

/** A score as whole percent of its total, for pictures. */
export function percentOf(cell: GradebookCell | null): number | null {
  if (cell === null || cell.score === null || cell.total === 0) return null;
  return (cell.score * 100) / cell.total;
}

/** Every score of a gradebook in percent. */
export function percentsOf({ students }: GradebookView): number[] {
  return students.flatMap(({ cells }) => cells.flatMap((cell) => percentOf(cell) ?? []));
}

/** Tenths of a percent: 857 gives `85.7`. */
export function tenthsAsText(tenths: number): string {
  return `${Math.floor(tenths / 10)}.${tenths % 10}`;
}

export const SHOWN = [
  'everyone',
  'not read',
  'two readings',
  'absent',
  'excused',
  'zero',
  'late',
  'a redo',
  'changed since',
] as const;

export type Shown = (typeof SHOWN)[number];

/** Whether a row has what the filter asks for in any of its cells. */
export function isShown(cells: readonly (GradebookCell | null)[], shown: Shown): boolean {
  return shown === 'everyone' || cells.some((cell) => cell !== null && has(cell, shown));
}

function has(cell: GradebookCell, shown: Shown): boolean {
  switch (shown) {
    case 'not read':
      return cell.status === 'not read' || cell.status === 'reading';
    case 'two readings':
      return cell.status === 'conflict';
    case 'late':
      return cell.daysLate > 0;
    case 'a redo':
      return cell.attemptNumber > 1;
    case 'changed since':
      return cell.changed;
    default:
      return cell.status === shown;
  }
}
