import { parseLength, type Unit } from '@/lib/length';
import {
  type DraftLine,
  emptyLine,
  MOST_DRAFT_LINES,
  MOST_TYPED,
  SHEET_COLUMNS,
  type SheetColumn,
} from './draft';
import { type PastedColumn, type PastedTable, splitSizes } from './read-pasted';

export interface PastedRows {
  lines: DraftLine[];
  /** The ids of the lines that the rows went into, in their order. */
  into: string[];
  /** Rows past the last line a draft keeps, cells that no column was left for, and columns named otherwise. */
  leftOut: { rows: number; cells: number; columns: string[] };
  /** Cells of which only the beginning has room. */
  shortened: number;
}

const SIZES = ['thickness', 'width', 'length'] as const;

/** The cells of one row by the column each goes into; null where there is none. */
function placeCells(
  row: readonly string[],
  first: number,
  head: readonly PastedColumn[] | null,
  unit: Unit,
): [SheetColumn | null, string][] {
  let next = first;
  return row.flatMap((cell, index): [SheetColumn | null, string][] => {
    const text = cell.replace(/\s+/g, ' ').trim();
    const named = head?.[index];
    const column = head ? (named?.column ?? null) : (SHEET_COLUMNS[next] ?? null);
    const sizes = column === 'thickness' || column === 'sizes' ? splitSizes(text) : null;
    next += sizes ? 3 : 1;
    if (sizes) return SIZES.map((axis, place) => [axis, withUnit(sizes[place] ?? '', named, unit)]);
    if (column === 'sizes') return [['thickness', text]];
    return [[column, isSize(column) ? withUnit(text, named, unit) : text]];
  });
}

const isSize = (column: SheetColumn | null) => SIZES.some((axis) => axis === column);

/** A figure under a head that gives another unit than the practical’s says so itself from now on. */
function withUnit(text: string, column: PastedColumn | undefined, unit: Unit): string {
  if (!column?.unit || column.unit === unit) return text;
  const spelled = `${text} ${column.unit}`;
  const read = parseLength(text, unit);
  return read.ok && read.unit === unit && parseLength(spelled, unit).ok ? spelled : text;
}

/**
 * Lays a pasted table over a cut list, from one row and column on, or by the names in its own head: what was there is
 * overwritten, rows past the end become new lines. Cells are kept as they are written, good or bad; the draft says at
 * each what is wrong. What finds no place is counted, never dropped silently. Pure.
 *
 * @example pasteRows([], { row: 0, column: 'label' }, { head: null, rows: [['base', '1', '3/4', '4 1/2', '9']] }, 'in').lines.length // 1
 */
export function pasteRows(
  lines: readonly DraftLine[],
  at: { row: number; column: SheetColumn },
  { head, rows }: PastedTable,
  unit: Unit,
): PastedRows {
  const room = Math.max(0, MOST_DRAFT_LINES - at.row);
  const first = SHEET_COLUMNS.indexOf(at.column);
  const result = [...lines];
  const into: string[] = [];
  const count = { cells: 0, shortened: 0 };
  rows.slice(0, room).forEach((row, index) => {
    const line = { ...(result[at.row + index] ?? emptyLine(result)) };
    result[at.row + index] = line;
    into.push(line.id);
    for (const [column, text] of placeCells(row, first, head, unit)) {
      const most = column === 'note' ? MOST_TYPED.note : MOST_TYPED.cell;
      if (column) line[column] = text.slice(0, most);
      else if (text !== '' && !head) count.cells += 1;
      if (column && text.length > most) count.shortened += 1;
    }
  });
  const unnamed = (head ?? []).flatMap(({ column, name }) => (column === null && name !== '' ? [name] : []));
  return {
    lines: result,
    into,
    leftOut: { rows: Math.max(0, rows.length - room), cells: count.cells, columns: unnamed },
    shortened: count.shortened,
  };
}
