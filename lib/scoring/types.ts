import type { Length } from '@/lib/length';

/** Whole hundredths of a point: 1 point = 100. */
export type Points = number;

/** Length runs along the grain; width across it; thickness is the remaining one. */
export type Axis = 'thickness' | 'width' | 'length';

/** The order in which axes are laid out everywhere. */
export const AXES = ['thickness', 'width', 'length'] as const satisfies readonly Axis[];

/** A price step, inclusive: a deviation equal to `within` is in the band. */
export interface Band {
  within: Length;
  lose: Points;
}

/** What one dimension costs by deviation: bands a side, then the price past the last of them. */
export interface SizeRule {
  over: Band[];
  under: Band[];
  beyondOver: Points;
  beyondUnder: Points;
  cap: Points | null;
}

/** Something judged by level instead of measured; `assume` is the level of a check nobody recorded. */
export interface Check {
  id: string;
  label: string;
  levels: { label: string; lose: Points }[];
  assume: number | null;
}

/** One row of the cut list with its prices. */
export interface Line {
  id: string;
  label: string;
  quantity: number;
  target: Record<Axis, Length>;
  worth: Points;
  missing: Points;
  sizes: Record<Axis, SizeRule>;
  checks: Check[];
  swap: boolean;
  set: 'each' | 'worst';
}

/** The compiled price list of a practical. `unit` is how it is shown; it never changes a result. */
export interface Rubric {
  unit: 'in' | 'mm';
  basis: 'worth' | 'start';
  start: Points | null;
  outOf: Points | null;
  floor: number;
  roundTo: Points;
  readTo: Length | null;
  margin: Length;
  grossLimit: Length | null;
  lines: Line[];
  workChecks: Check[];
  late: { perDay: number; max: number } | null;
  ceiling: number;
}

export type Reading =
  | { kind: 'value'; ticks: Length }
  | { kind: 'gauged' }
  | { kind: 'spoiled' }
  | { kind: 'excused' };

export interface Piece {
  lineId: string;
  ordinal: number;
  state: 'present' | 'missing' | 'held' | 'excused';
  sizes: Partial<Record<Axis, Reading>>;
  checks: Record<string, number>;
}

/** What was recorded of one student's work. */
export interface Attempt {
  pieces: Piece[];
  work: Record<string, number>;
  bonus: Points;
  daysLate: number;
  adjust?: Record<string, Partial<Record<Axis, Length>>>;
}

export interface SizeSheet {
  reading: Length | null;
  used: Length | null;
  deviation: Length | null;
  band: number | 'beyond' | 'gauged' | 'spoiled' | 'excused' | 'unread';
  lose: Points;
}

export interface CheckSheet {
  id: string;
  level: number | null;
  lose: Points;
}

export interface PieceSheet {
  lineId: string;
  ordinal: number;
  state: Piece['state'] | 'unread';
  gross: boolean;
  swapped: boolean;
  sizes: Record<Axis, SizeSheet> | null;
  checks: CheckSheet[];
  uncapped: Points;
  lose: Points;
}

export interface Unread {
  lineId: string;
  ordinal: number;
  what: string;
}

export interface ScoreSheet {
  complete: boolean;
  unread: Unread[];
  possible: Points;
  lost: Points;
  raw: Points;
  total: Points;
  provisional: Points | null;
  score: Points | null;
  pieces: PieceSheet[];
  work: CheckSheet[];
}
