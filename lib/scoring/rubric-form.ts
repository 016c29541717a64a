import type { Length, Unit } from '@/lib/length';
import type { Axis, Check, Points, Rubric, SizeRule } from './types';

export interface CutListLine {
  id: string;
  label: string;
  quantity: number;
  target: Record<Axis, Length>;
}

export interface CutList {
  lines: CutListLine[];
}

/** Shortcuts a teacher used; recorded for the reader, without effect on the compiled rubric. */
export const PRESET_IDS = [
  'undersize-doubles',
  'oversize-doubles',
  'start-from-100',
  'rate-per-step',
] as const;

export type PresetId = (typeof PRESET_IDS)[number];

/** What holds for every line that has no exception. `missing` null: the worth. */
export interface LineDefaults {
  worth: Points;
  missing: Points | null;
  sizes: Record<Axis, SizeRule>;
  checks: Check[];
  swap: boolean;
  set: 'each' | 'worst';
}

/** What one line has otherwise; an axis that is not named is priced as all lines are. */
export type LineException = Partial<Omit<LineDefaults, 'sizes'>> & {
  sizes?: Partial<Record<Axis, SizeRule>>;
};

/** How the scores of several attempts become one. */
export type RedoPolicy =
  | { kind: 'higher' | 'latest'; capPercent: number }
  | { kind: 'average'; roundTo: Points };

export interface Share {
  num: number;
  den: number;
}

/** What a student's own readings must reach to earn the bonus. */
export interface PredictionPolicy {
  agreeWithin: Length;
  agreeShare: Share;
  caughtShare: Share;
  valueShare: Share;
  full: Points;
  closeWithin: Points;
  close: Points;
}

export interface Policies {
  late: Rubric['late'];
  redo: RedoPolicy;
  prediction: PredictionPolicy;
}

/** The rubric as a teacher authors it: what is stored, versioned, exported and imported. */
export interface RubricForm {
  format: 1;
  unit: Unit;
  basis: Rubric['basis'];
  start: Points | null;
  outOf: Points | null;
  floor: number;
  roundTo: Points;
  readTo: Length | null;
  margin: Length;
  grossLimit: Length | null;
  ceiling: number;
  presets: PresetId[];
  defaults: LineDefaults;
  exceptions: Record<string, LineException>;
  workChecks: Check[];
  policies: Policies;
}
