import type { Length } from '@/lib/length';
import type { Axis, Points, Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import type { DifferingSpan, PricedSize } from './compare-curves';
import type { Task } from './task';

/** One rubric of several that are laid side by side, by the name it goes by there. */
export interface Compared {
  label: string;
  task: Task;
  form: RubricForm;
  rubric: Rubric;
}

/** Words with lengths in them, which the screen sets as fractions. */
export type Phrase = (string | { ticks: Length })[];

export type ComparedValue =
  | { kind: 'length'; ticks: Length }
  | { kind: 'points'; points: Points }
  | { kind: 'percent'; percent: number }
  | { kind: 'text'; text: string }
  | { kind: 'none' };

/** One thing that rubrics say, in the order compared. */
export interface ComparedRow {
  label: Phrase;
  values: ComparedValue[];
  differs: boolean;
}

/** The sizes that are priced alike within every rubric, and where the rubrics part on them. */
export interface ComparedSizes {
  name: Phrase;
  sizes: { lineId: string; label: string; axis: Axis; target: Length }[];
  prices: PricedSize[];
  spans: DifferingSpan[];
  rows: ComparedRow[];
}

export interface RubricComparison {
  same: boolean;
  /** Where and by how much they differ, a sentence each. */
  sentences: Phrase[];
  sizes: ComparedSizes[];
  pieces: ComparedRow[];
  whole: ComparedRow[];
  policies: ComparedRow[];
}
