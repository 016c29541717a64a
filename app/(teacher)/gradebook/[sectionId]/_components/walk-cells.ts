import type { KeyboardEvent } from 'react';

const STEPS: Record<string, [down: number, across: number]> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
};

/** Where a cell stands, for the walk. */
export function placeOf(row: number, column: number): string {
  return `${row} ${column}`;
}

/** Arrow keys walk from cell to cell of a table; where there is no cell they stop. */
export function walkCells(event: KeyboardEvent<HTMLElement>): void {
  const step = STEPS[event.key];
  const [row, column] = event.currentTarget.dataset.place?.split(' ').map(Number) ?? [];
  if (!step || row === undefined || column === undefined) return;
  const place = placeOf(row + step[0], column + step[1]);
  const next = event.currentTarget.closest('table')?.querySelector<HTMLElement>(`[data-place="${place}"]`);
  if (!next) return;
  event.preventDefault();
  next.focus();
}
