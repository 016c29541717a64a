import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import {
  addEdge,
  coarserStep,
  drawEdge,
  holdEdge,
  joinBands,
  middleOfBand,
  stepEdge,
  takeOutBand,
} from '@/lib/practicals/band-edges';

const G = TICKS_PER_INCH / 32;
const scale = { graduation: G, span: 6 };
const bands = [1, 2, 3].map((turn, index) => ({ within: turn * G, lose: index * 100 }));
const typed = {
  bands: [
    { within: '1/32', lose: '0' },
    { within: '1/16', lose: '1' },
    { within: '3/32', lose: '2' },
  ],
  beyond: '3',
};
const read = { bands, beyond: 300 };
const spread = [1, 3, 5].map((turn, index) => ({ within: turn * G, lose: index * 100 }));

describe('an edge that is drawn along the rule', () => {
  it('snaps to the nearest graduation', () => {
    expect(drawEdge(spread, 1, 3.4 * G, scale)).toEqual({ within: 3 * G });
    expect(drawEdge(spread, 1, 3.6 * G, scale)).toEqual({ within: 4 * G });
  });

  it('stops at its neighbours and pushes none: drawn as far as one, it lies on it', () => {
    expect(drawEdge(spread, 1, 4.5 * G, scale)).toEqual({ onto: 2 });
    expect(drawEdge(spread, 1, 99 * G, scale)).toEqual({ onto: 2 });
    expect(drawEdge(spread, 1, 1.4 * G, scale)).toEqual({ onto: 0 });
    expect(drawEdge(spread, 1, -99 * G, scale)).toEqual({ onto: 0 });
  });

  it('stops at the target and at the end of the rule', () => {
    expect(drawEdge(spread, 0, -3 * G, scale)).toEqual({ within: 0 });
    expect(drawEdge(spread, 2, 99 * G, scale)).toEqual({ within: 6 * G });
  });

  it('leaves the bands ascending wherever it is drawn, on any rule', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 1, max: 5 * G }), { minLength: 1, maxLength: 6 }),
        fc.nat(),
        fc.integer({ min: -9 * G, max: 9 * G }),
        (edges, pick, distance) => {
          const any = edges.sort((a, b) => a - b).map((within, lose) => ({ within, lose }));
          const index = pick % any.length;
          const place = drawEdge(any, index, distance, scale);
          if ('onto' in place) {
            expect(Math.abs(place.onto - index)).toBe(1);
            return;
          }
          const moved = any.map((band, at) => (at === index ? { ...band, within: place.within } : band));
          moved.slice(1).forEach((band, at) => {
            expect(band.within).toBeGreaterThan(moved[at]?.within ?? 0);
          });
        },
      ),
    );
  });
});

describe('an edge that is moved by keys', () => {
  it('goes one graduation, or to the next coarser one', () => {
    expect(stepEdge(spread, 2, 1, scale)).toBe(6 * G);
    expect(stepEdge(spread, 2, -1, scale)).toBe(4 * G);
    expect(stepEdge([{ within: G, lose: 0 }], 0, 2, scale)).toBe(2 * G);
    expect(stepEdge([{ within: 4 * G, lose: 0 }], 0, -2, scale)).toBe(2 * G);
  });

  it('goes from between two graduations to the next', () => {
    const off = [{ within: Math.round(1.3 * G), lose: 0 }];
    expect(stepEdge(off, 0, 1, scale)).toBe(2 * G);
    expect(stepEdge(off, 0, -1, scale)).toBe(G);
  });

  it('stops one graduation short of a neighbour, at the target and at the end of the rule', () => {
    expect(stepEdge(bands, 1, 1, scale)).toBe(2 * G);
    expect(holdEdge(spread, 1, 99 * G, scale)).toBe(4 * G);
    expect(holdEdge(spread, 1, 0, scale)).toBe(2 * G);
    expect(holdEdge(spread, 0, -1, scale)).toBe(0);
    expect(holdEdge(spread, 2, 99 * G, scale)).toBe(6 * G);
  });

  it('goes coarser by what is engraved coarser', () => {
    expect(coarserStep(G, 'in')).toBe(2);
    expect(coarserStep(TICKS_PER_MM / 2, 'mm')).toBe(2);
    expect(coarserStep(TICKS_PER_MM / 10, 'mm')).toBe(5);
  });
});

describe('a band', () => {
  it('is taken out when its edge is laid on a neighbour: the inner price reaches to the neighbour', () => {
    expect(joinBands(typed, 1, 2).bands).toEqual([
      { within: '1/32', lose: '0' },
      { within: '3/32', lose: '1' },
    ]);
    expect(joinBands(typed, 1, 0).bands).toEqual([
      { within: '1/32', lose: '0' },
      { within: '3/32', lose: '2' },
    ]);
    expect(joinBands(typed, 0, 1).bands[0]).toEqual({ within: '1/16', lose: '0' });
  });

  it('is taken out by its key, but never the free one', () => {
    expect(takeOutBand(typed, 2).bands).toHaveLength(2);
    expect(takeOutBand(typed, 0)).toEqual(typed);
  });

  it('is added past the last as one more step of the stair', () => {
    expect(addEdge(typed, read, 4 * G, 'in')).toEqual({
      bands: [...typed.bands, { within: '1/8', lose: '3' }],
      beyond: '4',
    });
    const flat = { bands: [{ within: '1/32', lose: '0' }], beyond: '0' };
    const side = addEdge(flat, { bands: [{ within: G, lose: 0 }], beyond: 0 }, 2 * G, 'in');
    expect(side).toEqual({ bands: [...flat.bands, { within: '1/16', lose: '0' }], beyond: '1' });
  });

  it('is split at half the price between its neighbours', () => {
    const at = Math.round(1.5 * G);
    expect(addEdge(typed, read, at, 'in')?.bands).toEqual([
      { within: '1/32', lose: '0' },
      { within: '3/64', lose: '0.5' },
      { within: '1/16', lose: '1' },
      { within: '3/32', lose: '2' },
    ]);
    expect(addEdge(typed, read, G / 2, 'in')?.bands.slice(0, 2)).toEqual([
      { within: '1/64', lose: '0' },
      { within: '1/32', lose: '0.5' },
    ]);
  });

  it('is not added on another edge, at the target, or past the twentieth', () => {
    expect(addEdge(typed, read, 2 * G, 'in')).toBeNull();
    expect(addEdge(typed, read, 0, 'in')).toBeNull();
    const many = Array.from({ length: 20 }, (_, index) => ({ within: index + 1, lose: 0 }));
    expect(addEdge(typed, { bands: many, beyond: 0 }, 3 * G, 'in')).toBeNull();
  });

  it('has its middle on a graduation, and between two where it is too narrow', () => {
    expect(middleOfBand(spread, 1, G)).toBe(2 * G);
    expect(middleOfBand(bands, 1, G)).toBe(1.5 * G);
    expect(middleOfBand([{ within: 1, lose: 0 }], 0, G)).toBeNull();
  });
});
