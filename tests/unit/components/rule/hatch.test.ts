import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hatchPath } from '@/components/rule/hatch';

interface Line {
  x1: number;
  y1: number;
  x2: number;
  y2: number;
}

function linesOf(path: string): Line[] {
  return [...path.matchAll(/M(-?[\d.]+) (-?[\d.]+)L(-?[\d.]+) (-?[\d.]+)/g)].map((match) => {
    const [x1 = 0, y1 = 0, x2 = 0, y2 = 0] = match.slice(1).map(Number);
    return { x1, y1, x2, y2 };
  });
}

const patches = fc.record({
  x: fc.integer({ min: -200, max: 200 }),
  y: fc.integer({ min: -200, max: 200 }),
  width: fc.integer({ min: 1, max: 300 }),
  height: fc.integer({ min: 1, max: 100 }),
});

describe('the hatch of a loss', () => {
  it('leans the way the error goes: under like \\, over like /', () => {
    const patch = { x: 0, y: 0, width: 60, height: 40 };
    for (const line of linesOf(hatchPath(patch, 'under'))) expect(line.y2).toBeGreaterThan(line.y1);
    for (const line of linesOf(hatchPath(patch, 'over'))) expect(line.y2).toBeLessThan(line.y1);
    expect(linesOf(hatchPath(patch, 'over')).length).toBeGreaterThan(5);
  });

  it('never leaves its patch and always lies at 45 degrees', () => {
    fc.assert(
      fc.property(patches, fc.constantFrom('under' as const, 'over' as const), (patch, side) => {
        for (const { x1, y1, x2, y2 } of linesOf(hatchPath(patch, side))) {
          for (const x of [x1, x2]) {
            expect(x).toBeGreaterThanOrEqual(patch.x - 0.1);
            expect(x).toBeLessThanOrEqual(patch.x + patch.width + 0.1);
          }
          for (const y of [y1, y2]) {
            expect(y).toBeGreaterThanOrEqual(patch.y - 0.1);
            expect(y).toBeLessThanOrEqual(patch.y + patch.height + 0.1);
          }
          expect(Math.abs(Math.abs(x2 - x1) - Math.abs(y2 - y1))).toBeLessThan(0.21);
        }
      }),
    );
  });
});
