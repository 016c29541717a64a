import { describe, expect, it } from 'vitest';
import { type Attempt, type Line, type Piece, type Rubric, ScoringError, scoreAttempt } from '@/lib/scoring';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  makeRule,
  sixtyFourths,
} from '../../support/scoring-examples';

const target = makeLine({}).target.length;
const inState = (state: Piece['state'], ordinal = 1): Piece => ({ ...makePiece('shelf', ordinal), state });
const offBy = (ordinal: number, steps: number) =>
  makePiece('shelf', ordinal, { length: target + sixtyFourths(steps) });

function score(pieces: Piece[], line: Partial<Line> = {}, policy: Partial<Rubric> = {}) {
  return scoreAttempt(makeRubric({ ...policy, lines: [makeLine(line)] }), makeAttempt(pieces));
}

describe('the state of a piece', () => {
  const nothing = { gross: false, swapped: false, sizes: null, checks: [] };

  it('missing loses the price of that and leaves nothing unread', () => {
    const sheet = score([inState('missing')], { missing: 1200 });
    expect(sheet.pieces).toEqual([
      { lineId: 'shelf', ordinal: 1, state: 'missing', ...nothing, uncapped: 1200, lose: 1200 },
    ]);
    expect(sheet).toMatchObject({ complete: true, unread: [], possible: 900, lost: 1200, raw: 0, score: 0 });
  });

  it('held loses the price of missing until it is settled', () => {
    const sheet = score([inState('held')], { missing: 400 });
    expect(sheet.pieces).toEqual([
      { lineId: 'shelf', ordinal: 1, state: 'held', ...nothing, uncapped: 400, lose: 400 },
    ]);
    expect(sheet).toMatchObject({ complete: false, possible: 900, provisional: 500, score: null });
    expect(sheet.unread).toEqual([{ lineId: 'shelf', ordinal: 1, what: 'held' }]);
  });

  it('excused loses nothing and leaves its worth out of what is possible', () => {
    const sheet = score([inState('excused', 2), makePiece('shelf', 1)], { quantity: 2 });
    expect(sheet.pieces[1]).toEqual({
      lineId: 'shelf',
      ordinal: 2,
      state: 'excused',
      ...nothing,
      uncapped: 0,
      lose: 0,
    });
    expect(sheet).toMatchObject({ complete: true, unread: [], possible: 900, lost: 0, score: 900 });
  });

  it('not listed is unread, stays in what is possible and loses nothing for now', () => {
    const sheet = score([makePiece('shelf', 2)], { quantity: 2 });
    expect(sheet.pieces[0]).toEqual({
      lineId: 'shelf',
      ordinal: 1,
      state: 'unread',
      ...nothing,
      uncapped: 0,
      lose: 0,
    });
    expect(sheet).toMatchObject({ complete: false, possible: 1800, lost: 0, provisional: 1800, score: null });
    expect(sheet.unread).toEqual([{ lineId: 'shelf', ordinal: 1, what: 'piece' }]);
  });

  it.each(['missing', 'held', 'excused'] as const)(
    '%s makes nothing of the readings and checks it still carries',
    (state) => {
      const line = { checks: [makeCheck('square', [0, 100], null)] };
      const bare = { ...inState(state), sizes: {} };
      const carrying: Piece = {
        ...makePiece('shelf', 1, { length: 1, width: { kind: 'spoiled' } }, { square: 1 }),
        state,
      };
      expect(score([carrying], line)).toEqual(score([bare], line));
    },
  );
});

describe('a check', () => {
  const line = { checks: [makeCheck('square', [0, 100, 200], 1), makeCheck('constructor', [0, 50], null)] };

  it('that nobody recorded takes the assumed level, else makes the sheet incomplete', () => {
    const sheet = score([makePiece('shelf', 1)], line);
    expect(sheet.pieces[0]).toMatchObject({ uncapped: 100, lose: 100 });
    expect(sheet.pieces[0]?.checks).toEqual([
      { id: 'square', level: 1, lose: 100 },
      { id: 'constructor', level: null, lose: 0 },
    ]);
    expect(sheet.unread).toEqual([{ lineId: 'shelf', ordinal: 1, what: 'constructor' }]);
    expect(sheet).toMatchObject({ complete: false, provisional: 800, score: null });
  });

  it('that is recorded takes its level, better or worse than the assumed one, in any order', () => {
    const sheet = score([makePiece('shelf', 1, {}, { constructor: 1, square: 0 })], line);
    expect(sheet.pieces[0]?.checks).toEqual([
      { id: 'square', level: 0, lose: 0 },
      { id: 'constructor', level: 1, lose: 50 },
    ]);
    expect(sheet).toMatchObject({ complete: true, score: 850 });
  });

  it('of the work counts once, beside all pieces', () => {
    const workChecks = [
      makeCheck('named', [0, 100], 0),
      makeCheck('cleared', [0, 25], null),
      makeCheck('constructor', [0, 9], 0),
    ];
    const rubric = makeRubric({ workChecks });
    const begun = scoreAttempt(rubric, makeAttempt([makePiece('shelf', 1)], { work: { named: 1 } }));
    expect(begun.work).toEqual([
      { id: 'named', level: 1, lose: 100 },
      { id: 'cleared', level: null, lose: 0 },
      { id: 'constructor', level: 0, lose: 0 },
    ]);
    expect(begun).toMatchObject({ lost: 100, provisional: 800, score: null });
    expect(begun.unread).toEqual([{ lineId: '', ordinal: 0, what: 'cleared' }]);
    const done = scoreAttempt(
      rubric,
      makeAttempt([makePiece('shelf', 1)], { work: { named: 1, cleared: 1 } }),
    );
    expect(done).toMatchObject({ lost: 125, score: 775, unread: [] });
  });
});

describe('a line scored as the worst of a set', () => {
  const set = { quantity: 4, set: 'worst' as const };

  it('gives each present piece the greatest loss among them, and leaves its own sum to be seen', () => {
    const sheet = score([offBy(1, 4), offBy(2, 6), offBy(3, 0), offBy(4, 4)], set);
    expect(sheet.pieces.map(({ uncapped, lose }) => [uncapped, lose])).toEqual([
      [100, 200],
      [200, 200],
      [0, 200],
      [100, 200],
    ]);
    expect(sheet).toMatchObject({ lost: 800, score: 2800 });
  });

  it('leaves missing, held, excused and unread pieces alone', () => {
    const sheet = score([offBy(1, 4), inState('missing', 2), inState('excused', 3)], set);
    expect(sheet.pieces.map(({ state, lose }) => [state, lose])).toEqual([
      ['present', 100],
      ['missing', 900],
      ['excused', 0],
      ['unread', 0],
    ]);
  });

  it('counts what a gross piece loses', () => {
    const rubric = { grossLimit: sixtyFourths(16) };
    const sheet = score([offBy(1, 17), offBy(2, 0)], { ...set, quantity: 2 }, rubric);
    expect(sheet.pieces.map(({ gross, lose }) => [gross, lose])).toEqual([
      [true, 900],
      [false, 900],
    ]);
  });

  it('lets each piece be turned on its own first', () => {
    const { thickness, width } = makeLine({}).target;
    const turned = makePiece('shelf', 1, { thickness: width, width: thickness });
    const sheet = score([turned, offBy(2, 4)], { ...set, quantity: 2 });
    expect(sheet.pieces.map(({ swapped, lose }) => [swapped, lose])).toEqual([
      [true, 100],
      [false, 100],
    ]);
  });

  it('does not reach into other lines', () => {
    const lines = [makeLine({ ...set, quantity: 1 }), makeLine({ id: 'rail', set: 'worst' })];
    const sheet = scoreAttempt(makeRubric({ lines }), makeAttempt([offBy(1, 6), makePiece('rail', 1)]));
    expect(sheet.pieces.map(({ lose }) => lose)).toEqual([200, 0]);
  });
});

describe('the order of a sheet', () => {
  it('is that of the cut list, whatever order was recorded; what is unread goes by ordinal, axes, checks', () => {
    const checks = [makeCheck('square', [0, 1], null), makeCheck('grain', [0, 1], null)];
    const lines = [
      makeLine({ id: 'rail', quantity: 2, checks }),
      makeLine({ id: 'constructor', quantity: 2 }),
    ];
    const rubric = makeRubric({ lines, workChecks: [makeCheck('named', [0, 1], null)] });
    const pieces: Piece[] = [
      { ...inState('held', 2), lineId: 'constructor' },
      { ...makePiece('rail', 2, {}, { square: 0 }), sizes: { length: { kind: 'gauged' } } },
    ];
    const sheet = scoreAttempt(rubric, makeAttempt(pieces));
    expect(sheet.pieces.map(({ lineId, ordinal }) => `${lineId} ${ordinal}`)).toEqual([
      'rail 1',
      'rail 2',
      'constructor 1',
      'constructor 2',
    ]);
    expect(sheet.unread).toEqual([
      { lineId: 'rail', ordinal: 1, what: 'piece' },
      { lineId: 'rail', ordinal: 2, what: 'thickness' },
      { lineId: 'rail', ordinal: 2, what: 'width' },
      { lineId: 'rail', ordinal: 2, what: 'grain' },
      { lineId: 'constructor', ordinal: 1, what: 'piece' },
      { lineId: 'constructor', ordinal: 2, what: 'held' },
      { lineId: '', ordinal: 0, what: 'named' },
    ]);
  });
});

describe('what the rubric does not know', () => {
  const rubric = makeRubric({
    lines: [makeLine({ quantity: 2, checks: [makeCheck('square', [0, 1])] })],
    workChecks: [makeCheck('named', [0, 1])],
  });
  const noRule = makeRule();

  it.each([
    [
      'a piece of another line',
      makeAttempt([makePiece('rail', 1)]),
      'unknown-line',
      'The rubric has no line “rail”.',
    ],
    [
      'a line that every object has',
      makeAttempt([makePiece('constructor', 1)]),
      'unknown-line',
      'The rubric has no line “constructor”.',
    ],
    [
      'a line named __proto__',
      makeAttempt([makePiece('__proto__', 1)]),
      'unknown-line',
      'The rubric has no line “__proto__”.',
    ],
    ...[0, 3, -1, 1.5, Number.NaN].map((ordinal): [string, Attempt, string, string] => [
      `piece ${ordinal} of two`,
      makeAttempt([makePiece('shelf', ordinal)]),
      'ordinal-out-of-range',
      `There is no piece ${ordinal}: “shelf” has pieces 1 to 2.`,
    ]),
    [
      'a piece twice',
      makeAttempt([makePiece('shelf', 1), makePiece('shelf', 2), inState('excused', 1)]),
      'repeated-piece',
      'Piece 1 of “shelf” is recorded twice.',
    ],
    [
      'another check',
      makeAttempt([makePiece('shelf', 1, {}, { grain: 0 })]),
      'unknown-check',
      'Piece 1 of “shelf”: the rubric has no check “grain” here.',
    ],
    [
      'a work check on a piece',
      makeAttempt([makePiece('shelf', 1, {}, { named: 0 })]),
      'unknown-check',
      'Piece 1 of “shelf”: the rubric has no check “named” here.',
    ],
    [
      'a check that every object has',
      makeAttempt([makePiece('shelf', 1, {}, { constructor: 0 })]),
      'unknown-check',
      'Piece 1 of “shelf”: the rubric has no check “constructor” here.',
    ],
    [
      'a check named __proto__',
      makeAttempt([makePiece('shelf', 1, {}, JSON.parse('{"__proto__":0}'))]),
      'unknown-check',
      'Piece 1 of “shelf”: the rubric has no check “__proto__” here.',
    ],
    ...[2, -1, 0.5].map((level): [string, Attempt, string, string] => [
      `level ${level} of two`,
      makeAttempt([makePiece('shelf', 1, {}, { square: level })]),
      'level-out-of-range',
      `Piece 1 of “shelf”: check “square” has no level ${level}.`,
    ]),
    [
      'another check on a missing piece',
      makeAttempt([{ ...inState('missing'), checks: { grain: 0 } }]),
      'unknown-check',
      'Piece 1 of “shelf”: the rubric has no check “grain” here.',
    ],
    [
      'a level too high on an excused piece',
      makeAttempt([{ ...inState('excused'), checks: { square: 2 } }]),
      'level-out-of-range',
      'Piece 1 of “shelf”: check “square” has no level 2.',
    ],
    [
      'another work check',
      makeAttempt([], { work: { square: 0 } }),
      'unknown-check',
      'Work: the rubric has no check “square” here.',
    ],
    [
      'a work level too high',
      makeAttempt([], { work: { named: 2 } }),
      'level-out-of-range',
      'Work: check “named” has no level 2.',
    ],
    [
      'an offset of another line',
      makeAttempt([], { adjust: { rail: {} } }),
      'unknown-line',
      'An offset is given for “rail”, which the rubric does not have.',
    ],
    [
      'an offset of a line that every object has',
      makeAttempt([], { adjust: { constructor: { width: 1 } } }),
      'unknown-line',
      'An offset is given for “constructor”, which the rubric does not have.',
    ],
  ] satisfies [string, Attempt, string, string][])(
    'is refused, never ignored: %s',
    (_, attempt, code, message) => {
      expect(() => scoreAttempt(rubric, attempt)).toThrow(ScoringError);
      expect(() => scoreAttempt(rubric, attempt)).toThrow(
        expect.objectContaining({ code, message, name: 'ScoringError' }),
      );
    },
  );

  it('may be a line called constructor, with an offset or without', () => {
    const own = makeRubric({
      lines: [makeLine({ id: 'constructor', sizes: { thickness: noRule, width: noRule, length: noRule } })],
    });
    const piece = makePiece('constructor', 1, { length: target });
    expect(scoreAttempt(own, makeAttempt([piece], { adjust: {} })).pieces[0]?.sizes?.length.deviation).toBe(
      0,
    );
    const shifted = makeAttempt([piece], { adjust: { constructor: { length: 9 } } });
    expect(scoreAttempt(own, shifted).pieces[0]?.sizes?.length.deviation).toBe(9);
  });
});
