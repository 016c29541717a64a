import { type DraftLine, emptyLine } from './draft';

/** The columns of a cut list in the order they stand and are pasted in. */
export const SHEET_COLUMNS = ['label', 'quantity', 'thickness', 'width', 'length', 'note'] as const;

export type SheetColumn = (typeof SHEET_COLUMNS)[number];

const LONGEST_CELL = 120;
const MOST_LINES = 400;

export interface PastedRows {
  lines: DraftLine[];
  /** Rows for which there was no room, and cells that had no column or were too long. */
  leftOut: { rows: number; cells: number };
}

/**
 * Lays the cells of a spreadsheet over a cut list, from one row and column on: what was there is overwritten, rows
 * past the end become new lines, empty rows are passed over. Cells are kept as they are, good or bad; the draft
 * says at each what is wrong. What finds no place is counted, never dropped silently. Pure.
 *
 * @example pasteRows([], { row: 0, column: 'label' }, [['base', '1', '3/4', '4 1/2', '9']]).lines.length // 1
 */
export function pasteRows(
  lines: readonly DraftLine[],
  at: { row: number; column: SheetColumn },
  cells: readonly (readonly string[])[],
): PastedRows {
  const rows = cells.filter((row) => row.some((cell) => cell.trim() !== ''));
  const first = SHEET_COLUMNS.indexOf(at.column);
  const result = lines.map((line) => ({ ...line }));
  const leftOut = { rows: 0, cells: 0 };
  rows.forEach((row, index) => {
    const place = at.row + index;
    if (place >= MOST_LINES) {
      leftOut.rows += 1;
      return;
    }
    const line = result[place] ?? emptyLine(result);
    result[place] = line;
    row.forEach((cell, offset) => {
      const column = SHEET_COLUMNS[first + offset];
      const text = cell.trim();
      if (column && text.length <= LONGEST_CELL) line[column] = text;
      else if (text !== '') leftOut.cells += 1;
    });
  });
  return { lines: result, leftOut };
}
