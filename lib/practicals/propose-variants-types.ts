import type { Length } from '@/lib/length';
import type { Axis, Rubric } from '@/lib/scoring';
import type { CutList, CutListLine } from '@/lib/scoring/rubric-form';
import type { Phrase } from './compare-types';
import type { Task } from './task';

/** The most that the wood of a variant may differ from the original's, in percent. */
export const WOOD_PERCENT = 8;

/** A size moves by at most this part of itself. */
export const LARGEST_SHARE = { num: 1, den: 4 };

/** A practical whose pieces a variant's must not pass for. */
export interface OtherCutList {
  /** "the original", "variant B". */
  name: string;
  cutList: CutList;
}

export interface VariantQuestion {
  task: Task;
  rubric: Rubric;
  /** The variants that there are already. */
  others: readonly OtherCutList[];
  /** How many are wanted, 1 to 6. */
  count: number;
  /** Every move is a whole number of these. */
  graduation: Length;
}

export interface VariantProposal {
  cutList: CutList;
  /** What it changes and keeps, a sentence each. */
  words: Phrase[];
}

export interface VariantProposals {
  proposals: VariantProposal[];
  /** The least move that tells two pieces apart. */
  step: Length;
  /** Why there are no more of them, and which line stops the next; null when there are as many as wanted. */
  stopped: { lineId: string; words: Phrase } | null;
}

/** Equal sizes of a cut list, which change together. */
export interface SizeGroup {
  value: Length;
  sizes: { line: number; axis: Axis }[];
  /** What it may move by, nearest first; 0 alone where it stays. */
  moves: Length[];
}

export interface Stop {
  line: number;
  why: 'stays' | 'alike' | 'order' | 'blank' | 'wood' | 'taken';
  /** What the line would pass for. */
  as?: { label: string; of: string };
}

export type Target = CutListLine['target'];
