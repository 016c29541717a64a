import { TICKS_PER_INCH } from '@/lib/length';
import {
  type Attempt,
  attemptSchema,
  type Line,
  type Rubric,
  rubricSchema,
  type SizeRule,
} from '@/lib/scoring';

const SEED = 20_261_201;
const LINES = 8;
const QUANTITY = 2;
const ATTEMPTS = 1000;

/** mulberry32: a small seeded generator, so that every run marks the same work. */
function makeRandom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

const sixtyFourths = (count: number) => (count * TICKS_PER_INCH) / 64;

/** 8 lines of 2, three bands a side, thickness and width either way round, two checks. */
export function makeRubric(): Rubric {
  const bands = [2, 4, 6].map((within, at) => ({ within: sixtyFourths(within), lose: at * 100 }));
  const rule: SizeRule = { over: bands, under: bands, beyondOver: 300, beyondUnder: 300, cap: null };
  const check = (id: string) => ({
    id,
    label: id,
    levels: [
      { label: 'pass', lose: 0 },
      { label: 'fail', lose: 100 },
    ],
    assume: 0,
  });
  return rubricSchema.parse({
    unit: 'in',
    basis: 'worth',
    start: null,
    outOf: 10_000,
    floor: 0,
    roundTo: 100,
    readTo: null,
    margin: (2 * TICKS_PER_INCH) / 1000,
    grossLimit: sixtyFourths(16),
    lines: Array.from({ length: LINES }, (_, at) => ({
      id: `line-${at + 1}`,
      label: `Line ${at + 1}`,
      quantity: QUANTITY,
      target: {
        thickness: sixtyFourths(48),
        width: sixtyFourths(52 + 8 * at),
        length: sixtyFourths(192 + 32 * at),
      },
      worth: 900,
      missing: 900,
      sizes: { thickness: rule, width: rule, length: rule },
      checks: [check('square'), check('surface')],
      swap: true,
      set: 'each',
    })),
    workChecks: [],
    late: null,
    ceiling: 102,
  });
}

/** 1000 attempts, the same in every run; one piece in five lies with thickness and width exchanged. */
export function makeAttempts(rubric: Rubric): Attempt[] {
  const random = makeRandom(SEED);
  const read = (target: number) => ({
    kind: 'value',
    ticks: target + Math.round((random() + random() + random() - 1.5) * sixtyFourths(10)),
  });
  const makePieces = (line: Line) =>
    Array.from({ length: line.quantity }, (_, at) => {
      const thickness = read(line.target.thickness);
      const width = read(line.target.width);
      const turned = random() < 0.2;
      return {
        lineId: line.id,
        ordinal: at + 1,
        state: 'present',
        sizes: {
          thickness: turned ? width : thickness,
          width: turned ? thickness : width,
          length: read(line.target.length),
        },
        checks: { square: random() < 0.1 ? 1 : 0, surface: random() < 0.1 ? 1 : 0 },
      };
    });
  const recorded = Array.from({ length: ATTEMPTS }, () => ({
    pieces: rubric.lines.flatMap(makePieces),
    work: {},
    bonus: 0,
    daysLate: 0,
  }));
  // Through JSON and the schema, as attempts come from storage.
  return attemptSchema.array().parse(JSON.parse(JSON.stringify(recorded)));
}
