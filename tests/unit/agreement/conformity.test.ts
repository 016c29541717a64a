import cdf from '@stdlib/stats-base-dists-normal-cdf';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  chancePricedNext,
  combineUncertainties,
  conformanceProbability,
  globalRisks,
  type ReadBand,
  uncertaintyOfGraduation,
  uncertaintyOfLimits,
} from '@/lib/agreement';

const MM = 25.4;
/** The shop case: parts spread about the target by 0.3 mm, ± 0.5 mm allowed. Own computation, by quadrature. */
const SHOP = { mean: 0, sd: 0.3 };

describe('the standard uncertainty of an instrument', () => {
  // GUM (JCGM 100:2008), F.2.2.1 and 4.3.7; own computation.
  it.each([
    ['0.01 mm', 0.01, 0.002886751345948129],
    ['0.001 in', MM / 1000, 0.007332348418708248],
    ['1/64 in', MM / 64, 0.11456794404231636],
    ['1/16 in', MM / 16, 0.45827177616926545],
  ])('read to a graduation of %s is the graduation over √12', (_, graduation, u) => {
    expect(uncertaintyOfGraduation(graduation)).toBeCloseTo(u, 15);
  });

  it.each([
    ['0.02 mm', 0.02, 0.011547005383792516],
    ['0.001 in', MM / 1000, 0.014664696837416495],
  ])('that errs by no more than ± %s is the limit over √3', (_, limit, u) => {
    expect(uncertaintyOfLimits(limit)).toBeCloseTo(u, 15);
  });

  it('is combined from its parts by the root of the sum of squares', () => {
    // Own budget: ± 0.02 mm allowed to the caliper, read to 0.01 mm, three readings that spread by 0.05 mm.
    const parts = [uncertaintyOfLimits(0.02), uncertaintyOfGraduation(0.01), 0.05 / Math.sqrt(3)];
    expect(combineUncertainties(parts)).toBeCloseTo(0.031224989992, 12);
    expect(2 * combineUncertainties(parts)).toBeCloseTo(0.062449979984, 12);
    // The end gauge of GUM H.1 in nanometres, its components as printed there (from memory): 32 nm.
    expect(Math.round(combineUncertainties([25, 9.7, 2.9, 16.6]))).toBe(32);
    expect(combineUncertainties([3, 4])).toBe(5);
    expect(combineUncertainties([])).toBe(0);
  });

  it('is refused for what is no graduation', () => {
    expect(() => uncertaintyOfGraduation(-1)).toThrow(RangeError);
    expect(() => uncertaintyOfLimits(Number.NaN)).toThrow(RangeError);
    expect(uncertaintyOfGraduation(12)).toBeCloseTo(3.464101615137755, 15);
    expect(uncertaintyOfLimits(3)).toBeCloseTo(1.7320508075688774, 15);
  });
});

describe('the probability that what was read conforms', () => {
  it('is that of JCGM 106:2012 for one limit: the Zener diode (example from memory, value recomputed)', () => {
    const read = { reading: -5.47, u: 0.05 };
    expect(conformanceProbability(read, { upper: -5.4 })).toBeCloseTo(0.9192433407662289, 12);
    expect(conformanceProbability(read, { lower: -5.4 })).toBeCloseTo(1 - 0.9192433407662289, 12);
  });

  it('is that of JCGM 106:2012, 7.3, for two limits (recomputed)', () => {
    const limits = { lower: 0.75 - 1 / 64, upper: 0.75 + 1 / 64 };
    expect(conformanceProbability({ reading: 0.76, u: 0.003 }, limits)).toBeCloseTo(0.9696036382347384, 12);
    expect(conformanceProbability({ reading: limits.upper, u: 0.003 }, limits)).toBeCloseTo(0.5, 12);
    const rule = { reading: 19.4, u: uncertaintyOfGraduation(MM / 64) };
    expect(conformanceProbability(rule, { lower: 18.55, upper: 19.55 })).toBeCloseTo(0.9047779961356163, 12);
  });

  // Guard bands of ILAC-G8:09/2019 and ISO 14253-1:2017 (read second-hand, recomputed), in parts of U = 2u.
  it.each([
    ['0.83 U', 1.66, 0.048457],
    ['U', 2, 0.02275],
    ['1.5 U', 3, 0.0013499],
    ['3 U', 6, 9.86588e-10],
    ['1.65 u, for 95 %', 1.6448536269514722, 0.05],
  ])('with a guard band of %s leaves at most this false acceptance', (_, z, falseAccept) => {
    const outside = conformanceProbability({ reading: -z, u: 1 }, { lower: 0 });
    expect(Math.abs(outside / falseAccept - 1)).toBeLessThan(1e-5);
  });

  it('is refused without an uncertainty, or with limits that cross', () => {
    expect(() => conformanceProbability({ reading: 1, u: 0 }, { upper: 2 })).toThrow(RangeError);
    expect(() => conformanceProbability({ reading: 1, u: 1 }, { lower: 2, upper: 1 })).toThrow(RangeError);
  });
});

describe('the global risks', () => {
  const resistor = { mean: 1500, sd: 0.12, u: 0.04 };
  const tolerance = { lower: 1499.8, upper: 1500.2 };

  // JCGM 106:2012, 9.5: the resistor; the model from memory, the values by quadrature.
  it.each([
    [0, 0.0189422067, 0.0372078002],
    [0.08, 0.000468633599, 0.24766964],
  ])('of the resistor model with a guard of %s are the published ones', (w, consumer, producer) => {
    const risks = globalRisks(resistor, tolerance, w);
    expect(risks.consumer).toBeCloseTo(consumer, 10);
    expect(risks.producer).toBeCloseTo(producer, 8);
  });

  it.each([
    ['a caliper', 0.0115, 0.00292341, 0.00316702],
    ['a rule', 0.1146, 0.02074727, 0.04465218],
  ])('of the shop case with %s are those of an own quadrature', (_, u, consumer, producer) => {
    const risks = globalRisks({ ...SHOP, u }, { lower: -0.5, upper: 0.5 }, 0);
    expect(risks.consumer).toBeCloseTo(consumer, 8);
    expect(risks.producer).toBeCloseTo(producer, 8);
  });
});

/** The same by Simpson's rule in 40 000 steps. */
function bySimpson({ sd, u }: { sd: number; u: number }, { inner, outer, edge }: ReadBand): number {
  const steps = 40_000;
  const width = (outer - inner) / steps;
  let [both, truth] = [0, 0];
  for (let step = 0; step <= steps; step++) {
    const x = inner + step * width;
    const weight = step === 0 || step === steps ? 1 : step % 2 === 0 ? 2 : 4;
    const density = weight * Math.exp(-0.5 * (x / sd) ** 2);
    truth += density;
    both += density * cdf(x - edge, 0, u);
  }
  return both / truth;
}

describe('the chance that a part truly within a band is priced in the next', () => {
  it('agrees with another quadrature, to 1e-9, for any band, spread and instrument', () => {
    const hundredths = (min: number, max: number) => fc.integer({ min, max }).map((each) => each / 100);
    fc.assert(
      fc.property(
        hundredths(5, 100),
        hundredths(1, 50),
        hundredths(0, 150),
        hundredths(5, 200),
        hundredths(0, 20),
        (sd, u, inner, width, margin) => {
          const band = { inner, outer: inner + width, edge: inner + width + margin };
          const chance = chancePricedNext({ sd, u }, band);
          expect(Math.abs((chance ?? -1) - bySimpson({ sd, u }, band))).toBeLessThan(1e-9);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('is that of two correlated normal deviates above 0 (Sheppard 1899, from memory)', () => {
    for (const u of [0.0119, 0.1146, 0.3, 2]) {
      const rho = 0.3 / Math.hypot(0.3, u);
      const above = chancePricedNext({ sd: 0.3, u }, { inner: 0, outer: Number.POSITIVE_INFINITY, edge: 0 });
      expect(above).toBeCloseTo(0.5 + Math.asin(rho) / Math.PI, 12);
    }
  });

  it('is the producer’s risk of the same limits, given that the part conforms', () => {
    const { producer } = globalRisks({ ...SHOP, u: 0.1146 }, { lower: -0.5, upper: 0.5 }, 0);
    const conforms = conformanceProbability({ reading: 0, u: 0.3 }, { lower: -0.5, upper: 0.5 });
    const chance = chancePricedNext({ sd: 0.3, u: 0.1146 }, { inner: 0, outer: 0.5, edge: 0.5 }) ?? 0;
    // Of a part within ± 0.5 that reads past one end, the other end is too far off to matter.
    expect(chance).toBeCloseTo(producer / conforms, 6);
  });

  it('shrinks with a wider margin and a finer instrument', () => {
    const of = (u: number, margin: number) =>
      chancePricedNext({ sd: 0.3, u }, { inner: 0, outer: 0.5, edge: 0.5 + margin }) ?? 0;
    expect(of(0.1146, 0.05)).toBeLessThan(of(0.1146, 0));
    expect(of(0.0115, 0)).toBeLessThan(of(0.1146, 0));
    expect(chancePricedNext({ sd: 0.3, u: 0.1146 }, { inner: 0, outer: 0.79375, edge: 0.84455 })).toBeCloseTo(
      0.0037,
      4,
    );
  });

  it('is not known where work never gets to, and refused for what is no band', () => {
    expect(chancePricedNext({ sd: 0.3, u: 0.1 }, { inner: 20, outer: 21, edge: 21 })).toBeNull();
    expect(() => chancePricedNext({ sd: 0, u: 0.1 }, { inner: 0, outer: 1, edge: 1 })).toThrow(RangeError);
    expect(() => chancePricedNext({ sd: 0.3, u: 0.1 }, { inner: 1, outer: 1, edge: 1 })).toThrow(RangeError);
  });
});
