import { describe, expect, it } from 'vitest';
import { MAX_LENGTH } from '@/lib/length';
import { rubricSchema, ScoringError, scoreAttempt } from '@/lib/scoring';
import { excusedAxes, type Modification, modifyAttempt, modifyRubric } from '@/lib/scoring/modification';
import { defaultRubric, ticksOf } from '../../support/rubrics';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  makeRule,
  sixtyFourths,
} from '../../support/scoring-examples';

const NONE: Modification = { format: 1, widen: { num: 1, den: 1 }, excused: [], checks: [] };
const TWICE: Modification = { ...NONE, widen: { num: 2, den: 1 } };
const excusing = (...excused: Modification['excused']): Modification => ({ ...NONE, excused });

/** The sheet of an attempt under a modification. */
function sheetOf(
  rubric: Parameters<typeof modifyRubric>[0],
  attempt: Parameters<typeof modifyAttempt>[1],
  modification: Modification,
) {
  return scoreAttempt(modifyRubric(rubric, modification), modifyAttempt(rubric, attempt, modification));
}

describe('a rubric with wider bands', () => {
  it('gives the example of its description', () => {
    const rubric = modifyRubric(defaultRubric(), {
      format: 1,
      widen: { num: 2, den: 1 },
      excused: [],
      checks: [],
    });
    expect(rubric.lines[0]?.sizes.length.over[0]).toEqual({ within: ticksOf('1/16'), lose: 0 });
  });

  it('widens every band of both sides and the gross limit, and leaves prices, margin and worth', () => {
    const before = makeRubric({ margin: 7, grossLimit: sixtyFourths(16) });
    const after = modifyRubric(before, { ...NONE, widen: { num: 3, den: 2 } });
    const side = [
      { within: sixtyFourths(3), lose: 0 },
      { within: sixtyFourths(6), lose: 100 },
      { within: sixtyFourths(9), lose: 200 },
    ];
    expect(after.lines[0]?.sizes.width).toEqual({ ...makeRule(), over: side, under: side });
    expect(after).toMatchObject({ margin: 7, grossLimit: sixtyFourths(24), outOf: null });
    expect(after.lines[0]).toMatchObject({ worth: 900, missing: 900 });
  });

  it.each([
    [1, { num: 3, den: 2 }, 2],
    [1, { num: 4, den: 3 }, 1],
    [2, { num: 5, den: 4 }, 3],
    [0, { num: 10, den: 1 }, 0],
  ])('rounds %i ticks times %j half up to %i', (within, widen, expected) => {
    const rule = makeRule({ over: [{ within, lose: 0 }] });
    const [line] = modifyRubric(makeRubric({ lines: [makeLine({ rule })] }), { ...NONE, widen }).lines;
    expect(line?.sizes.length.over[0]?.within).toBe(expected);
  });

  it('ends at 10 m: of the bands that would reach past it the cheapest stays', () => {
    const far = MAX_LENGTH / 4;
    const over = [
      { within: far, lose: 0 },
      { within: far + 5, lose: 100 },
      { within: MAX_LENGTH, lose: 200 },
    ];
    const rubric = makeRubric({ grossLimit: MAX_LENGTH, lines: [makeLine({ rule: makeRule({ over }) })] });
    const after = modifyRubric(rubric, { ...NONE, widen: { num: 10_000, den: 1000 } });
    expect(after.lines[0]?.sizes.length.over).toEqual([{ within: MAX_LENGTH, lose: 0 }]);
    expect(after.grossLimit).toBe(MAX_LENGTH);
    expect(rubricSchema.safeParse(after).success).toBe(true);
  });

  it('prices a deviation by the wider band, margin as before', () => {
    const rubric = makeRubric({ margin: 5 });
    const off = (ticks: number) =>
      makeAttempt([makePiece('shelf', 1, { length: sixtyFourths(256) + ticks })]);
    expect(sheetOf(rubric, off(sixtyFourths(4) + 5), TWICE).lost).toBe(0);
    expect(sheetOf(rubric, off(sixtyFourths(4) + 6), TWICE).lost).toBe(100);
    expect(sheetOf(rubric, off(-sixtyFourths(12) - 6), TWICE).lost).toBe(300);
  });

  it('makes a piece gross only past the wider limit', () => {
    const rubric = makeRubric({ grossLimit: sixtyFourths(16) });
    const attempt = makeAttempt([makePiece('shelf', 1, { length: sixtyFourths(256 + 20) })]);
    expect(scoreAttempt(rubric, attempt).pieces[0]).toMatchObject({ gross: true, lose: 900 });
    expect(sheetOf(rubric, attempt, TWICE).pieces[0]).toMatchObject({ gross: false, lose: 300 });
  });

  it('lets a swap stand or fall by the wider bands', () => {
    // As read +8 and -5 sixty-fourths off, exchanged +7 and -4.
    const lines = [makeLine({ target: { thickness: sixtyFourths(48), width: sixtyFourths(60), length: 9 } })];
    const attempt = makeAttempt([
      makePiece('shelf', 1, { thickness: sixtyFourths(56), width: sixtyFourths(55) }),
    ]);
    const rubric = makeRubric({ lines });
    expect(scoreAttempt(rubric, attempt).pieces[0]).toMatchObject({ swapped: true, lose: 400 });
    expect(sheetOf(rubric, attempt, TWICE).pieces[0]).toMatchObject({ swapped: true, lose: 100 });
    expect(sheetOf(rubric, attempt, { ...NONE, widen: { num: 4, den: 1 } }).pieces[0]).toMatchObject({
      swapped: false,
      lose: 0,
    });
  });

  it('lets every piece of a set lose what the worst of them loses by the wider bands', () => {
    const rubric = makeRubric({ lines: [makeLine({ quantity: 2, set: 'worst' })] });
    const attempt = makeAttempt([
      makePiece('shelf', 1, { length: sixtyFourths(256 + 8) }),
      makePiece('shelf', 2),
    ]);
    expect(scoreAttempt(rubric, attempt).pieces.map(({ lose }) => lose)).toEqual([300, 300]);
    expect(sheetOf(rubric, attempt, TWICE).pieces.map(({ lose }) => lose)).toEqual([100, 100]);
  });
});

describe('what is excused', () => {
  const lines = [
    makeLine({ quantity: 2 }),
    makeLine({ id: 'rail', checks: [makeCheck('square', [0, 100], null)] }),
  ];
  const rubric = makeRubric({ lines });

  it('gives the example of its description', () => {
    const attempt = makeAttempt([makePiece('shelf', 1)]);
    expect(modifyAttempt(rubric, attempt, excusing({ lineId: 'shelf', axis: null })).pieces[0]?.state).toBe(
      'excused',
    );
  });

  it.each([
    [[{ lineId: 'shelf', axis: null }], ['thickness', 'width', 'length']],
    [[{ lineId: null, axis: 'width' as const }], ['width']],
    [[{ lineId: 'rail', axis: null }], []],
    [
      [
        { lineId: 'shelf', axis: 'length' as const },
        { lineId: null, axis: 'thickness' as const },
      ],
      ['thickness', 'length'],
    ],
  ])('%j excuses these axes of a shelf: %j', (excused, axes) => {
    expect(excusedAxes('shelf', { excused })).toEqual(axes);
  });

  it('leaves nothing unread of an excused line, whatever was recorded of it', () => {
    const held = { ...makePiece('rail', 1), state: 'held' as const };
    for (const pieces of [[], [makePiece('rail', 1)], [held]]) {
      const attempt = makeAttempt([makePiece('shelf', 1), makePiece('shelf', 2), ...pieces]);
      const sheet = sheetOf(rubric, attempt, excusing({ lineId: 'rail', axis: null }));
      expect(sheet).toMatchObject({ complete: true, unread: [], possible: 1800, total: 2700, score: 2700 });
      expect(sheet.pieces[2]).toMatchObject({ state: 'excused', lose: 0 });
    }
  });

  it('scales what is left of the worths to the same total', () => {
    const attempt = makeAttempt([
      makePiece('shelf', 1, { length: sixtyFourths(256 + 20) }),
      makePiece('shelf', 2),
    ]);
    const sheet = sheetOf(rubric, attempt, excusing({ lineId: 'rail', axis: null }));
    expect(sheet).toMatchObject({ possible: 1800, lost: 300, raw: 1500, total: 2700, provisional: 2250 });
  });

  it('leaves the total to the attempt where no whole line is excused', () => {
    const attempt = makeAttempt([{ ...makePiece('shelf', 1), state: 'excused' }]);
    const { total } = scoreAttempt(rubric, attempt);
    expect(sheetOf(rubric, attempt, excusing({ lineId: null, axis: 'width' })).total).toBe(total);
    expect(total).toBe(1800);
  });

  it('cannot keep a sum of worths that a total cannot hold', () => {
    const rich = makeRubric({
      lines: [makeLine({ quantity: 11, worth: 100_000 }), makeLine({ id: 'rail' })],
    });
    const after = modifyRubric(rich, excusing({ lineId: 'rail', axis: null }));
    expect(after.outOf).toBeNull();
    expect(rubricSchema.safeParse(after).success).toBe(true);
  });

  it('holds nothing recorded on an excused axis against the student, gross and spoiled included', () => {
    const rough = makeRubric({ grossLimit: sixtyFourths(16), lines });
    const pieces = [
      makePiece('shelf', 1, { length: sixtyFourths(512) }),
      makePiece('shelf', 2, { length: { kind: 'spoiled' } }),
      makePiece('rail', 1, {}, { square: 1 }),
    ];
    const sheet = sheetOf(rough, makeAttempt(pieces), excusing({ lineId: null, axis: 'length' }));
    expect(sheet.lost).toBe(100);
    expect(sheet.pieces[0]?.sizes?.length).toMatchObject({ band: 'excused', lose: 0 });
  });

  it('asks for the other sizes of a piece that nobody has read', () => {
    const sheet = sheetOf(rubric, makeAttempt([]), excusing({ lineId: null, axis: 'length' }));
    expect(sheet.unread[0]).toEqual({ lineId: 'shelf', ordinal: 1, what: 'piece' });
  });

  it.each([
    ['thickness', { thickness: 'excused', width: sixtyFourths(96) }],
    ['width', { thickness: sixtyFourths(48), width: 'excused' }],
  ] as const)('keeps the reading of an exchanged pair that fits when %s is excused', (axis, left) => {
    const exchanged = makePiece('shelf', 1, { thickness: sixtyFourths(96), width: sixtyFourths(48) });
    const grossly = makeRubric({ grossLimit: sixtyFourths(16), lines });
    const sheet = sheetOf(grossly, makeAttempt([exchanged]), excusing({ lineId: null, axis }));
    const [piece] = sheet.pieces;
    expect(piece).toMatchObject({ gross: false, lose: 0 });
    const shown = (name: 'thickness' | 'width') => piece?.sizes?.[name].reading ?? piece?.sizes?.[name].band;
    expect({ thickness: shown('thickness'), width: shown('width') }).toEqual(left);
  });

  it('leaves an exchanged pair alone where the line does not allow a swap', () => {
    const exchanged = makePiece('shelf', 1, { thickness: sixtyFourths(96), width: sixtyFourths(48) });
    const strict = makeRubric({ lines: [makeLine({ swap: false })] });
    expect(sheetOf(strict, makeAttempt([exchanged]), excusing({ lineId: null, axis: 'width' })).lost).toBe(
      300,
    );
  });

  it('takes an excused piece out of what a set is judged by', () => {
    const sets = makeRubric({ lines: [makeLine({ quantity: 2, set: 'worst' }), makeLine({ id: 'rail' })] });
    const attempt = makeAttempt([
      makePiece('shelf', 1, { length: 1 }),
      makePiece('shelf', 2),
      makePiece('rail', 1),
    ]);
    expect(sheetOf(sets, attempt, excusing({ lineId: 'shelf', axis: null })).lost).toBe(0);
    expect(sheetOf(sets, attempt, excusing({ lineId: 'shelf', axis: 'length' })).lost).toBe(0);
  });

  it.each([
    ['a piece of a line that is not there', [makePiece('door', 1)]],
    ['an ordinal out of range', [makePiece('rail', 2)]],
    ['a piece recorded twice', [makePiece('rail', 1), makePiece('rail', 1)]],
  ])('leaves %s for the scoring to refuse', (_, pieces) => {
    const modification = excusing({ lineId: 'rail', axis: null });
    expect(() => sheetOf(rubric, makeAttempt(pieces), modification)).toThrow(ScoringError);
  });
});

describe('checks at other prices', () => {
  const lines = [makeLine({ checks: [makeCheck('square', [0, 100, 200]), makeCheck('surface', [0, 100])] })];
  const rubric = makeRubric({ lines, workChecks: [makeCheck('labelled', [0, 100], null)] });
  const bad = makeAttempt([makePiece('shelf', 1, {}, { square: 2, surface: 1 })], { work: { labelled: 1 } });
  const lostBy = (checks: Modification['checks'], attempt = bad) =>
    sheetOf(rubric, attempt, { ...NONE, checks }).lost;

  it.each<[Modification['checks'], number]>([
    [[], 400],
    [[{ label: 'square', lose: null }], 200],
    [[{ label: ' SQUARE ', lose: [0, 10, 50] }], 250],
    [[{ label: 'square', lose: [0, 10] }], 400],
    [[{ label: 'labelled', lose: [0, 0] }], 300],
    [[{ label: 'square edges', lose: null }], 400],
  ])('%j: a bad piece loses %i', (checks, lost) => {
    expect(lostBy(checks)).toBe(lost);
  });

  it('leaves nothing unread of a check that is not held against the student', () => {
    const unseen = makeAttempt([makePiece('shelf', 1)]);
    expect(sheetOf(rubric, unseen, NONE).unread).toEqual([{ lineId: '', ordinal: 0, what: 'labelled' }]);
    const sheet = sheetOf(rubric, unseen, { ...NONE, checks: [{ label: 'labelled', lose: null }] });
    expect(sheet.complete).toBe(true);
  });

  it('still asks for a check that only has another price', () => {
    const unseen = makeAttempt([makePiece('shelf', 1)]);
    const sheet = sheetOf(rubric, unseen, { ...NONE, checks: [{ label: 'labelled', lose: [0, 50] }] });
    expect(sheet.complete).toBe(false);
  });
});
