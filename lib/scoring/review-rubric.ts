import type { Length } from '@/lib/length';
import { FINDING_CODES, type Finding, type FindingCode, type ReviewRule } from './review/finding';
import { findAlike, findCheapMissing } from './review/review-lines';
import {
  findGrossInBand,
  findNarrowBands,
  findNoFreeBand,
  findOneWrong,
  findSymmetric,
} from './review/review-sizes';
import { findOffGrid, findRoundingAndMargin, findShortStart } from './review/review-totals';
import type { Rubric } from './types';

const RULES: Record<FindingCode, ReviewRule> = {
  'band-below-graduation': findNarrowBands,
  'no-free-band': findNoFreeBand,
  'rounding-and-margin': findRoundingAndMargin,
  'one-wrong-keeps-most': findOneWrong,
  'lines-alike': findAlike,
  'missing-is-cheaper': findCheapMissing,
  'symmetric-undersize': findSymmetric,
  'gross-inside-band': findGrossInBand,
  'start-runs-out': findShortStart,
  'total-off-grid': findOffGrid,
};

/**
 * What a teacher should see before publishing a rubric that is read to whole graduations: each finding with its code,
 * the line and axis it stands at, and a sentence that says what is odd and what to do. None of them makes a rubric
 * wrong; `symmetric-undersize` is for information only. In the order of the codes, then of the cut list, then of the
 * axes. Lengths in ticks, written in the rubric's unit; points in hundredths; nothing is rounded.
 * The rubric is already parsed (`rubricSchema`) and is not changed.
 *
 * @example reviewRubric({ ...rubric, readTo: 100, margin: 50 }, { graduation: 100 }).map(({ code }) => code) // has 'rounding-and-margin'
 */
export function reviewRubric(rubric: Rubric, { graduation }: { graduation: Length }): Finding[] {
  return FINDING_CODES.flatMap((code) =>
    RULES[code](rubric, graduation).map((remark) => ({ code, ...remark })),
  );
}
