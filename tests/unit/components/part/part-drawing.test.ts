import { describe, expect, it } from 'vitest';
import { grainLines, logFor } from '@/components/part/grain';
import { howToHold, instrumentFor } from '@/components/part/instrument';
import { toPaper } from '@/components/part/isometric';
import { drawnBox, layOutPart } from '@/components/part/part-layout';
import { pieceScale } from '@/components/part/piece-face';
import { TICKS_PER_INCH as IN, TICKS_PER_MM as MM } from '@/lib/length';

const end = { thickness: IN / 2, width: 3.5 * IN, length: 4 * IN };
const slat = { thickness: 13 * MM, width: 35 * MM, length: 260 * MM };

function pointsOf(path: string): [number, number][] {
  return [...path.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)].map((match) => [
    Number(match[1]),
    Number(match[2]),
  ]);
}

describe('the isometric', () => {
  it('runs length right and up, width left and up, thickness straight up, all at one scale', () => {
    for (const point of [
      [1, 0, 0],
      [0, 1, 0],
      [0, 0, 1],
    ] as const) {
      expect(Math.hypot(...toPaper(point))).toBeCloseTo(1, 12);
    }
    expect(toPaper([1, 0, 0])[0]).toBeGreaterThan(0);
    expect(toPaper([1, 0, 0])[1]).toBeLessThan(0);
    expect(toPaper([0, 1, 0])[0]).toBeLessThan(0);
    expect(toPaper([0, 0, 1])).toEqual([0, -1]);
  });

  it('keeps the piece and its dimensions on the paper, whatever the proportions', () => {
    for (const size of [end, slat, { thickness: 10 * MM, width: 16 * MM, length: 430 * MM }]) {
      const layout = layOutPart(size, { width: 500, height: 390 });
      const paths = [layout.top, layout.side, layout.end, ...layout.dimensions.map((each) => each.line)];
      for (const [x, y] of paths.flatMap(pointsOf)) {
        expect(x).toBeGreaterThan(0);
        expect(x).toBeLessThan(500);
        expect(y).toBeGreaterThan(0);
        expect(y).toBeLessThan(390);
      }
    }
  });

  it('keeps the upper right corner free for the target, however tall the piece', () => {
    const corner = { width: 230, height: 170 };
    for (const size of [end, slat, { thickness: IN, width: 1.25 * IN, length: 1.5 * IN }]) {
      const layout = layOutPart(size, { width: 520, height: 390, corner });
      const figure = layout.dimensions.find((each) => each.axis === 'thickness')?.text ?? [0, 0];
      const all = [...[layout.top, layout.side].flatMap(pointsOf), figure];
      for (const [x, y] of all) expect(x <= 520 - corner.width || y >= corner.height).toBe(true);
      expect(layout.scale).toBeGreaterThan(0);
    }
  });

  it('is true in its proportions, except that very thin sides are thickened', () => {
    expect(drawnBox(end)).toEqual(end);
    expect(drawnBox(slat).length).toBe(slat.length);
    expect(drawnBox(slat).thickness).toBe(slat.length / 10);
  });
});

describe('the grain', () => {
  const box = drawnBox(end);
  const log = logFor(box);
  const top = grainLines(box, log, { fixed: 'z', at: box.thickness });
  const onEnd = grainLines(box, log, { fixed: 'x', at: 0 });

  it('is seen on the face and on the end', () => {
    expect(top.length).toBeGreaterThan(3);
    expect(onEnd.length).toBeGreaterThan(2);
  });

  it('stays on the piece', () => {
    const slack = box.length * 1e-6;
    for (const [x, y, z] of [...top, ...onEnd].flat()) {
      expect(x).toBeGreaterThanOrEqual(-slack);
      expect(x).toBeLessThanOrEqual(box.length + slack);
      expect(y).toBeGreaterThanOrEqual(-slack);
      expect(y).toBeLessThanOrEqual(box.width + slack);
      expect(z).toBeLessThanOrEqual(box.thickness + slack);
    }
  });

  it('runs on over the corner: a line of the face ends where an arc of the end begins', () => {
    const near = box.width * 0.02;
    const ends = top.flatMap((line) => [line[0], line.at(-1)]).filter((point) => point && point[0] < near);
    const arcs = onEnd
      .flatMap((line) => [line[0], line.at(-1)])
      .filter((point) => point && point[2] > box.thickness - near);
    expect(ends.length).toBeGreaterThan(0);
    for (const point of ends) {
      const gap = Math.min(
        ...arcs.map((arc) => Math.abs((arc?.[1] ?? Number.NaN) - (point?.[1] ?? Number.NaN))),
      );
      expect(gap).toBeLessThan(box.width * 0.03);
    }
  });
});

describe('what a size is measured with', () => {
  it('is a caliper as far as it opens, and a rule past that', () => {
    expect(instrumentFor(6 * IN, 'in')).toBe('caliper');
    expect(instrumentFor(6 * IN + 1, 'in')).toBe('rule');
    expect(instrumentFor(150 * MM, 'mm')).toBe('caliper');
    expect(instrumentFor(260 * MM, 'mm')).toBe('rule');
    expect(instrumentFor(7 * IN, 'in', 8 * IN)).toBe('caliper');
  });

  it('is held across the grain for width and along it for length', () => {
    expect(howToHold('width', 'caliper')).toEqual(['caliper across the grain,', 'at mid-length']);
    expect(howToHold('length', 'rule')).toEqual(['rule along the grain,', 'at mid-width']);
  });
});

describe('pieces standing in a row', () => {
  it('share one scale of 12 px an inch', () => {
    expect(pieceScale([end], { height: 84, columnWidth: 78 }) * IN).toBe(12);
  });

  it('shrink together until the tallest and the widest fit', () => {
    const scale = pieceScale([end, { ...end, length: 14 * IN }], { height: 84, columnWidth: 78 });
    expect(scale * 14 * IN).toBeCloseTo(84, 9);
    expect(pieceScale([{ ...end, width: 20 * IN }], { height: 500, columnWidth: 78 }) * 20 * IN).toBeCloseTo(
      78,
      9,
    );
  });
});
