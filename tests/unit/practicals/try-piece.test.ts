import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exampleAttempts } from '@/lib/practicals/example-attempts';
import { explainScore } from '@/lib/practicals/explain-score';
import { ON_TARGET, tryPiece } from '@/lib/practicals/try-piece';
import { priceSize } from '@/lib/round/price-size';
import { AXES, type Rubric, scoreAttempt } from '@/lib/scoring';
import { comparedStarter } from '@/tests/support/compared';
import { ticksOf } from '@/tests/support/rubrics';

const caddy = comparedStarter('caddy').rubric;

function lineOf(rubric: Rubric, id: string) {
  const line = rubric.lines.find((each) => each.id === id);
  if (!line) throw new Error(id);
  return line;
}

describe('a piece that is tried on the rule', () => {
  it('loses what the engine says of each size by itself, and its rows add up to the score in both scales', () => {
    const off = fc.integer({ min: -12, max: 12 }).map((turn) => turn * ticksOf('1/64'));
    fc.assert(
      fc.property(
        off,
        off,
        off,
        fc.constantFrom('base', 'end', 'divider'),
        (thickness, width, length, id) => {
          const deviations = { thickness, width, length };
          const tried = tryPiece(caddy, id, { deviations, checks: {} });
          if (!tried?.piece.sizes) throw new Error('no piece');
          const line = lineOf(caddy, id);
          if (!tried.piece.swapped) {
            for (const axis of AXES) {
              const alone = priceSize(caddy, line, axis, line.target[axis] + deviations[axis]);
              expect(tried.piece.sizes[axis]).toMatchObject({ lose: alone.lose, band: alone.band });
            }
          }
          const { explanation, lost, others, piece, sheet } = tried;
          expect(lost.points).toBe(piece.lose);
          expect(others.points).toBe(0);
          expect(lost.ofTotal + others.ofTotal).toBe(explanation.lost.ofTotal);
          expect(explanation.kept.ofTotal + explanation.rest).toBe(sheet.score);
        },
      ),
    );
  });

  it('is gross past its limit, is held at its worth, and takes its checks along', () => {
    const gross = tryPiece(caddy, 'base', {
      ...ON_TARGET,
      deviations: { ...ON_TARGET.deviations, length: -ticksOf('3/8') },
    });
    expect([gross?.piece.gross, gross?.lost.points]).toEqual([true, 900]);
    const checked = tryPiece(caddy, 'base', { ...ON_TARGET, checks: { square: 1, surface: 9 } });
    expect([checked?.lost.points, checked?.lost.ofTotal]).toEqual([200, 317]);
    expect(ON_TARGET.checks).toEqual({});
  });

  it('takes the rest of its line along where all are priced as the worst of them', () => {
    const { rubric } = comparedStarter('worst', (draft) => {
      draft.all.set = 'worst';
    });
    const deviations = { ...ON_TARGET.deviations, length: ticksOf('1/16') };
    const tried = tryPiece(rubric, 'end', { deviations, checks: {} });
    expect([tried?.lost.points, tried?.others.points]).toEqual([100, 100]);
  });

  it('never reads less than something, and is none for a line that is not there', () => {
    const deviations = { ...ON_TARGET.deviations, length: -ticksOf('99') };
    expect(tryPiece(caddy, 'base', { deviations, checks: {} })?.piece.sizes?.length.reading).toBe(1);
    expect(tryPiece(caddy, 'nothing', ON_TARGET)).toBeNull();
  });
});

describe('the rows of an example', () => {
  it.each(exampleAttempts(caddy).map((example) => [example.id, example] as const))(
    'of %s add up to its score',
    (_, { attempt }) => {
      const sheet = scoreAttempt(caddy, attempt);
      const { rows, lost, kept, rest, score } = explainScore(caddy, sheet, 0);
      expect(rows.reduce((sum, { points }) => sum + points, 0)).toBe(lost.points);
      expect(rows.reduce((sum, { ofTotal }) => sum + ofTotal, 0)).toBe(lost.ofTotal);
      expect(lost.points + kept.points).toBe(sheet.possible);
      expect(kept.ofTotal + rest).toBe(score);
    },
  );
});
