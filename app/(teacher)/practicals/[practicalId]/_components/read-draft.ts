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

/** The line that a price is drawn and tried for: its own, or of all lines the first that is priced so. */
export function exampleLineOf(draft: PracticalDraft, lineId: string | null, axis: Axis): DraftLine | null {
  const lines = draft.lines.filter(({ id, sizes }) =>
    lineId === null ? sizes[axis] === null : id === lineId,
  );
  return lines.find((line) => readSize(line[axis], draft.unit) !== null) ?? null;
}

/** The target that a price is drawn for: that line's, else any. */
export function targetOf(draft: PracticalDraft, lineId: string | null, axis: Axis): Length {
  const line = exampleLineOf(draft, lineId, axis) ?? draft.lines[0];
  return (line && readSize(line[axis], draft.unit)) ?? SOME_SIZE[draft.unit];
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
