import { describe, expect, it } from 'vitest';
import { countLines } from '@/lib/practicals/count-lines';
import { type DraftLine, emptyLine } from '@/lib/practicals/draft';
import { isBlankLine, moveLine, undoLineChange } from '@/lib/practicals/line-changes';
import { pasteRows } from '@/lib/practicals/paste-rows';
import { reviewLabels } from '@/lib/practicals/review-labels';
import { isSame, shareDraft } from '@/lib/practicals/share-unchanged';
import { starterDraft } from '@/lib/practicals/starters';

const { lines } = starterDraft('bench-hook');
const idsOf = (list: readonly DraftLine[]) => list.map(({ id }) => id);
const typedInto = (list: readonly DraftLine[], index: number, cells: Partial<DraftLine>) =>
  list.map((line, at) => (at === index ? { ...line, ...cells } : line));

describe('a change of the cut list is taken back', () => {
  it('removed lines stand where they stood', () => {
    const removed = lines.slice(1, 3);
    const rest = lines.toSpliced(1, 2);
    expect(undoLineChange(rest, { kind: 'remove', index: 1, removed })).toEqual(lines);
  });

  it('a moved line goes back, whatever was typed since', () => {
    const moved = typedInto(moveLine(lines, 0, 2), 2, { width: '5' });
    expect(idsOf(moved)).toEqual(['hook', 'fence', 'base', 'guide']);
    const back = undoLineChange(moved, { kind: 'move', lineId: 'base', from: 0, to: 2 });
    expect(idsOf(back)).toEqual(idsOf(lines));
    expect(back[0]?.width).toBe('5');
    expect(moveLine(lines, 9, 0)).toEqual(lines);
  });

  it('a new line goes, unless something was typed into it', () => {
    const line = emptyLine(lines);
    const added = [...lines, line];
    expect(undoLineChange(added, { kind: 'add', line })).toEqual(lines);
    const typed = typedInto(added, 4, { label: 'stop' });
    expect(undoLineChange(typed, { kind: 'add', line })).toEqual(typed);
  });

  it('pasted cells give back what they covered, and cells typed over since stay', () => {
    const { lines: after } = pasteRows(
      lines,
      { row: 3, column: 'width' },
      { head: null, rows: [['1', '2'], ['3', '4'], ['5']] },
      'in',
    );
    const change = { kind: 'paste', before: lines, after } as const;
    expect(undoLineChange(after, change)).toEqual(lines);
    const typed = typedInto(typedInto(after, 3, { length: '9' }), 4, { label: 'stop' });
    const back = undoLineChange(typed, change);
    expect(back.map(({ width, length }) => [width, length]).slice(3)).toEqual([
      ['3/4', '9'],
      ['3', '4'],
    ]);
  });
});

it('knows a line that nothing was typed in', () => {
  expect(isBlankLine(emptyLine([]))).toBe(true);
  expect(isBlankLine({ ...emptyLine([]), quantity: ' ' })).toBe(true);
  for (const cells of [{ label: 'a' }, { quantity: '2' }, { note: 'x' }, { worth: '3' }, { checks: [] }]) {
    expect(isBlankLine({ ...emptyLine([]), ...cells })).toBe(false);
  }
});

it('says at a name that a line before has it too, and refuses neither', () => {
  const named = ['side', 'end', ' Side ', '', '', 'side'].map((label) => ({ ...emptyLine([]), label }));
  expect(reviewLabels(named).map(({ path, text }) => [path, text.slice(0, 6)])).toEqual([
    ['lines.2.label', 'Line 1'],
    ['lines.5.label', 'Line 1'],
  ]);
  expect(reviewLabels(lines)).toEqual([]);
});

it('counts pieces and sizes, and the lines whose pieces cannot be read', () => {
  expect(countLines(lines)).toEqual({ lines: 4, pieces: 5, sizes: 15, unread: 0 });
  expect(countLines(typedInto(lines, 3, { quantity: 'two' }))).toEqual({
    lines: 4,
    pieces: 3,
    sizes: 9,
    unread: 1,
  });
  expect(countLines([])).toEqual({ lines: 0, pieces: 0, sizes: 0, unread: 0 });
});

it('keeps the very same object of every part and line that says the same, wherever it was moved', () => {
  const before = starterDraft('bench-hook');
  const next = structuredClone({ ...before, lines: moveLine(before.lines, 0, 2) });
  Object.assign(next.lines[0] ?? {}, { width: '2' });
  next.all.worth = '6';
  const shared = shareDraft(before, next);
  expect(shared).toEqual(next);
  expect(shared.lines.map((line) => before.lines.includes(line))).toEqual([false, true, true, true]);
  expect([shared.all === before.all, shared.total === before.total]).toEqual([false, true]);
  expect(isSame({ a: [1, null] }, { a: [1, null] })).toBe(true);
  for (const [a, b] of [
    [{ a: 1 }, { a: 1, b: 2 }],
    [[1], [1, 2]],
    [null, {}],
    [[], {}],
    [{ a: undefined }, { b: undefined }],
  ]) {
    expect(isSame(a, b)).toBe(false);
  }
});
