import { describe, expect, it } from 'vitest';
import { type Length, parseLength, type Unit } from '@/lib/length';
import { scoreAttempt } from '@/lib/scoring';
import tolerances from '../../support/data/iso-2768-1-medium.json';
import { makeAttempt, makeLine, makePiece, makeRubric, makeRule } from '../../support/scoring-examples';

function ticksOf(text: string, unit: Unit = 'mm'): Length {
  const parsed = parseLength(text, unit);
  if (!parsed.ok) throw new Error(`${text}: ${parsed.reason}`);
  return parsed.ticks;
}

/** What a length of this target loses when it is off by so much. */
function loseAt(target: Length, deviation: Length, within: readonly Length[]) {
  const bands = within.map((edge, at) => ({ within: edge, lose: at * 100 }));
  const rule = makeRule({ over: bands, under: bands, beyondOver: 900, beyondUnder: 900 });
  const line = makeLine({
    rule,
    worth: 100_000,
    target: { thickness: target, width: target, length: target },
  });
  const attempt = makeAttempt([makePiece('shelf', 1, { length: target + deviation })]);
  return scoreAttempt(makeRubric({ lines: [line] }), attempt).pieces[0]?.sizes?.length.lose;
}

/** Bands of 1/64, 1/32 and 1/16 in: general knowledge of imperial shops, from memory. */
describe('bands in fractions of an inch', () => {
  const within = ['1/64 in', '1/32 in', '1/16 in'].map((edge) => ticksOf(edge));
  const target = ticksOf('3/4 in');

  it.each([
    ['1/32 in', 100],
    ['0.03125 in', 100],
    ['0.79375 mm', 100],
    ['0.7937501 mm', 200],
    ['0.396875 mm', 0],
    ['0.3968751 mm', 100],
    ['1.5875 mm', 200],
    ['1.5875001 mm', 900],
  ])('hold a deviation of %s, over or under, at %i hundredths', (deviation, lose) => {
    expect(loseAt(target, ticksOf(deviation), within)).toBe(lose);
    expect(loseAt(target, -ticksOf(deviation), within)).toBe(lose);
  });

  it('hold a caliper reading in millimetres of a target in inches', () => {
    expect(ticksOf('19.84375 mm') - target).toBe(ticksOf('1/32 in'));
    expect(loseAt(target, ticksOf('19.84375 mm') - target, within)).toBe(100);
  });
});

/** Source: ISO 2768-1:1989, permissible deviations for linear dimensions, class m; each range is over … up to and including …. */
describe('bands as wide as the general tolerance of a nominal size', () => {
  const toleranceOf = (nominal: Length): Length => {
    const range = tolerances.ranges.find(({ upToMm }) => nominal <= ticksOf(upToMm));
    return range === undefined ? Number.NaN : ticksOf(range.plusMinusMm);
  };

  it.each([
    ['3 mm', '0.1'],
    ['3.01 mm', '0.1'],
    ['6 mm', '0.1'],
    ['6.01 mm', '0.2'],
    ['30 mm', '0.2'],
    ['30.01 mm', '0.3'],
    ['120 mm', '0.3'],
    ['120.01 mm', '0.5'],
    ['400.01 mm', '0.8'],
    ['1000.01 mm', '1.2'],
    ['2000.01 mm', '2'],
  ])('are free to the edge itself and no tick further: %s ± %s', (nominal, plusMinus) => {
    const target = ticksOf(nominal);
    const edge = ticksOf(plusMinus);
    expect(toleranceOf(target)).toBe(edge);
    for (const side of [1, -1]) {
      expect(loseAt(target, side * edge, [toleranceOf(target)])).toBe(0);
      expect(loseAt(target, side * (edge + 1), [toleranceOf(target)])).toBe(900);
    }
  });
});
