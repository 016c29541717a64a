import type { TitleBlockCell } from '@/components/shell/title-block';
import type { VersionsComparison } from '@/lib/data/department/compare-versions';

/** The head’s first two questions with their answers, in the corner of the sheet. */
export function comparisonTitleBlock({ comparison, versions, unit }: VersionsComparison): TitleBlockCell[] {
  const samePrice = comparison.sizes.every(({ spans }) => spans.length === 0);
  return [
    { label: 'same task', value: 'yes, one cut list' },
    { label: 'same price', value: comparison.same ? 'yes' : samePrice ? 'of sizes, yes' : 'no' },
    { label: 'rubrics', value: versions.map(({ label }) => label).join(', '), wide: true },
    { label: 'unit', value: unit === 'in' ? 'inches' : 'millimetres' },
    { label: 'readings', value: 'not looked at here' },
  ];
}
