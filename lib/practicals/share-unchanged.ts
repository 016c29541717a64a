import type { PracticalDraft } from './draft';

const isBag = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/** Whether two values of plain data say the same. */
export function isSame(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (Array.isArray(a) && Array.isArray(b)) {
    return a.length === b.length && a.every((each, index) => isSame(each, b[index]));
  }
  if (!isBag(a) || !isBag(b)) return false;
  const keys = Object.keys(a);
  return (
    keys.length === Object.keys(b).length &&
    keys.every((key) => Object.hasOwn(b, key) && isSame(a[key], b[key]))
  );
}

/** Lines are known again by their id, wherever they were moved. */
function shareLines<Line extends { id: string }>(before: readonly Line[], after: readonly Line[]): Line[] {
  const known = new Map(before.map((line) => [line.id, line]));
  return after.map((line) => {
    const same = known.get(line.id);
    return same !== undefined && isSame(same, line) ? same : line;
  });
}

/**
 * The next draft, in which every part and every line that says the same as before is the very same object, so that what
 * is drawn of it need not be drawn again. Says the same as `after`. Pure.
 *
 * @example shareDraft(before, structuredClone(before)).all === before.all // true
 */
export function shareDraft(before: PracticalDraft, after: PracticalDraft): PracticalDraft {
  const share = <T>(a: T, b: T): T => (isSame(a, b) ? a : b);
  return {
    ...after,
    lines: shareLines(before.lines, after.lines),
    blank: share(before.blank, after.blank),
    all: share(before.all, after.all),
    workChecks: share(before.workChecks, after.workChecks),
    total: share(before.total, after.total),
    reading: share(before.reading, after.reading),
    late: share(before.late, after.late),
    redo: share(before.redo, after.redo),
    prediction: share(before.prediction, after.prediction),
    presets: share(before.presets, after.presets),
  };
}
