import type { TitleBlockCell } from '@/components/shell/title-block';
import type { SharedVersionView } from '@/lib/data/department/read-shared-version';
import { LEAST_TOLD } from '@/lib/practicals/rubric-effect';
import { count } from '../../_components/words';

/** What the sheet rests on, in its corner. */
export function sharedTitleBlock({ lines, pieces, unit, sections }: SharedVersionView): TitleBlockCell[] {
  const few = sections.filter(({ effect }) => effect === null).length;
  const students = sections.reduce((sum, section) => sum + section.students, 0);
  return [
    { label: 'cut list', value: `${count(lines, 'line', 'lines')}, ${count(pieces, 'piece', 'pieces')}` },
    { label: 'unit', value: unit === 'in' ? 'inches' : 'millimetres' },
    { label: 'readings of', value: count(students, 'student', 'students') },
    { label: `groups under ${LEAST_TOLD}`, value: few === 0 ? 'none' : few },
  ];
}
