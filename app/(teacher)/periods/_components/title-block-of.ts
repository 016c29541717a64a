import type { TitleBlockCell } from '@/components/shell/title-block';
import type { SectionListView } from '@/lib/data/sections/list-sections';

export function periodsTitleBlock(sections: readonly SectionListView[]): TitleBlockCell[] {
  const students = sections.reduce((sum, { studentCount }) => sum + studentCount, 0);
  const open = sections.reduce((sum, { openSittings }) => sum + openSittings, 0);
  const terms = [...new Set(sections.map(({ termName }) => termName))];
  return [
    { label: 'term', value: terms.join(', '), wide: true },
    { label: 'sections', value: sections.length },
    { label: 'students', value: students },
    { label: 'sittings open', value: open, wide: true },
  ];
}
