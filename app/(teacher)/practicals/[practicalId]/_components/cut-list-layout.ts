/** One grid for the head and all rows of the cut list; on narrow paper each line is a block of six columns. */
export const ROW =
  'grid grid-cols-6 gap-x-3 gap-y-2 lg:gap-x-2 lg:grid-cols-[2.375rem_minmax(6rem,1.5fr)_3.25rem_repeat(3,minmax(3.5rem,0.95fr))_repeat(2,minmax(3.25rem,0.7fr))_minmax(6.5rem,1.7fr)_repeat(3,4.25rem)]';

export const CELL = {
  number: 'col-span-1 lg:col-span-1',
  label: 'col-span-3 lg:col-span-1',
  quantity: 'col-span-2 lg:col-span-1',
  wide: 'col-span-2 lg:col-span-1',
  /** Below the part and its sizes; in the order of the keys it follows them. */
  note: 'col-span-6 lg:row-start-2 lg:col-start-2 lg:col-end-7',
  strip: 'col-span-6 lg:row-start-2 lg:col-start-7 lg:col-end-[-1]',
};

/** The first grid column of each field, for the note that hangs below it; the last ones hang from further left. */
export const NOTE_START: Record<string, string> = {
  label: 'lg:col-start-2',
  quantity: 'lg:col-start-3',
  thickness: 'lg:col-start-4',
  width: 'lg:col-start-5',
  length: 'lg:col-start-6',
  note: 'lg:col-start-2',
  worth: 'lg:col-start-7',
  missing: 'lg:col-start-8',
};
