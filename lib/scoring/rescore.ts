import { markAttempt } from './mark-attempt';
import type { Attempt, Rubric, ScoreSheet } from './types';
import { layOutWorksheet } from './worksheet';

export type Rescored = Pick<ScoreSheet, 'raw' | 'lost' | 'provisional' | 'score' | 'complete'>;

/**
 * Scores many attempts by another rubric, in their order, each as `scoreAttempt` scores it but without the
 * sheet: for previews and cross-scoring. The rubric is laid out once.
 *
 * Arguments, units, rounding and failure as for `scoreAttempt`; one attempt that does not fit refuses them all,
 * so put attempts of another rubric through `projectAttempt` first.
 *
 * @example rescore(rubric, [attempt])[0]?.score // scoreAttempt(rubric, attempt).score
 */
export function rescore(rubric: Rubric, attempts: readonly Attempt[]): Rescored[] {
  const sheet = layOutWorksheet(rubric);
  return attempts.map((attempt) => {
    const { raw, lost, provisional, complete } = markAttempt(sheet, attempt);
    return { raw, lost, provisional, score: complete ? provisional : null, complete };
  });
}
