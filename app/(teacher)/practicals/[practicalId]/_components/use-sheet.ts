'use client';

import Papa from 'papaparse';
import { type ClipboardEvent, type KeyboardEvent, useState } from 'react';
import { flushSync } from 'react-dom';
import { type DraftLine, emptyLine } from '@/lib/practicals/draft';
import { pasteRows, SHEET_COLUMNS, type SheetColumn } from '@/lib/practicals/paste-rows';
import { fieldId, useEditor } from './editor-context';

export interface Removed {
  line: DraftLine;
  index: number;
}

function focusCell(row: number, column: string): boolean {
  const cell = document.getElementById(fieldId(`lines.${row}.${column}`));
  cell?.focus();
  return cell !== null;
}

function isColumn(column: string): column is SheetColumn {
  return SHEET_COLUMNS.some((each) => each === column);
}

/** The cut list as a sheet: Enter and arrows walk, the last Enter adds a line, rows are pasted, moved and removed. */
export function useSheet() {
  const { desk, selection, select } = useEditor();
  const [removed, setRemoved] = useState<Removed | null>(null);
  const [said, setSaid] = useState('');
  const { lines } = desk.draft;

  function addLine() {
    flushSync(() => desk.edit((draft) => void draft.lines.push(emptyLine(draft.lines))));
    focusCell(lines.length, 'label');
  }

  function moveLine(row: number, by: number, column: string) {
    const to = row + by;
    if (to < 0 || to >= lines.length) return;
    flushSync(() =>
      desk.edit((draft) => {
        draft.lines.splice(to, 0, ...draft.lines.splice(row, 1));
      }),
    );
    focusCell(to, column);
    setSaid(`${lines[row]?.label || 'the line'} is line ${to + 1} now`);
  }

  function removeLine(index: number) {
    const line = lines[index];
    if (!line) return;
    desk.edit((draft) => void draft.lines.splice(index, 1));
    setRemoved({ line, index });
    if ('lineId' in selection && selection.lineId === line.id) {
      select({ kind: 'size', lineId: null, axis: 'length' });
    }
  }

  function undoRemove() {
    if (!removed) return;
    desk.edit((draft) => void draft.lines.splice(removed.index, 0, removed.line));
    setRemoved(null);
  }

  function onKeyDown(event: KeyboardEvent<HTMLInputElement>, row: number, column: string) {
    const down = event.key === 'ArrowDown' || (event.key === 'Enter' && !event.shiftKey);
    const up = event.key === 'ArrowUp' || (event.key === 'Enter' && event.shiftKey);
    if ((!down && !up) || event.nativeEvent.isComposing) return;
    event.preventDefault();
    if (event.altKey) moveLine(row, down ? 1 : -1, column);
    else if (!focusCell(row + (down ? 1 : -1), column) && event.key === 'Enter' && down) addLine();
  }

  function onPaste(event: ClipboardEvent<HTMLInputElement>, row: number, column: string) {
    const text = event.clipboardData.getData('text/plain');
    if (!isColumn(column) || !/[\t\n]/.test(text.trim())) return;
    event.preventDefault();
    const cells = Papa.parse<string[]>(text, { delimiter: '\t', skipEmptyLines: 'greedy' }).data;
    const { lines: pasted, leftOut } = pasteRows(lines, { row, column }, cells);
    desk.edit((draft) => {
      draft.lines = pasted;
    });
    setSaid(pasteWords(cells.length, leftOut));
  }

  return { lines, addLine, removeLine, undoRemove, moveLine, removed, said, onKeyDown, onPaste };
}

export type Sheet = ReturnType<typeof useSheet>;

function pasteWords(rows: number, { rows: noRoom, cells }: { rows: number; cells: number }): string {
  const pasted = `${rows - noRoom} ${rows - noRoom === 1 ? 'row' : 'rows'} pasted`;
  const left = [
    noRoom > 0 ? `${noRoom} rows left out: a cut list has at most 200 lines` : '',
    cells > 0 ? `${cells} cells left out: no column for them, or too long` : '',
  ].filter(Boolean);
  return [pasted, ...left].join('. ');
}
