import fc from 'fast-check';
import { describe, expect, expectTypeOf, it, vi } from 'vitest';
import type { z } from 'zod';
import { MAX_LENGTH } from '@/lib/length';
import {
  type Attempt,
  attemptSchema,
  type Band,
  type bandSchema,
  type Check,
  checkSchema,
  type Line,
  lineSchema,
  type Piece,
  pieceSchema,
  type Reading,
  type Rubric,
  type readingSchema,
  rubricSchema,
  type SizeRule,
  sizeRuleSchema,
} from '@/lib/scoring';
import { caseArb } from '../../support/scoring-arbitraries';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  makeRule,
  value,
} from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

/** The messages of a refusal, each with where it applies; none where the value is accepted. */
function complaints(schema: z.ZodType, given: unknown): string[] {
  const { error } = schema.safeParse(given);
  return (error?.issues ?? []).map(({ path, message }) => `${path.join('.')}: ${message}`);
}

const text = (count: number, first = 'a') => first + 'b'.repeat(count - 1);
const bands = (count: number) => Array.from({ length: count }, (_, at) => ({ within: at, lose: at }));
const checks = (count: number) => Array.from({ length: count }, (_, at) => makeCheck(`check-${at}`, [0, 1]));
const lines = (...quantities: number[]) =>
  quantities.map((quantity, at) => makeLine({ id: `line-${at}`, quantity }));

describe('the schemas', () => {
  it('give the types of the contract', () => {
    expectTypeOf<z.output<typeof rubricSchema>>().toEqualTypeOf<Rubric>();
    expectTypeOf<z.output<typeof lineSchema>>().toEqualTypeOf<Line>();
    expectTypeOf<z.output<typeof sizeRuleSchema>>().toEqualTypeOf<SizeRule>();
    expectTypeOf<z.output<typeof bandSchema>>().toEqualTypeOf<Band>();
    expectTypeOf<z.output<typeof checkSchema>>().toEqualTypeOf<Check>();
    expectTypeOf<z.output<typeof attemptSchema>>().toEqualTypeOf<Attempt>();
    expectTypeOf<z.output<typeof pieceSchema>>().toEqualTypeOf<Piece>();
    expectTypeOf<z.output<typeof readingSchema>>().toEqualTypeOf<Reading>();
    expect(rubricSchema.parse(makeRubric({}))).toEqual(makeRubric({}));
  });

  it('answer any value at all without failing', () => {
    const anything = fc.anything({ withNullPrototype: true, withSparseArray: true });
    fc.assert(
      fc.property(anything, (given) => {
        rubricSchema.safeParse(given);
        attemptSchema.safeParse(given);
      }),
    );
  });

  it('answer a rubric and an attempt with one value gone wrong without failing', () => {
    const spoil = (json: unknown, at: number, bad: unknown): unknown => {
      let seen = -1;
      return JSON.parse(JSON.stringify(json), (_key, part) => {
        seen += 1;
        return seen === at ? bad : part;
      });
    };
    const bad = fc.constantFrom<unknown>(null, -1, 0.5, 1e300, 'x', [], {}, true);
    fc.assert(
      fc.property(caseArb, fc.nat(200), bad, ({ rubric, attempt }, at, wrong) => {
        rubricSchema.safeParse(spoil(rubric, at, wrong));
        attemptSchema.safeParse(spoil(attempt, at, wrong));
      }),
      { numRuns: 300 },
    );
  });
});

describe('a rubric', () => {
  const good: [string, Partial<Rubric>][] = [
    ['amounts at their least', { floor: 0, margin: 0, grossLimit: 0, readTo: 1, ceiling: 100, outOf: 0 }],
    ['amounts at their greatest', { floor: 100, margin: MAX_LENGTH, grossLimit: MAX_LENGTH, ceiling: 200 }],
    ['a total of 10 000 points', { outOf: 1_000_000, readTo: MAX_LENGTH }],
    ['a start of 10 000 points', { basis: 'start', start: 1_000_000 }],
    ['a start of 0', { basis: 'start', start: 0 }],
    ['lateness that costs nothing', { late: { perDay: 0, max: 0 } }],
    ['lateness that costs all', { late: { perDay: 100, max: 100 } }],
    ['400 pieces', { lines: lines(200, 200) }],
    ['200 lines', { lines: lines(...Array.from({ length: 200 }, () => 2)) }],
    ['20 work checks', { workChecks: checks(20) }],
    [
      'the same check on a line and on the work',
      { lines: [makeLine({ checks: checks(1) })], workChecks: checks(1) },
    ],
    ...[100, 50, 10, 1].map((roundTo): [string, Partial<Rubric>] => [`rounding to ${roundTo}`, { roundTo }]),
  ];

  it.each(good)('is accepted with %s', (_, changes) => {
    expect(complaints(rubricSchema, makeRubric(changes))).toEqual([]);
  });

  const bad: [string, object, string][] = [
    ['no line', { lines: [] }, 'lines: a rubric has at least one line'],
    [
      '201 lines',
      { lines: lines(...Array.from({ length: 201 }, () => 1)) },
      'lines: a rubric has at most 200 lines',
    ],
    ['401 pieces', { lines: lines(200, 200, 1) }, 'lines: a rubric has at most 400 pieces in all'],
    ['two lines alike', { lines: [makeLine({}), makeLine({})] }, 'lines: two lines have the same id'],
    [
      'no start where the basis is start',
      { basis: 'start', start: null },
      'start: a starting score is given when the basis is start, and only then',
    ],
    [
      'a start where the basis is worth',
      { basis: 'worth', start: 100 },
      'start: a starting score is given when the basis is start, and only then',
    ],
    [
      'a start above 10 000 points',
      { basis: 'start', start: 1_000_001 },
      'start: a total, in hundredths of a point, is at most 1000000',
    ],
    [
      'a total above 10 000 points',
      { outOf: 1_000_001 },
      'outOf: a total, in hundredths of a point, is at most 1000000',
    ],
    ['a negative total', { outOf: -1 }, 'outOf: a total, in hundredths of a point, is at least 0'],
    ['a broken total', { outOf: 0.5 }, 'outOf: a total, in hundredths of a point, is a whole number'],
    ['a floor above 100', { floor: 101 }, 'floor: the floor, in percent, is at most 100'],
    ['a floor below 0', { floor: -1 }, 'floor: the floor, in percent, is at least 0'],
    ['a broken floor', { floor: 0.5 }, 'floor: the floor, in percent, is a whole number'],
    ['rounding to 25', { roundTo: 25 }, 'roundTo: round to 100, 50, 10 or 1 hundredths'],
    ['rounding to 0', { roundTo: 0 }, 'roundTo: round to 100, 50, 10 or 1 hundredths'],
    ['reading to 0', { readTo: 0 }, 'readTo: a length is more than 0'],
    ['reading to half a tick', { readTo: 1.5 }, 'readTo: a length is a whole number of ticks'],
    ['a negative margin', { margin: -1 }, 'margin: a distance is not negative'],
    ['a margin above 10 m', { margin: MAX_LENGTH + 1 }, 'margin: a length is at most 10 m'],
    ['a negative gross limit', { grossLimit: -1 }, 'grossLimit: a distance is not negative'],
    ['a ceiling below 100', { ceiling: 99 }, 'ceiling: the ceiling, in percent, is at least 100'],
    ['a ceiling above 200', { ceiling: 201 }, 'ceiling: the ceiling, in percent, is at most 200'],
    [
      'a day dearer than the most',
      { late: { perDay: 11, max: 10 } },
      'late.max: the greatest percent is no less than the percent a day',
    ],
    [
      'lateness above 100',
      { late: { perDay: 1, max: 101 } },
      'late.max: the greatest percent is at most 100',
    ],
    ['another unit', { unit: 'cm' }, 'unit: Invalid option: expected one of "in"|"mm"'],
    ['another basis', { basis: 'total' }, 'basis: Invalid option: expected one of "worth"|"start"'],
    ['21 work checks', { workChecks: checks(21) }, 'workChecks: a list has at most 20 checks'],
    ['an unknown key', { colour: 'red' }, ': Unrecognized key: "colour"'],
    [
      'an unknown key of lateness',
      { late: { perDay: 1, max: 2, from: 3 } },
      'late: Unrecognized key: "from"',
    ],
  ];

  it.each(bad)('is refused with %s', (_, changes, complaint) => {
    expect(complaints(rubricSchema, { ...makeRubric({}), ...changes })).toEqual([complaint]);
  });

  it.each(Object.keys(makeRubric({})))('is refused without %s', (key) => {
    const { [key]: _, ...rest } = Object.fromEntries(Object.entries(makeRubric({})));
    expect(complaints(rubricSchema, rest).length).toBeGreaterThan(0);
  });

  it('is refused with a key named __proto__', () => {
    const json = JSON.stringify(makeRubric({})).replace('{', '{"__proto__":1,');
    expect(complaints(rubricSchema, JSON.parse(json))).toEqual([': Unrecognized key: "__proto__"']);
  });
});

describe('a line', () => {
  it.each([
    ['an id of one sign', { id: '0' }],
    ['an id of 64 signs', { id: text(64) }],
    ['an id with - and _', { id: 'tenon-2_b' }],
    ['an id that every object has', { id: 'constructor' }],
    ['no label', { label: '' }],
    ['200 pieces', { quantity: 200 }],
    ['nothing to lose', { worth: 0, missing: 0 }],
    ['1 000 points', { worth: 100_000, missing: 100_000 }],
    ['20 checks', { checks: checks(20) }],
    ['a length of 10 m', { target: { thickness: 1, width: 1, length: MAX_LENGTH } }],
  ])('is accepted with %s', (_, changes) => {
    expect(complaints(lineSchema, { ...makeLine({}), ...changes })).toEqual([]);
  });

  const notAnId = 'id: an id has 1 to 64 small letters, digits, - or _, and begins with a letter or a digit';
  it.each([
    ...['', 'Shelf', '-shelf', '_shelf', 'shelf 1', 'schräg', 'a.b', 'shelf\n', text(65)].map(
      (id): [string, object, string] => [`the id ${JSON.stringify(id)}`, { id }, notAnId],
    ),
    ['no piece', { quantity: 0 }, 'quantity: the quantity is at least 1'],
    ['201 pieces', { quantity: 201 }, 'quantity: the quantity is at most 200'],
    ['half a piece', { quantity: 1.5 }, 'quantity: the quantity is a whole number'],
    [
      'a target of 0',
      { target: { thickness: 0, width: 1, length: 1 } },
      'target.thickness: a length is more than 0',
    ],
    [
      'a target above 10 m',
      { target: { thickness: 1, width: MAX_LENGTH + 1, length: 1 } },
      'target.width: a length is at most 10 m',
    ],
    [
      'a target between ticks',
      { target: { thickness: 1, width: 1, length: 1.5 } },
      'target.length: a length is a whole number of ticks',
    ],
    ['a negative worth', { worth: -1 }, 'worth: an amount of points, in hundredths, is at least 0'],
    [
      'a worth above 1 000 points',
      { worth: 100_001 },
      'worth: an amount of points, in hundredths, is at most 100000',
    ],
    [
      'a missing price in broken hundredths',
      { missing: 0.5 },
      'missing: an amount of points, in hundredths, is a whole number',
    ],
    ['two checks alike', { checks: [...checks(1), ...checks(1)] }, 'checks: two checks have the same id'],
    ['another set', { set: 'best' }, 'set: Invalid option: expected one of "each"|"worst"'],
    ['a swap that is no yes or no', { swap: 1 }, 'swap: Invalid input: expected boolean, received number'],
    ['an unknown key', { wood: 'maple' }, ': Unrecognized key: "wood"'],
    [
      'an unknown axis',
      { target: { ...makeLine({}).target, depth: 1 } },
      'target: Unrecognized key: "depth"',
    ],
    [
      'an unknown size',
      { sizes: { ...makeLine({}).sizes, depth: makeRule() } },
      'sizes: Unrecognized key: "depth"',
    ],
  ] satisfies [string, object, string][])('is refused with %s', (_, changes, complaint) => {
    expect(complaints(lineSchema, { ...makeLine({}), ...changes })).toEqual([complaint]);
  });
});

describe('a size rule', () => {
  it.each([
    ['one band a side', { over: bands(1), under: bands(1) }],
    ['20 bands a side', { over: bands(20), under: bands(20) }],
    [
      'bands that cost alike',
      {
        over: [
          { within: 0, lose: 0 },
          { within: 1, lose: 0 },
        ],
      },
    ],
    ['a first band of no width', { under: [{ within: 0, lose: 0 }] }],
    ['beyond no dearer than the last band', { beyondOver: 200, beyondUnder: 200 }],
    ['a cap of 0', { cap: 0 }],
    ['sides that differ', { over: bands(2), beyondUnder: 100_000 }],
  ])('is accepted with %s', (_, changes) => {
    expect(complaints(sizeRuleSchema, { ...makeRule(), ...changes })).toEqual([]);
  });

  const cheaper = 'past the last band a size loses no less than in it';
  it.each([
    ['no band', { over: [] }, 'over: a side has at least one band'],
    ['21 bands', { under: bands(21) }, 'under: a side has at most 20 bands'],
    ['a first band that costs', { over: [{ within: 1, lose: 1 }] }, 'over: the first band loses 0'],
    [
      'two bands that reach as far',
      {
        over: [
          { within: 1, lose: 0 },
          { within: 1, lose: 1 },
        ],
      },
      'over: each band reaches further than the one before it',
    ],
    [
      'bands out of order',
      {
        under: [
          { within: 2, lose: 0 },
          { within: 1, lose: 1 },
        ],
      },
      'under: each band reaches further than the one before it',
    ],
    [
      'a band cheaper than the one before',
      {
        under: [
          { within: 1, lose: 0 },
          { within: 2, lose: 5 },
          { within: 3, lose: 4 },
        ],
      },
      'under: a band loses no less than the one before it',
    ],
    ['a negative band', { over: [{ within: -1, lose: 0 }] }, 'over.0.within: a distance is not negative'],
    ['beyond over cheaper than the last band', { beyondOver: 199 }, `beyondOver: ${cheaper}`],
    ['beyond under cheaper than the last band', { beyondUnder: 199 }, `beyondUnder: ${cheaper}`],
    ['a negative cap', { cap: -1 }, 'cap: an amount of points, in hundredths, is at least 0'],
    ['an unknown key', { free: 1 }, ': Unrecognized key: "free"'],
    [
      'an unknown key of a band',
      { over: [{ within: 1, lose: 0, name: 'free' }] },
      'over.0: Unrecognized key: "name"',
    ],
  ])('is refused with %s', (_, changes, complaint) => {
    expect(complaints(sizeRuleSchema, { ...makeRule(), ...changes })).toEqual([complaint]);
  });
});

describe('a check', () => {
  it.each([
    makeCheck('square', [0], 0),
    makeCheck('square', [0], null),
    makeCheck('square', [0, 5, 3, 0], 3),
    makeCheck(
      'square',
      Array.from({ length: 10 }, () => 0),
      9,
    ),
    makeCheck('constructor', [0, 100_000], 1),
  ])('is accepted: %j', (check) => {
    expect(complaints(checkSchema, check)).toEqual([]);
  });

  const reserved = 'id: a check is not called thickness, width, length, piece or held';
  it.each([
    ...['thickness', 'width', 'length', 'piece', 'held'].map((id): [string, object, string] => [
      id,
      { id },
      reserved,
    ]),
    ['no level', { levels: [], assume: null }, 'levels: a check has at least one level'],
    [
      '11 levels',
      makeCheck(
        'square',
        Array.from({ length: 11 }, () => 0),
      ),
      'levels: a check has at most 10 levels',
    ],
    ['a first level that costs', makeCheck('square', [1, 2]), 'levels: the first level loses 0'],
    ['an assumed level that is not there', { assume: 2 }, 'assume: the assumed level is one of the levels'],
    ['an assumed level below 0', { assume: -1 }, 'assume: the assumed level is at least 0'],
    ['half a level', { assume: 0.5 }, 'assume: the assumed level is a whole number'],
    ['an unknown key', { weight: 1 }, ': Unrecognized key: "weight"'],
    [
      'an unknown key of a level',
      { levels: [{ label: '', lose: 0, id: 'a' }] },
      'levels.0: Unrecognized key: "id"',
    ],
  ] satisfies [string, object, string][])('is refused: %s', (_, changes, complaint) => {
    expect(complaints(checkSchema, { ...makeCheck('square', [0, 1]), ...changes })).toContain(complaint);
  });
});

describe('an attempt', () => {
  const piece = makePiece('shelf', 1);

  it.each([
    ['nothing', {}],
    ['a bonus of 1 000 points', { bonus: 100_000 }],
    ['any number of days late', { daysLate: Number.MAX_SAFE_INTEGER }],
    ['offsets to either side', { adjust: { shelf: { width: -5, length: MAX_LENGTH }, rail: {} } }],
    ['ids that every object has', { work: { constructor: 1 }, adjust: { constructor: { width: 1 } } }],
    ['no offsets', { adjust: undefined }],
    ['pieces that differ by number', { pieces: [piece, makePiece('shelf', 2)] }],
    ['pieces that differ by line', { pieces: [piece, makePiece('rail', 1)] }],
    ['ids that only together look alike', { pieces: [makePiece('a', 11), makePiece('a1', 1)] }],
    [
      'every kind of reading',
      {
        pieces: [
          makePiece('a', 1, { thickness: { kind: 'spoiled' }, width: 5, length: { kind: 'excused' } }),
        ],
      },
    ],
  ])('is accepted with %s', (_, changes) => {
    const attempt = { ...makeAttempt([]), ...changes };
    expect(attemptSchema.parse(attempt)).toEqual(attempt);
  });

  const notAnId = 'an id has 1 to 64 small letters, digits, - or _, and begins with a letter or a digit';
  it.each([
    ['a negative bonus', { bonus: -1 }, 'bonus: an amount of points, in hundredths, is at least 0'],
    [
      'a bonus above 1 000 points',
      { bonus: 100_001 },
      'bonus: an amount of points, in hundredths, is at most 100000',
    ],
    ['a negative number of days', { daysLate: -1 }, 'daysLate: the number of days late is at least 0'],
    ['half a day', { daysLate: 0.5 }, 'daysLate: the number of days late is a whole number'],
    ['a piece twice', { pieces: [piece, piece] }, 'pieces: a piece is recorded twice'],
    ['a level below 0', { work: { name: -1 } }, 'work.name: a level is at least 0'],
    ['an eleventh level', { work: { name: 10 } }, 'work.name: a level is at most 9'],
    ['half a level', { work: { name: 0.5 } }, 'work.name: a level is a whole number'],
    ['a check that is no id', { work: { Name: 0 } }, `work.Name: unknown key: ${notAnId}`],
    [
      'an offset above 10 m',
      { adjust: { shelf: { width: MAX_LENGTH + 1 } } },
      'adjust.shelf.width: a length is at most 10 m',
    ],
    [
      'an offset below −10 m',
      { adjust: { shelf: { width: -MAX_LENGTH - 1 } } },
      'adjust.shelf.width: a length is at most 10 m',
    ],
    [
      'an offset between ticks',
      { adjust: { shelf: { width: 0.5 } } },
      'adjust.shelf.width: a length is a whole number of ticks',
    ],
    ['an offset on no axis', { adjust: { shelf: { depth: 1 } } }, 'adjust.shelf: Unrecognized key: "depth"'],
    ['an offset for what is no id', { adjust: { Shelf: {} } }, `adjust.Shelf: unknown key: ${notAnId}`],
    ['an unknown key', { student: 'x' }, ': Unrecognized key: "student"'],
  ])('is refused with %s', (_, changes, complaint) => {
    expect(complaints(attemptSchema, { ...makeAttempt([]), ...changes })).toEqual([complaint]);
  });

  it('is refused with a key named __proto__ in any of its records', () => {
    const parse = (json: string) => complaints(attemptSchema, JSON.parse(json));
    const rest = '"bonus":0,"daysLate":0';
    expect(parse(`{"pieces":[],"work":{"__proto__":1},${rest}}`)).toEqual(['work: unknown key __proto__']);
    expect(parse(`{"pieces":[],"work":{},"adjust":{"__proto__":{}},${rest}}`)).toEqual([
      'adjust: unknown key __proto__',
    ]);
    expect(parse(`{"pieces":[],"work":{},"__proto__":1,${rest}}`)).toEqual([
      ': Unrecognized key: "__proto__"',
    ]);
  });

  it.each([
    ['the number 0', { ordinal: 0 }, 'ordinal: the number of a piece is at least 1'],
    ['a number above 200', { ordinal: 201 }, 'ordinal: the number of a piece is at most 200'],
    ['half a number', { ordinal: 1.5 }, 'ordinal: the number of a piece is a whole number'],
    ['a line that is no id', { lineId: 'Shelf' }, `lineId: ${notAnId}`],
    [
      'another state',
      { state: 'unread' },
      'state: Invalid option: expected one of "present"|"missing"|"held"|"excused"',
    ],
    ['an unknown axis', { sizes: { depth: value(1) } }, 'sizes: Unrecognized key: "depth"'],
    ['a reading of 0', { sizes: { width: value(0) } }, 'sizes.width.ticks: a length is more than 0'],
    ['a negative reading', { sizes: { width: value(-1) } }, 'sizes.width.ticks: a length is more than 0'],
    [
      'a reading above 10 m',
      { sizes: { width: value(MAX_LENGTH + 1) } },
      'sizes.width.ticks: a length is at most 10 m',
    ],
    [
      'a reading between ticks',
      { sizes: { width: value(0.5) } },
      'sizes.width.ticks: a length is a whole number of ticks',
    ],
    [
      'a gauged number',
      { sizes: { width: { kind: 'gauged', ticks: 5 } } },
      'sizes.width: Unrecognized key: "ticks"',
    ],
    ['a level that no check has', { checks: { square: 10 } }, 'checks.square: a level is at most 9'],
    ['an unknown key', { note: '' }, ': Unrecognized key: "note"'],
  ])('is refused with a piece that has %s', (_, changes, complaint) => {
    expect(complaints(pieceSchema, { ...piece, ...changes })).toEqual([complaint]);
  });

  it('is refused with a reading of another kind or none', () => {
    for (const width of [{ kind: 'unread' }, {}, null, 5, { kind: 'value' }]) {
      expect(complaints(pieceSchema, { ...piece, sizes: { width } })).toHaveLength(1);
    }
  });

  it('turns a negative zero into zero', () => {
    const json = '{"pieces":[],"work":{"name":-0},"bonus":-0,"daysLate":-0,"adjust":{"shelf":{"width":-0}}}';
    const attempt = attemptSchema.parse(JSON.parse(json));
    expect(attempt).toEqual({
      pieces: [],
      work: { name: 0 },
      bonus: 0,
      daysLate: 0,
      adjust: { shelf: { width: 0 } },
    });
  });
});
