import { type DraftLine, SHEET_COLUMNS } from './draft';
import { isSame } from './share-unchanged';

/** A change of the list itself, with what it takes to take it back. */
export type LineChange =
  | { kind: 'add'; line: DraftLine }
  | { kind: 'copy'; line: DraftLine }
  | { kind: 'remove'; index: number; removed: readonly DraftLine[] }
  | { kind: 'move'; lineId: string; from: number; to: number }
  | { kind: 'paste'; before: readonly DraftLine[]; after: readonly DraftLine[] };

/** The lines with one moved to another place. Pure; an index that is none gives the same lines. */
export function moveLine(lines: readonly DraftLine[], from: number, to: number): DraftLine[] {
  const result = [...lines];
  const [line] = result.splice(from, 1);
  if (line) result.splice(to, 0, line);
  return result;
}

/**
 * Takes a change of the list back and leaves alone what was typed since: a cell typed over after a paste keeps what was
 * typed, a new line that something was typed into stays. Pure.
 *
 * @example undoLineChange([], { kind: 'remove', index: 0, removed: [base] }) // [base]
 */
export function undoLineChange(lines: readonly DraftLine[], change: LineChange): DraftLine[] {
  switch (change.kind) {
    case 'add':
    case 'copy':
      return lines.filter((line) => line.id !== change.line.id || !isSame(line, change.line));
    case 'remove':
      return [...lines.slice(0, change.index), ...change.removed, ...lines.slice(change.index)];
    case 'move': {
      const now = lines.findIndex(({ id }) => id === change.lineId);
      return now < 0 ? [...lines] : moveLine(lines, now, change.from);
    }
    case 'paste':
      return undoPaste(lines, change);
  }
}

function undoPaste(
  lines: readonly DraftLine[],
  { before, after }: Extract<LineChange, { kind: 'paste' }>,
): DraftLine[] {
  const old = new Map(before.map((line) => [line.id, line]));
  const pasted = new Map(after.map((line) => [line.id, line]));
  return lines.flatMap((line) => {
    const then = pasted.get(line.id);
    const earlier = old.get(line.id);
    if (!then) return [line];
    if (!earlier) return isSame(line, then) ? [] : [line];
    const back = SHEET_COLUMNS.filter((column) => line[column] === then[column]);
    return [{ ...line, ...Object.fromEntries(back.map((column) => [column, earlier[column]])) }];
  });
}

/** Whether nothing is typed in a line but the one piece that every new line begins with. */
export function isBlankLine(line: DraftLine): boolean {
  const { quantity, ...rest } = line;
  const texts = [rest.label, rest.thickness, rest.width, rest.length, rest.note, rest.worth, rest.missing];
  const own = Object.values(rest.sizes).some((rule) => rule !== null) || rest.checks !== null;
  return texts.every((text) => text.trim() === '') && !own && ['', '1'].includes(quantity.trim());
}
