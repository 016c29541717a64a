import { describe, expect, it } from 'vitest';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import { type ExampleAttempt, exampleAttempts, scoreExample } from '@/lib/practicals/example-attempts';
import { STARTER_IDS } from '@/lib/practicals/starter-plans';
import { attemptSchema, type Rubric, scoreAttempt } from '@/lib/scoring';
import { comparedStarter } from '@/tests/support/compared';

const caddy = comparedStarter('caddy').rubric;

const label = (example: ExampleAttempt | undefined) =>
  example?.label.map((part) => (typeof part === 'string' ? part : lengthAsTyped(part.ticks, 'in'))).join('');

const scores = (rubric: Rubric, about?: Parameters<typeof exampleAttempts>[1]) =>
  exampleAttempts(rubric, about).map((example) => [
    label(example),
    (scoreExample(rubric, example) ?? 0) / 100,
  ]);

describe('example attempts', () => {
  it('show what usual errors cost under the rubric, worked by hand for the desk caddy', () => {
    // 63 points in all, scaled to 100: a loss of n leaves round(100 × (63 − n) / 63).
    expect(scores(caddy)).toEqual([
      ['perfect: every size in its free band', 100],
      // 7 of 21 sizes lose 1: 56 of 63.
      ['typical: every third size a step off', 89],
      // 10 of 21 sizes lose 2, and 4 of 7 pieces fail a check of 1: 39 of 63.
      ['poor: every second size far off, and a check failed', 62],
      ['base 1/16 short', 98],
      ['rip fence out: all widths 1/16 over', 89],
      ['every size one step over', 67],
      ['one divider missing', 86],
      ['one divider 3/8 short: not that part', 86],
    ]);
  });

  it('are about the size in hand, and all of its line', () => {
    expect(scores(caddy, { lineId: 'end', axis: 'width' }).slice(3, 5)).toEqual([
      ['one end, width 1/16 under', 98],
      ['both of end, width 3/32 under', 94],
    ]);
    expect(scores(caddy, { lineId: 'side', axis: 'length' })[4]?.[0]).toBe('both of side 3/32 short');
  });

  it.each(STARTER_IDS)('of %s can all be recorded, are complete and are scored as any attempt', (starter) => {
    const { rubric } = comparedStarter(starter, () => {}, starter);
    for (const example of exampleAttempts(rubric)) {
      expect(attemptSchema.safeParse(example.attempt).success).toBe(true);
      const sheet = scoreAttempt(rubric, example.attempt);
      expect(sheet.complete).toBe(true);
      expect(scoreExample(rubric, example)).toBe(sheet.score);
    }
  });

  it('of a line whose bands are free alone step past them', () => {
    const { rubric } = comparedStarter('one band', (draft) => {
      for (const axis of ['thickness', 'width', 'length'] as const) {
        const side = { bands: [{ within: '1/32', lose: '0' }], beyond: '3' };
        Object.assign(draft.all.sizes[axis], { over: side, under: structuredClone(side) });
      }
    });
    expect(scores(rubric)[3]).toEqual(['base 1/16 short', 95]);
  });

  it('leave out what the rubric has no limit for', () => {
    const { rubric } = comparedStarter('no limit', (draft) => {
      draft.reading.grossLimit = '';
    });
    expect(exampleAttempts(rubric).map(({ id }) => id)).not.toContain('gross');
  });

  it('have no score under a rubric that does not ask for all of their pieces', () => {
    const [example] = exampleAttempts(caddy);
    const other = comparedStarter('hook', () => {}, 'bench-hook').rubric;
    expect(example && scoreExample(other, example)).toBeNull();
  });
});
