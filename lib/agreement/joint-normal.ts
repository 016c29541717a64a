import cdf from '@stdlib/stats-base-dists-normal-cdf';

/** True values spread normally about `mean`; a reading errs normally about the truth with standard uncertainty `u`. */
export interface ReadProcess {
  mean: number;
  sd: number;
  u: number;
}

/** From and to, either of them infinite where there is no end. */
export interface Stretch {
  from: number;
  to: number;
}

/** The normal distribution is nothing further out than this, for a JS number. */
const FARTHEST = 38;
const NEAR = 9;

/** Nodes and weights of Gauss–Legendre quadrature with 16 points on −1 to 1, by Newton's method on the polynomial. */
const RULE = legendreRule(16);

function legendreRule(points: number): { node: number; weight: number }[] {
  return Array.from({ length: points }, (_, index) => {
    let node = Math.cos((Math.PI * (index + 0.75)) / (points + 0.5));
    for (;;) {
      const { value, slope } = legendreAt(points, node);
      const step = value / slope;
      node -= step;
      if (Math.abs(step) < 1e-15) return { node, weight: 2 / ((1 - node * node) * slope * slope) };
    }
  });
}

function legendreAt(degree: number, x: number): { value: number; slope: number } {
  let [before, value] = [1, x];
  for (let n = 2; n <= degree; n++)
    [before, value] = [value, ((2 * n - 1) * x * value - (n - 1) * before) / n];
  return { value, slope: (degree * (x * value - before)) / (x * x - 1) };
}

/** The chance that the true value lies in a stretch. */
export function chanceOfTruth({ mean, sd }: ReadProcess, { from, to }: Stretch): number {
  // On the far side of the mean the tails are subtracted, so that small chances keep their digits.
  return from > mean
    ? cdf(2 * mean - from, mean, sd) - cdf(2 * mean - to, mean, sd)
    : cdf(to, mean, sd) - cdf(from, mean, sd);
}

/**
 * The chance that the true value lies in `truth` and its reading in `read`: the integral over the truth of its density
 * times the chance of such a reading, in panels no wider than the finer of the two spreads wherever that matters.
 */
export function chanceOfBoth(process: ReadProcess, truth: Stretch, read: Stretch): number {
  const edges = panelEdges(process, truth, read);
  return edges.slice(1).reduce((sum, to, index) => sum + panel(process, edges[index] ?? to, to, read), 0);
}

function panel({ mean, sd, u }: ReadProcess, from: number, to: number, read: Stretch): number {
  const [middle, half] = [(from + to) / 2, (to - from) / 2];
  let sum = 0;
  for (const { node, weight } of RULE) {
    const truth = middle + half * node;
    const z = (truth - mean) / sd;
    const reading = chanceOfTruth({ mean: truth, sd: u, u }, read);
    sum += weight * Math.exp(-0.5 * z * z) * reading;
  }
  return (sum * half) / (sd * Math.sqrt(2 * Math.PI));
}

/** Where the integrand changes: each spread about the mean, each uncertainty about the ends of what is read. */
function panelEdges({ mean, sd, u }: ReadProcess, truth: Stretch, read: Stretch): number[] {
  const from = Math.max(truth.from, mean - FARTHEST * sd);
  const to = Math.min(truth.to, mean + FARTHEST * sd);
  if (from >= to) return [];
  const edges = new Set([from, to]);
  const add = (edge: number) => {
    if (edge > from && edge < to) edges.add(edge);
  };
  for (let turn = -FARTHEST; turn <= FARTHEST; turn++) add(mean + turn * sd);
  for (const end of [read.from, read.to].filter(Number.isFinite)) {
    for (let turn = -NEAR; turn <= NEAR; turn++) add(end + turn * u);
  }
  return [...edges].sort((a, b) => a - b);
}
