'use client';

import { AXES } from '@/lib/scoring';
import { CellInput } from './cell-input';
import type { CutListRowProps, LineField } from './row-props';

interface LineCellProps {
  row: CutListRowProps;
  column: LineField;
  label: string;
}

const PLACEHOLDERS: Partial<Record<LineField, string>> = {
  note: 'note for the students',
  worth: 'as all',
  missing: 'as all',
};

/** One cell of one line, with the keys of the sheet. */
export function LineCell({ row, column, label }: LineCellProps) {
  const { line, index, unit, notes, keys } = row;
  const path = `lines.${index}.${column}`;
  const note = notes.find(({ field }) => field === column);
  return (
    <CellInput
      {...{ path, label }}
      text={line[column]}
      sizeIn={AXES.some((axis) => axis === column) ? unit : null}
      inHand={row.focused === column}
      refused={(note?.errors.length ?? 0) > 0}
      found={note?.found.some(({ isNote }) => !isNote) ?? false}
      noted={note !== undefined}
      isNote={column === 'note'}
      placeholder={PLACEHOLDERS[column]}
      onType={(text) => row.type(path, text)}
      onFocus={() => {
        row.setFocused(path);
        keys.onFocus(index, column, line[column]);
      }}
      onBlur={() => row.setFocused(null)}
      onKeyDown={(event) => keys.onKeyDown(event, index, column)}
      onPaste={(event) => keys.onPaste(event, index, column)}
    />
  );
}
