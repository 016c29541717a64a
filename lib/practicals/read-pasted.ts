import type { Unit } from '@/lib/length';
import { SHEET_COLUMNS, type SheetColumn } from './draft';

/** What a column of a pasted table holds: one of the cut list's own, all three sizes in one cell, or what has no place. */
export interface PastedColumn {
  column: SheetColumn | 'sizes' | null;
  /** As the table's own head calls it. */
  name: string;
  /** The unit that the head gives, for figures that give none. */
  unit: Unit | null;
}

export interface PastedTable {
  /** The table's own head, when its first row is one. */
  head: PastedColumn[] | null;
  rows: string[][];
}

const NAMES: Record<SheetColumn | 'sizes', readonly string[]> = {
  label: ['part', 'parts', 'part name', 'name', 'label', 'component', 'description', 'item'],
  quantity: ['pieces', 'piece', 'pcs', 'pc', 'qty', 'quantity', 'count', 'how many'],
  thickness: ['thickness', 'thick', 'thk', 't'],
  width: ['width', 'wide', 'w'],
  length: ['length', 'long', 'len', 'l'],
  note: ['note', 'notes', 'remark', 'remarks', 'comment', 'comments'],
  sizes: ['size', 'sizes', 'dimensions', 't x w x l', 't × w × l'],
};

const UNITS: [Unit, RegExp][] = [
  ['mm', /[\s,]*[([]?\b(?:mm|millimetres?|millimeters?)[)\]]?$/],
  ['in', /[\s,]*[([]?(?:\b(?:in|inch|inches)\b\.?|")[)\]]?$/],
];

function readHead(cell: string): PastedColumn {
  const plain = cell.trim().toLowerCase();
  const found = UNITS.find(([, pattern]) => pattern.test(plain));
  const bare = (found ? plain.replace(found[1], '') : plain).replace(/[.:]+$/, '').trim();
  const column = [...SHEET_COLUMNS, 'sizes' as const].find((each) => NAMES[each].includes(bare)) ?? null;
  return { column, name: cell.trim(), unit: column === null ? null : (found?.[0] ?? null) };
}

/** Two names of columns make a head; so does a single one that stands over the column pasted into. */
function headOf(row: readonly string[], at: SheetColumn): PastedColumn[] | null {
  const head = row.map(readHead);
  const known = head.flatMap(({ column }) => column ?? []);
  const filled = row.filter((cell) => cell.trim() !== '').length;
  const distinct = new Set(known).size === known.length;
  const single = filled === 1 && known[0] === at;
  return distinct && (known.length >= 2 || single) ? head : null;
}

/** Parts a text into rows and cells, quotes minded; reading files is not a rule of cut lists. */
type SplitCells = (text: string, delimiter: string) => string[][];

/** Semicolons or commas part cells where most rows have at least three of them; a comma alone is a decimal sign. */
function delimiterOf(text: string, split: SplitCells): string | null {
  if (text.includes('\t')) return '\t';
  const parts = (delimiter: string) => {
    const rows = split(text, delimiter);
    return rows.filter((row) => row.length >= 3).length * 2 > rows.length;
  };
  return [';', ','].find(parts) ?? null;
}

/** `3/4 x 4-1/2 x 9` as its three sizes, null for anything else. */
export function splitSizes(text: string): [thickness: string, width: string, length: string] | null {
  const parts = text.split(/\s*[x×*]\s*|\s+by\s+/i).map((part) => part.trim());
  const [thickness = '', width = '', length = ''] = parts;
  return parts.length === 3 && parts.every((part) => /\d/.test(part)) ? [thickness, width, length] : null;
}

/**
 * The rows of a spreadsheet, or of a file of tabs, semicolons or commas, as text from the clipboard. Null where the
 * text is no table but plain text for the one cell it is pasted into. Cells are kept as they are written. Pure.
 *
 * @example readPasted('part\tlength\nbase\t9', 'label', splitCells)?.rows // [['base', '9']]
 */
export function readPasted(text: string, at: SheetColumn, split: SplitCells): PastedTable | null {
  const trimmed = text.replace(/^[\r\n]+|[\s]+$/g, '');
  const sizes = at === 'thickness' && splitSizes(trimmed) !== null;
  const lines = trimmed.split(/\r\n?|\n/);
  const delimiter =
    at === 'note' && lines.length === 1 && !trimmed.includes('\t') ? null : delimiterOf(trimmed, split);
  if (delimiter === null && lines.length < 2 && !sizes) return null;
  const rows = delimiter === null ? lines.map((line) => [line]) : split(trimmed, delimiter);
  const filled = rows.filter((row) => row.some((cell) => cell.trim() !== ''));
  const [first = []] = filled;
  const head = filled.length > 1 ? headOf(first, at) : null;
  return { head, rows: head ? filled.slice(1) : filled };
}
