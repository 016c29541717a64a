import { describe, expect, it } from 'vitest';
import { layOutRule, placeOnFace } from '@/components/rule/rule-layout';
import { graduationsOf, spanThatFits, TOUCH_PX, tickLength } from '@/components/rule/rule-scale';
import { TICKS_PER_INCH as IN, TICKS_PER_MM as MM } from '@/lib/length';

const scale = { unit: 'in', target: 3.5 * IN, graduation: IN / 32, span: 5 } as const;

describe('the graduations of a rule', () => {
  it('run evenly from under to over with the target in the middle', () => {
    const columns = graduationsOf(scale);
    expect(columns).toHaveLength(11);
    expect(columns[5]).toEqual({ step: 0, ticks: scale.target, deviation: 0 });
    expect(columns[0]?.ticks).toBe(scale.target - (5 * IN) / 32);
    expect(columns[10]?.deviation).toBe((5 * IN) / 32);
  });

  it('leave out what would be no length at all', () => {
    const columns = graduationsOf({ unit: 'mm', target: MM, graduation: MM / 2, span: 5 });
    expect(columns.map((column) => column.ticks)).toEqual([
      0.5 * MM,
      MM,
      1.5 * MM,
      2 * MM,
      2.5 * MM,
      3 * MM,
      3.5 * MM,
    ]);
  });

  it('hang longer the coarser the fraction is', () => {
    const lengths = [4, 3.5, 3.25, 3.125, 3 + 1 / 16, 3 + 1 / 32, 3 + 1 / 64, 3 + 1 / 128].map((inches) =>
      tickLength(inches * IN, 'in'),
    );
    expect(lengths).toEqual([54, 54, 48, 44, 36, 28, 20, 16]);
  });

  it('hang longer for tens, fives and ones of a millimetre', () => {
    expect([180, 175, 181, 180.5, 180.25].map((mm) => tickLength(mm * MM, 'mm'))).toEqual([
      54, 44, 36, 20, 16,
    ]);
  });
});

describe('the room a rule has', () => {
  it('holds eleven graduations and two far columns on the bench', () => {
    expect(spanThatFits(1144)).toBe(5);
  });

  it('shows fewer graduations before any key gets narrower than a finger', () => {
    for (const width of [400, 640, 780, 900, 1014, 1180]) {
      const span = spanThatFits(width);
      expect(width / (2 * span + 3)).toBeGreaterThanOrEqual(TOUCH_PX);
    }
  });

  it('holds none where not even the target and two far columns fit', () => {
    expect(spanThatFits(200)).toBe(0);
  });

  it('sets every bench number inside its column, however long it is', () => {
    const short = layOutRule('bench', scale);
    const long = layOutRule('bench', { ...scale, target: 122.5 * IN, graduation: IN / 64 });
    expect(short.number.size).toBe(46);
    expect(long.number.size).toBeLessThan(46);
    expect(short.numberEvery).toBe(1);
  });

  it('thins out the numbers on a phone', () => {
    expect(layOutRule('phone', scale).numberEvery).toBe(2);
  });

  it('holds a reading past the shown stretch at its end', () => {
    const layout = layOutRule('card', scale);
    expect(placeOnFace(0, scale, layout)).toBe(layout.centre);
    expect(placeOnFace(-IN, scale, layout)).toBe(layout.left);
    expect(placeOnFace(IN, scale, layout)).toBe(layout.right);
  });
});
