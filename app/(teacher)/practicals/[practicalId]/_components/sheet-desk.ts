import { flushSync } from 'react-dom';
import { splitCells } from '@/lib/csv/split-cells';
import type { Unit } from '@/lib/length';
import {
  type DraftLine,
  emptyLine,
  freshId,
  MOST_DRAFT_LINES,
  type PracticalDraft,
  SHEET_COLUMNS,
  type SheetColumn,
} from '@/lib/practicals/draft';
import { isBlankLine, type LineChange, moveLine, undoLineChange } from '@/lib/practicals/line-changes';
import { MOST_LINES } from '@/lib/practicals/parse-draft';
import { pasteRows } from '@/lib/practicals/paste-rows';
import { readPasted } from '@/lib/practicals/read-pasted';
import { fieldId } from './editor-context';
import { pasteWords } from './paste-words';

/** What was done last to the list, in words, and whether there is something to take back. */
export interface SheetSaid {
  text: string;
  canUndo: boolean;
}

interface Connections {
  unit: Unit;
  now(): PracticalDraft;
  edit(change: (draft: PracticalDraft) => void): void;
  /** Lines that were not typed here are judged whole at once, empty fields and all. */
  judge(lineIds: readonly string[]): void;
  show(said: SheetSaid): void;
}

const NO_ROOM = `A draft keeps at most ${MOST_DRAFT_LINES} lines.`;

export const nameOf = (line: DraftLine | undefined, index: number) =>
  line?.label.trim() || `line ${index + 1}`;

/** The cells of a row that can take the focus; `number` is the key at its head. */
export function focusCell(row: number, column: string): boolean {
  const cell = document.getElementById(fieldId(`lines.${row}.${column}`));
  cell?.focus();
  return cell !== null;
}

/** Changes the cut list as a list: adds, copies, removes, moves and pastes lines, and takes each back. */
export class SheetDesk {
  private readonly done: { change: LineChange; said: string }[] = [];

  constructor(private readonly to: Connections) {}

  get lines(): readonly DraftLine[] {
    return this.to.now().lines;
  }

  say(text: string): void {
    this.to.show({ text, canUndo: this.done.length > 0 });
  }

  /** Adds a line below a row, or below the last one, with the cursor in it. */
  add(below = this.lines.length - 1, column = 'label'): void {
    if (this.isFull()) return;
    const line = emptyLine(this.lines);
    this.put(this.lines.toSpliced(below + 1, 0, line), { kind: 'add', line }, `line ${below + 2} added`);
    focusCell(below + 1, column);
  }

  copy(row: number, column = 'label'): void {
    const original = this.lines[row];
    if (!original || this.isFull()) return;
    const line = { ...structuredClone(original), id: freshId('line', this.lines) };
    const said = `${nameOf(original, row)} copied into line ${row + 2}`;
    this.put(this.lines.toSpliced(row + 1, 0, line), { kind: 'copy', line }, said);
    focusCell(row + 1, column);
  }

  remove(row: number, column = 'label'): void {
    const line = this.lines[row];
    if (!line) return;
    const said = `${isBlankLine(line) ? 'empty line' : nameOf(line, row)} removed`;
    this.put(this.lines.toSpliced(row, 1), { kind: 'remove', index: row, removed: [line] }, said);
    focusCell(Math.min(row, this.lines.length - 1), column) || focusCell(this.lines.length - 1, 'number');
  }

  /** Removes what stands past the last line that a rubric can have. */
  removeRest(): void {
    const removed = this.lines.slice(MOST_LINES);
    const said = `lines ${MOST_LINES + 1} to ${this.lines.length} removed`;
    this.put(this.lines.slice(0, MOST_LINES), { kind: 'remove', index: MOST_LINES, removed }, said);
  }

  move(from: number, to: number, column: string | null): void {
    const line = this.lines[from];
    if (!line || from === to || to < 0 || to >= this.lines.length) return;
    const change = { kind: 'move', lineId: line.id, from, to } as const;
    this.put(moveLine(this.lines, from, to), change, `${nameOf(line, from)} is line ${to + 1} now`);
    if (column !== null) focusCell(to, column);
  }

  /** Lays a pasted table over the list from a cell on; false when the text is no table. */
  paste(text: string, row: number, column: SheetColumn): boolean {
    const table = readPasted(text, column, splitCells);
    if (!table) return false;
    const before = this.lines;
    const pasted = pasteRows(before, { row, column }, table, this.to.unit);
    this.to.judge(pasted.into);
    this.put(
      pasted.lines,
      { kind: 'paste', before, after: pasted.lines },
      pasteWords(pasted, table.rows.length, row),
    );
    return true;
  }

  /** Where a paste that meant no cell goes: behind the last line that something is typed in. */
  pasteAtEnd(text: string): boolean {
    const last = this.lines.findLastIndex((line) => !isBlankLine(line));
    return this.paste(text, last + 1, 'label');
  }

  /** Takes the last change of the list back; false when there is none. */
  undo(): boolean {
    const last = this.done.pop();
    if (!last) return false;
    const { change, said } = last;
    const lines = undoLineChange(this.lines, change);
    flushSync(() => this.to.edit((draft) => Object.assign(draft, { lines: structuredClone(lines) })));
    this.say(`taken back: ${said}`);
    if (change.kind === 'remove') focusCell(change.index, 'label');
    else if (change.kind === 'move') focusCell(change.from, 'label');
    return true;
  }

  private isFull(): boolean {
    const full = this.lines.length >= MOST_DRAFT_LINES;
    if (full) this.say(NO_ROOM);
    return full;
  }

  private put(lines: readonly DraftLine[], change: LineChange, said: string): void {
    const kept = structuredClone(change);
    flushSync(() => this.to.edit((draft) => Object.assign(draft, { lines: structuredClone(lines) })));
    this.done.push({ change: kept, said });
    this.say(said);
  }
}

export function isSheetColumn(column: string): column is SheetColumn {
  return SHEET_COLUMNS.some((each) => each === column);
}
