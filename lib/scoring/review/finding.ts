import type { Length } from '@/lib/length';
import type { Axis, Rubric } from '../types';

/** Every code of a finding, in the order in which findings are listed. */
export const FINDING_CODES = [
  'band-below-graduation',
  'no-free-band',
  'rounding-and-margin',
  'one-wrong-keeps-most',
  'lines-alike',
  'missing-is-cheaper',
  'symmetric-undersize',
  'gross-inside-band',
  'start-runs-out',
  'total-off-grid',
] as const;

export type FindingCode = (typeof FINDING_CODES)[number];

/** Where a finding stands, and what it says. Of two lines it stands at the first. */
export interface Remark {
  lineId?: string;
  axis?: Axis;
  text: string;
}

export interface Finding extends Remark {
  code: FindingCode;
}

/** One thing to look for in a rubric that is read to whole graduations. */
export type ReviewRule = (rubric: Rubric, graduation: Length) => Remark[];
