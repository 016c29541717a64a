import {
  columnFilteringFeature,
  createColumnHelper,
  createFilteredRowModel,
  createSortedRowModel,
  filterFn_includesString,
  globalFilteringFeature,
  rowSortingFeature,
  sortFn_basic,
  sortFn_text,
  tableFeatures,
} from '@tanstack/react-table';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { rosterName } from '../../../_components/names';
import { percentOf } from './cell-words';

export type GradebookStudent = GradebookView['students'][number];

export const features = tableFeatures({
  columnFilteringFeature,
  globalFilteringFeature,
  rowSortingFeature,
  filteredRowModel: createFilteredRowModel(),
  sortedRowModel: createSortedRowModel(),
  filterFns: { includesString: filterFn_includesString },
  sortFns: { text: sortFn_text, basic: sortFn_basic },
});

/** Student and ID come first. */
export const BEFORE_SITTINGS = 2;

const helper = createColumnHelper<typeof features, GradebookStudent>();

const NUMBER = {
  sortFn: 'basic',
  sortUndefined: 'last',
  sortDescFirst: true,
  enableGlobalFilter: false,
} as const;

/** Student, ID, one column a sitting, and the mean; whoever has no number stays last, whichever way it is sorted. */
export function columnsFor(sittings: GradebookView['sittings']) {
  return helper.columns([
    helper.accessor((student) => rosterName(student), { id: 'student', sortFn: 'text' }),
    helper.accessor((student) => student.localId ?? '', { id: 'localId', sortFn: 'text' }),
    ...sittings.map(({ sittingId }, index) =>
      helper.accessor((student) => percentOf(student.cells[index] ?? null) ?? undefined, {
        id: sittingId,
        ...NUMBER,
      }),
    ),
    helper.accessor((student) => student.mean ?? undefined, { id: 'mean', ...NUMBER }),
  ]);
}
