'use client';

import { createContext, type ReactNode, useContext } from 'react';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import type { Unit } from '@/lib/length';
import type { DraftLine, PracticalDraft } from '@/lib/practicals/draft';
import type { ParsedDraft } from '@/lib/practicals/parse-draft';
import type { PlacedFinding } from '@/lib/practicals/place-findings';
import { AXES, type Axis } from '@/lib/scoring';
import type { DraftDesk } from './use-draft';

/** What the lower half of the sheet is about; a line of null is all lines. */
export type Selection =
  | { kind: 'size'; lineId: string | null; axis: Axis }
  | { kind: 'checks'; lineId: string | null }
  | { kind: 'line'; lineId: string };

export interface Editor {
  practicalId: string;
  desk: DraftDesk;
  /** The draft that `parsed` and `findings` are about: a moment behind while one types fast. */
  settled: PracticalDraft;
  unit: Unit;
  parsed: ParsedDraft;
  latest: PracticalView['latest'];
  findings: readonly PlacedFinding[];
  /** The field in hand: it is not refused before it is left. */
  focused: string | null;
  setFocused(path: string | null): void;
  /** The line whose row is in hand: it is drawn, and stays so until another is taken up. */
  lineInHand: string | null;
  /** Lines that were pasted are judged whole, empty fields too, as soon as they are not in hand. */
  judge(lineIds: readonly string[]): void;
  /** What is shown as wrong with a field now; empty fields are refused once publishing was tried. */
  errorsAt(path: string): string[];
  selection: Selection;
  select(selection: Selection): void;
}

const Context = createContext<Editor | null>(null);

export function EditorProvider({ value, children }: { value: Editor; children: ReactNode }) {
  return <Context value={value}>{children}</Context>;
}

export function useEditor(): Editor {
  const editor = useContext(Context);
  if (!editor) throw new Error('This belongs inside the editor.');
  return editor;
}

/** A line with its place, by id; a selection may outlive the line it named. */
export function lineOf(
  lines: readonly DraftLine[],
  lineId: string | null,
): { line: DraftLine; index: number } | null {
  const index = lines.findIndex(({ id }) => id === lineId);
  const line = lines[index];
  return line ? { line, index } : null;
}

/** The id of the control that types into a path of the draft. */
export function fieldId(path: string): string {
  return `field-${path.replaceAll('.', '-')}`;
}

/** What must lie open below the cut list for a field to be in sight; null for one that always is. */
export function selectionOf(path: string, draft: PracticalDraft): Selection | null {
  const [list, part, ofAll, ofLine] = path.split('.');
  const line = list === 'lines' ? draft.lines[Number(part)] : null;
  if (list !== 'all' && !line) return null;
  const lineId = line?.id ?? null;
  const [what, axis] = line ? [ofAll, ofLine] : [part, ofAll];
  if (what === 'checks') return { kind: 'checks', lineId };
  const priced = AXES.find((each) => each === axis);
  if (what === 'sizes' && priced) return { kind: 'size', lineId, axis: priced };
  return what === 'note' && lineId ? { kind: 'line', lineId } : null;
}
