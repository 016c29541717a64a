import fc from 'fast-check';
import { type Length, MAX_LENGTH, TICKS_PER_INCH } from '@/lib/length';
import type { Attempt, Axis, Check, Line, Piece, Points, Reading, Rubric, SizeRule } from '@/lib/scoring';

/**
 * Rubrics and attempts that lie where rules meet: readings a tick to either side of an edge, of the gross limit and
 * of half a reading step; widths near thicknesses; every state of a piece; amounts at their bounds.
 */

/** Distances are small multiples of one of these, so that edges, margins and steps of reading coincide often. */
const SCALES: Length[] = [1, 2, 1_000_000, TICKS_PER_INCH / 128];
const PRICES: Points[] = [0, 1, 33, 50, 100, 250];
/** `constructor` is on every plain object: ids must be looked up as own properties. */
const IDS = ['constructor', 'shelf', 'rail', 'tenon-2', 'a', '0'];
const CHECK_IDS = ['constructor', 'square', 'surface', 'grain', '0'];

const atMost = (max: number) => fc.integer({ min: 0, max });
const pricesArb = fc.oneof(fc.constantFrom(...PRICES), atMost(1000));
const largeAmountArb = (max: Points) => fc.oneof(pricesArb, atMost(max), fc.constant(max));
const percentArb = fc.oneof(fc.constantFrom(0, 1, 33, 50, 100), atMost(100));

function sideArb(scale: Length) {
  const edges = fc.uniqueArray(atMost(12), { minLength: 1, maxLength: 5 });
  const prices = fc.array(pricesArb, { minLength: 5, maxLength: 5 });
  return fc.tuple(edges, prices, pricesArb).map(([withins, loses, more]) => {
    const ascending = [0, ...loses.toSorted((a, b) => a - b)];
    const bands = withins
      .toSorted((a, b) => a - b)
      .map((within, at) => ({ within: within * scale, lose: ascending[at] ?? 0 }));
    return { bands, beyond: (bands.at(-1)?.lose ?? 0) + more };
  });
}

export function sizeRuleArb(scale: Length): fc.Arbitrary<SizeRule> {
  return fc
    .tuple(sideArb(scale), sideArb(scale), fc.option(pricesArb, { freq: 3 }))
    .map(([over, under, cap]) => ({
      over: over.bands,
      under: under.bands,
      beyondOver: over.beyond,
      beyondUnder: under.beyond,
      cap,
    }));
}

const checkArb = (id: string): fc.Arbitrary<Check> =>
  fc.array(pricesArb, { maxLength: 3 }).chain((loses) =>
    fc.option(atMost(loses.length)).map((assume) => ({
      id,
      label: `check ${id}`,
      levels: [0, ...loses].map((lose, at) => ({ label: `level ${at}`, lose })),
      assume,
    })),
  );

const checksArb = fc
  .uniqueArray(fc.constantFrom(...CHECK_IDS), { maxLength: 3 })
  .chain((ids) => fc.tuple(...ids.map(checkArb)));

function lineArb(id: string, scale: Length): fc.Arbitrary<Line> {
  const targetArb = fc.integer({ min: 20, max: 45 }).map((steps) => steps * scale);
  const rule = sizeRuleArb(scale);
  return fc.record({
    id: fc.constant(id),
    label: fc.constant(`line ${id}`),
    quantity: fc.integer({ min: 1, max: 4 }),
    target: fc.record({ thickness: targetArb, width: targetArb, length: targetArb }),
    worth: largeAmountArb(100_000),
    missing: largeAmountArb(100_000),
    sizes: fc.record({ thickness: rule, width: rule, length: rule }),
    checks: checksArb,
    swap: fc.boolean(),
    set: fc.constantFrom('each' as const, 'worst' as const),
  });
}

const lateArb = fc
  .tuple(percentArb, percentArb)
  .map(([a, b]) => ({ perDay: Math.min(a, b), max: Math.max(a, b) }));

/** All policies but `start`, which depends on `basis`. */
function policyArb(scale: Length) {
  return {
    unit: fc.constantFrom('in' as const, 'mm' as const),
    basis: fc.constantFrom('worth' as const, 'start' as const),
    outOf: fc.option(fc.oneof(fc.constantFrom(0, 1, 10_000, 1_000_000), atMost(1_000_000)), { freq: 2 }),
    floor: percentArb,
    roundTo: fc.constantFrom(100, 50, 10, 1),
    readTo: fc.option(
      fc.integer({ min: 1, max: 5 }).map((steps) => steps * scale),
      { freq: 2 },
    ),
    margin: fc.oneof(
      fc.constantFrom(0, 1),
      atMost(3).map((steps) => steps * scale),
    ),
    grossLimit: fc.option(
      atMost(14).map((steps) => steps * scale),
      { freq: 3 },
    ),
    workChecks: checksArb,
    late: fc.option(lateArb, { freq: 2 }),
    ceiling: fc.oneof(fc.constantFrom(100, 101, 102, 200), fc.integer({ min: 100, max: 200 })),
  };
}

function rubricAtScaleArb(scale: Length): fc.Arbitrary<Rubric> {
  const linesArb = fc
    .uniqueArray(fc.constantFrom(...IDS), { minLength: 1, maxLength: 3 })
    .chain((ids) => fc.tuple(...ids.map((id) => lineArb(id, scale))));
  return fc
    .tuple(linesArb, fc.record(policyArb(scale)), largeAmountArb(1_000_000))
    .map(([lines, policy, start]) => ({ ...policy, start: policy.basis === 'start' ? start : null, lines }));
}

export const rubricArb: fc.Arbitrary<Rubric> = fc.constantFrom(...SCALES).chain(rubricAtScaleArb);

/** Distances from a target at which something can change for this line and axis. */
function edgesOf(rubric: Rubric, rule: SizeRule): Length[] {
  const steps = [...rule.over, ...rule.under].map(({ within }) => within + rubric.margin);
  const gross = rubric.grossLimit === null ? [] : [rubric.grossLimit + rubric.margin];
  const ties =
    rubric.readTo === null ? [] : [1, 2, 3, 5].map((half) => Math.ceil((half * (rubric.readTo ?? 0)) / 2));
  return [0, ...steps, ...gross, ...ties];
}

function valueArb(rubric: Rubric, line: Line, axis: Axis, shift: Length): fc.Arbitrary<Reading> {
  const target = line.target[axis];
  const edge = fc.constantFrom(...edgesOf(rubric, line.sizes[axis]));
  const nearEdge = fc
    .tuple(edge, fc.constantFrom(-1, 1), fc.constantFrom(-1, 0, 0, 1))
    .map(([distance, side, tick]) => target - shift + side * distance + tick);
  const ticks = fc.oneof(
    { weight: 6, arbitrary: nearEdge },
    { weight: 2, arbitrary: fc.constantFrom(line.target.thickness, line.target.width).map((t) => t - shift) },
    { weight: 1, arbitrary: fc.integer({ min: 1, max: 2 * target }) },
    { weight: 1, arbitrary: fc.constantFrom(1, MAX_LENGTH) },
  );
  return ticks.map((value) => ({ kind: 'value', ticks: Math.min(MAX_LENGTH, Math.max(1, value)) }));
}

function readingArb(
  rubric: Rubric,
  line: Line,
  axis: Axis,
  shift: Length,
): fc.Arbitrary<Reading | undefined> {
  return fc.oneof(
    { weight: 16, arbitrary: valueArb(rubric, line, axis, shift) },
    {
      weight: 3,
      arbitrary: fc.constantFrom<Reading>({ kind: 'gauged' }, { kind: 'spoiled' }, { kind: 'excused' }),
    },
    { weight: 1, arbitrary: fc.constant(undefined) },
  );
}

type Shift = Partial<Record<Axis, Length>>;

function sizesArb(rubric: Rubric, line: Line, shift: Shift): fc.Arbitrary<Piece['sizes']> {
  const at = (axis: Axis) => readingArb(rubric, line, axis, shift[axis] ?? 0);
  return fc
    .record({ thickness: at('thickness'), width: at('width'), length: at('length') })
    .map(({ thickness, width, length }) => ({
      ...(thickness && { thickness }),
      ...(width && { width }),
      ...(length && { length }),
    }));
}

function levelsArb(checks: readonly Check[]): fc.Arbitrary<Record<string, number>> {
  const entries = checks.map(({ id, levels }) =>
    fc
      .option(atMost(levels.length - 1), { freq: 3 })
      .map((level): [string, number][] => (level === null ? [] : [[id, level]])),
  );
  return fc.tuple(...entries).map((recorded) => Object.fromEntries(recorded.flat()));
}

const stateArb = fc.oneof(
  { weight: 8, arbitrary: fc.constant('present' as const) },
  {
    weight: 1,
    arbitrary: fc.constantFrom('missing' as const, 'held' as const, 'excused' as const, 'unlisted' as const),
  },
);

function pieceArb(rubric: Rubric, line: Line, ordinal: number, shift: Shift): fc.Arbitrary<Piece[]> {
  return fc
    .record({ state: stateArb, sizes: sizesArb(rubric, line, shift), checks: levelsArb(line.checks) })
    .map(({ state, ...recorded }) =>
      state === 'unlisted' ? [] : [{ lineId: line.id, ordinal, state, ...recorded }],
    );
}

function shiftArb(line: Line): fc.Arbitrary<Shift> {
  const most = Math.max(2, Math.floor(line.target.thickness / 10));
  const lengthArb = fc.integer({ min: -most, max: most });
  return fc.record({ thickness: lengthArb, width: lengthArb, length: lengthArb }, { requiredKeys: [] });
}

function adjustArb({ lines }: Rubric): fc.Arbitrary<NonNullable<Attempt['adjust']>> {
  const entries = lines.map((line) =>
    fc
      .option(shiftArb(line), { freq: 2 })
      .map((shift): [string, Shift][] => (shift === null ? [] : [[line.id, shift]])),
  );
  return fc.tuple(...entries).map((offsets) => Object.fromEntries(offsets.flat()));
}

/** Pieces in any order: what was recorded, or now and then every piece excused. */
function piecesArb(rubric: Rubric, adjust: NonNullable<Attempt['adjust']>): fc.Arbitrary<Piece[]> {
  const shifts = new Map(Object.entries(adjust));
  const places = rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, at) =>
      pieceArb(rubric, line, at + 1, shifts.get(line.id) ?? {}),
    ),
  );
  const allExcused = rubric.lines.flatMap((line) =>
    Array.from(
      { length: line.quantity },
      (_, at): Piece => ({ lineId: line.id, ordinal: at + 1, state: 'excused', sizes: {}, checks: {} }),
    ),
  );
  const recorded = fc.tuple(...places).map((pieces) => pieces.flat());
  return fc
    .oneof({ weight: 19, arbitrary: recorded }, { weight: 1, arbitrary: fc.constant(allExcused) })
    .chain((pieces) => fc.shuffledSubarray(pieces, { minLength: pieces.length }));
}

/** Attempts that fit the rubric. */
export function attemptArb(rubric: Rubric): fc.Arbitrary<Attempt> {
  return fc.option(adjustArb(rubric), { nil: undefined, freq: 1 }).chain((adjust) =>
    fc
      .record({
        pieces: piecesArb(rubric, adjust ?? {}),
        work: levelsArb(rubric.workChecks),
        bonus: fc.oneof(fc.constant(0), largeAmountArb(100_000)),
        daysLate: fc.oneof(atMost(4), fc.constantFrom(0, 100, Number.MAX_SAFE_INTEGER)),
      })
      .map((attempt) => (adjust === undefined ? attempt : { ...attempt, adjust })),
  );
}

/** A rubric with attempts that fit it. */
export function casesArb(limits: { minLength: number; maxLength: number }) {
  return rubricArb.chain((rubric) =>
    fc.record({ rubric: fc.constant(rubric), attempts: fc.array(attemptArb(rubric), limits) }),
  );
}

export const caseArb: fc.Arbitrary<{ rubric: Rubric; attempt: Attempt }> = rubricArb.chain((rubric) =>
  fc.record({ rubric: fc.constant(rubric), attempt: attemptArb(rubric) }),
);

/** The largest amounts the rules allow, where a product of three could leave exact arithmetic. */
export const boundsCaseArb: fc.Arbitrary<{ rubric: Rubric; attempt: Attempt }> = fc
  .record({
    line: lineArb('shelf', 1),
    worth: fc.integer({ min: 99_900, max: 100_000 }),
    policy: fc.record({ ...policyArb(1), ceiling: fc.integer({ min: 100, max: 200 }) }),
    outOf: fc.option(fc.integer({ min: 999_000, max: 1_000_000 })),
    start: fc.integer({ min: 999_000, max: 1_000_000 }),
    missing: fc.uniqueArray(fc.integer({ min: 1, max: 200 }), { maxLength: 30 }),
    bonus: fc.integer({ min: 0, max: 100_000 }),
    daysLate: atMost(3),
  })
  .map(({ line, worth, policy, outOf, start, missing, bonus, daysLate }) => {
    const full: Line = { ...line, worth, missing: 99_999, quantity: 200 };
    return {
      rubric: {
        ...policy,
        outOf,
        start: policy.basis === 'start' ? start : null,
        lines: [full, { ...full, id: 'rail' }],
      },
      attempt: {
        pieces: missing.map((ordinal) => ({
          lineId: 'rail',
          ordinal,
          state: 'missing',
          sizes: {},
          checks: {},
        })),
        work: {},
        bonus,
        daysLate,
      },
    };
  });
