import type { Unit } from '@/lib/length';
import type { DraftLine } from '@/lib/practicals/draft';
import type { PlacedFinding } from '@/lib/practicals/place-findings';
import { AXES, type Axis } from '@/lib/scoring';
import type { Editor } from './editor-context';
import type { SheetDesk } from './sheet-desk';
import type { SheetKeys } from './sheet-keys';
import type { RowDragger } from './use-row-drag';

export const LINE_FIELDS = ['label', 'quantity', ...AXES, 'note', 'worth', 'missing'] as const;

export type LineField = (typeof LINE_FIELDS)[number];

export interface RowNote {
  field: string;
  path: string;
  errors: string[];
  found: PlacedFinding[];
}

export interface CutListRowProps {
  line: DraftLine;
  index: number;
  isLast: boolean;
  unit: Unit;
  notes: RowNote[];
  /** The field of this row that has the cursor. */
  focused: string | null;
  inHand: boolean;
  isDragged: boolean;
  /** What of this row is laid out below the sheet. */
  selected: Axis | 'checks' | 'line' | null;
  dearest: number;
  sheet: SheetDesk;
  keys: SheetKeys;
  dragger: RowDragger;
  select: Editor['select'];
  setFocused: Editor['setFocused'];
  type(path: string, text: string): void;
}

/** Whether a row would be drawn as it is. What a finding’s press does follows from what it says. */
export function isSameRow(before: CutListRowProps, after: CutListRowProps): boolean {
  const { notes, ...rest } = before;
  const { notes: notesAfter, ...restAfter } = after;
  return JSON.stringify(notes) === JSON.stringify(notesAfter) && shallowSame(rest, restAfter);
}

function shallowSame(a: object, b: object): boolean {
  const after = new Map(Object.entries(b));
  return Object.entries(a).every(([key, value]) => Object.is(value, after.get(key)));
}
