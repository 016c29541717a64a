import type { ClipboardEvent, KeyboardEvent } from 'react';
import { isBlankLine } from '@/lib/practicals/line-changes';
import { focusCell, isSheetColumn, type SheetDesk } from './sheet-desk';

/** From left to right, as the arrow keys walk. */
const COLUMNS = ['number', 'label', 'quantity', 'thickness', 'width', 'length', 'note', 'worth', 'missing'];
const PAGE = 10;

type Cell = HTMLInputElement | HTMLButtonElement;

/** The keys of the sheet: how a row is walked, changed and given up. Knows the cell in hand and what it held. */
export class SheetKeys {
  private held = { row: -1, column: '', text: '' };
  /** Where Enter goes back to after Tabs: the column in which this row was begun. */
  private begun = { row: -1, column: 'label' };
  private tabbed = false;

  constructor(
    private readonly desk: SheetDesk,
    private readonly type: (row: number, column: string, text: string) => void,
  ) {}

  /** The last Escape’s cell holds what it held when it was entered. */
  onFocus(row: number, column: string, text: string): void {
    this.held = { row, column, text };
    if (!this.tabbed || this.begun.row !== row) this.begun = { row, column };
    this.tabbed = false;
  }

  onKeyDown(event: KeyboardEvent<Cell>, row: number, column: string): void {
    if (event.nativeEvent.isComposing) return;
    this.tabbed = event.key === 'Tab' && !event.shiftKey;
    const done = event.altKey
      ? this.withAlt(event, row, column)
      : event.ctrlKey || event.metaKey
        ? this.withControl(event, row, column)
        : this.plain(event, row, column);
    if (done) event.preventDefault();
  }

  onPaste(event: ClipboardEvent<Cell>, row: number, column: string): void {
    event.stopPropagation();
    const at = column === 'number' ? 'label' : column;
    if (isSheetColumn(at) && this.desk.paste(event.clipboardData.getData('text/plain'), row, at)) {
      event.preventDefault();
      focusCell(row, column);
    }
  }

  /** Alt changes the line: arrows move it, with Shift down copies it, Delete removes it. */
  private withAlt({ key, shiftKey }: KeyboardEvent, row: number, column: string): boolean {
    if (key === 'ArrowDown' && shiftKey) this.desk.copy(row, column);
    else if (key === 'ArrowUp' || key === 'ArrowDown') {
      this.desk.move(row, row + (key === 'ArrowDown' ? 1 : -1), column);
    } else if (key === 'Delete') this.desk.remove(row, column);
    else return false;
    return true;
  }

  private withControl(event: KeyboardEvent<Cell>, row: number, column: string): boolean {
    const { key, currentTarget } = event;
    if (key === 'Enter') {
      this.desk.add(row);
      return true;
    }
    if (key === 'ArrowUp' || key === 'ArrowDown') {
      return focusCell(key === 'ArrowUp' ? 0 : this.desk.lines.length - 1, column);
    }
    if (key.toLowerCase() !== 'z' || event.shiftKey) return false;
    const typedSince = currentTarget instanceof HTMLInputElement && currentTarget.value !== this.held.text;
    if (typedSince || !this.desk.undo()) return false;
    if (!document.activeElement?.closest('table'))
      focusCell(Math.min(row, this.desk.lines.length - 1), column);
    return true;
  }

  private plain(event: KeyboardEvent<Cell>, row: number, column: string): boolean {
    const { key, shiftKey, currentTarget: cell } = event;
    const last = this.desk.lines.length - 1;
    const line = this.desk.lines[row];
    switch (key) {
      case 'Enter':
        return cell instanceof HTMLInputElement && this.enter(row, column, shiftKey);
      case 'ArrowDown':
      case 'ArrowUp':
        focusCell(row + (key === 'ArrowDown' ? 1 : -1), column);
        return true;
      case 'PageDown':
      case 'PageUp':
        return focusCell(Math.max(0, Math.min(last, row + (key === 'PageDown' ? PAGE : -PAGE))), column);
      case 'ArrowLeft':
      case 'ArrowRight':
        return !shiftKey && this.sideways(cell, row, column, key === 'ArrowRight' ? 1 : -1);
      case 'F2':
        if (cell instanceof HTMLInputElement) cell.setSelectionRange(cell.value.length, cell.value.length);
        return true;
      case 'Escape':
        return this.giveBack(event, row, column);
      case 'Delete':
      case 'Backspace':
        if (column !== 'number' && !(line && isBlankLine(line))) return false;
        this.desk.remove(row, column);
        return true;
      default:
        return false;
    }
  }

  /** Down to where this row was begun; past the last row a new line begins. */
  private enter(row: number, column: string, up: boolean): boolean {
    const back = this.begun.row === row ? this.begun.column : column;
    if (focusCell(row + (up ? -1 : 1), back) || up) return true;
    const last = this.desk.lines[row];
    if (last && !isBlankLine(last)) this.desk.add(row, isSheetColumn(back) ? back : 'label');
    return true;
  }

  /** Beside, when the whole cell is in hand or the cursor stands at that end of it. */
  private sideways(cell: Cell, row: number, column: string, by: 1 | -1): boolean {
    if (cell instanceof HTMLInputElement) {
      const { selectionStart: from, selectionEnd: to, value } = cell;
      const whole = from === 0 && to === value.length;
      const atEnd = from === to && from === (by === 1 ? value.length : 0);
      if (!whole && !atEnd) return false;
    }
    const at = COLUMNS.indexOf(column);
    const beside = by === 1 ? COLUMNS.slice(at + 1) : COLUMNS.slice(0, at).reverse();
    return beside.some((each) => focusCell(row, each));
  }

  private giveBack(event: KeyboardEvent<Cell>, row: number, column: string): boolean {
    const { currentTarget: cell } = event;
    const { held } = this;
    if (!(cell instanceof HTMLInputElement) || held.row !== row || held.column !== column) return false;
    if (cell.value === held.text) return false;
    event.stopPropagation();
    this.type(row, column, held.text);
    requestAnimationFrame(() => cell.select());
    return true;
  }
}
