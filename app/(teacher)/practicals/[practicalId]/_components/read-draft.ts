import { type Length, parseLength, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import type { DraftLine, DraftSizeRule, PracticalDraft } from '@/lib/practicals/draft';
import { readSizeRule } from '@/lib/practicals/parse-size-rule';
import { AXES, type Axis } from '@/lib/scoring';

/** A typed size, or null while it cannot be read as one. */
export function readSize(text: string, unit: Unit): Length | null {
  const read = parseLength(text, unit);
  return read.ok && read.ticks > 0 ? read.ticks : null;
}

const SOME_SIZE = { in: 4 * TICKS_PER_INCH, mm: 100 * TICKS_PER_MM };

/** The target that a price is drawn for: the line's own, the first that can be read for all lines, else any. */
export function targetOf(draft: PracticalDraft, lineId: string | null, axis: Axis): Length {
  const lines = lineId === null ? draft.lines : draft.lines.filter(({ id }) => id === lineId);
  const sizes = lines.map((line) => readSize(line[axis], draft.unit));
  return sizes.find((size) => size !== null) ?? SOME_SIZE[draft.unit];
}

export function marginOf(draft: PracticalDraft): Length {
  const read = parseLength(draft.reading.margin, draft.unit);
  return read.ok && read.ticks >= 0 ? read.ticks : 0;
}

/** The three sizes of a line, once all can be read. */
export function sizesOf(line: DraftLine, unit: Unit): Record<Axis, Length> | null {
  const [thickness, width, length] = AXES.map((axis) => readSize(line[axis], unit));
  return thickness && width && length ? { thickness, width, length } : null;
}

/** The dearest price of the whole sheet, so that its stairs can be compared by eye. */
export function dearestOf(draft: PracticalDraft): number {
  const typed: (DraftSizeRule | null)[] = [draft.all, ...draft.lines].flatMap(({ sizes }) =>
    AXES.map((axis) => sizes[axis]),
  );
  const rules = typed.flatMap((rule) => (rule ? (readSizeRule(rule, draft.unit) ?? []) : []));
  return Math.max(0, ...rules.map(({ beyondOver, beyondUnder }) => Math.max(beyondOver, beyondUnder)));
}
