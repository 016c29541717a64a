import { describe, expect, it } from 'vitest';
import { projectAttempt, rescore, ScoringError, scoreAttempt } from '@/lib/scoring';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  sixtyFourths,
} from '../../support/scoring-examples';

const { width, length } = makeLine({}).target;

describe('scoring many attempts at once', () => {
  const rubric = makeRubric({
    lines: [makeLine({ quantity: 2, set: 'worst', checks: [makeCheck('square', [0, 100], null)] })],
    workChecks: [makeCheck('named', [0, 50])],
  });
  const good = makePiece('shelf', 1, { length }, { square: 0 });
  const poor = makePiece(
    'shelf',
    2,
    { width: width + sixtyFourths(4), length: { kind: 'spoiled' } },
    { square: 1 },
  );

  it('gives the example of its description', () => {
    const attempt = makeAttempt([good]);
    expect(rescore(rubric, [attempt])[0]?.score).toBe(scoreAttempt(rubric, attempt).score);
  });

  it('carries nothing over from one attempt to the next', () => {
    const attempts = [
      makeAttempt([good, poor], { work: { named: 1 } }),
      makeAttempt([]),
      makeAttempt([poor]),
      makeAttempt([good, { ...poor, state: 'excused' }]),
      makeAttempt([good, poor], { work: { named: 1 } }),
    ];
    expect(rescore(rubric, attempts)).toEqual([
      { raw: 750, lost: 1050, provisional: 750, score: 750, complete: true },
      { raw: 1800, lost: 0, provisional: 1800, score: null, complete: false },
      { raw: 1300, lost: 500, provisional: 1300, score: null, complete: false },
      { raw: 900, lost: 0, provisional: 900, score: 900, complete: true },
      { raw: 750, lost: 1050, provisional: 750, score: 750, complete: true },
    ]);
  });

  it('of none gives none', () => {
    expect(rescore(rubric, [])).toEqual([]);
  });

  it('refuses what scoring one refuses', () => {
    const foreign = makeAttempt([makePiece('rail', 1)]);
    expect(() => rescore(rubric, [makeAttempt([good]), foreign])).toThrow(ScoringError);
    expect(() => rescore(rubric, [makeAttempt([good, good])])).toThrow(ScoringError);
    expect(rescore(rubric, [projectAttempt(rubric, foreign).attempt])).toHaveLength(1);
  });
});
