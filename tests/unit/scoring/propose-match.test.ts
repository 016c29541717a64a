import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { type LaidPiece, type Line, proposeMatch, type Rubric } from '@/lib/scoring';
import { laidArb, proposeByLooking } from '../../support/laid-pieces';
import { makeCheck, makeLine, makeRubric, makeRule, sixtyFourths } from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const { target } = makeLine({});

const laid = (id: string, changes: Partial<LaidPiece['sizes']> = {}): LaidPiece => ({
  id,
  sizes: { ...target, ...changes },
});

/** A part as long as this many 64ths. */
const part = (id: string, length: number, changes: Partial<Line> = {}) =>
  makeLine({ id, target: { ...target, length: sixtyFourths(length) }, ...changes });
const long = (id: string, length: number) => laid(id, { length: sixtyFourths(length) });

const quarter: Partial<Rubric> = { grossLimit: sixtyFourths(16) };
const whereOf = (rubric: Rubric, pieces: LaidPiece[]) =>
  Object.fromEntries(
    proposeMatch(rubric, pieces).placed.map(({ id, lineId, ordinal }) => [id, `${lineId} ${ordinal}`]),
  );

describe('the match proposed for jumbled pieces', () => {
  it('gives the example of its description', () => {
    const rubric = makeRubric({});
    const sizes = rubric.lines[0]?.target ?? target;
    expect(proposeMatch(rubric, [{ id: 'p1', sizes }]).placed).toEqual([
      { id: 'p1', lineId: 'shelf', ordinal: 1, lose: 0 },
    ]);
  });

  it('lists what has no place and what has no piece', () => {
    const rubric = makeRubric({ ...quarter, lines: [makeLine({ quantity: 3 }), part('rail', 512)] });
    expect(proposeMatch(rubric, [long('short', 99), laid('one'), laid('other')])).toEqual({
      placed: [
        { id: 'one', lineId: 'shelf', ordinal: 1, lose: 0 },
        { id: 'other', lineId: 'shelf', ordinal: 2, lose: 0 },
      ],
      unplaced: ['short'],
      unfilled: [
        { lineId: 'shelf', ordinal: 3 },
        { lineId: 'rail', ordinal: 1 },
      ],
    });
  });

  it('of no pieces leaves every place unfilled', () => {
    expect(proposeMatch(makeRubric({}), [])).toEqual({
      placed: [],
      unplaced: [],
      unfilled: [{ lineId: 'shelf', ordinal: 1 }],
    });
  });

  it('places a piece at the gross limit and its margin, and none a tick further off', () => {
    const rubric = makeRubric({ ...quarter, margin: 3 });
    const at = target.length - sixtyFourths(16) - 3;
    expect(proposeMatch(rubric, [laid('p', { length: at })]).placed).toHaveLength(1);
    expect(proposeMatch(rubric, [laid('p', { length: at - 1 })]).unplaced).toEqual(['p']);
  });

  it('places the most pieces, though fewer would lose less', () => {
    const rubric = makeRubric({ ...quarter, lines: [part('a', 256), part('b', 268)] });
    // The first fits both, the second only a: b takes the first, 10/64 off.
    expect(whereOf(rubric, [long('first', 258), long('second', 250)])).toEqual({
      first: 'b 1',
      second: 'a 1',
    });
  });

  it('takes the least total loss, not the best place for each in turn', () => {
    const rubric = makeRubric({ lines: [part('a', 256), part('b', 260)] });
    expect(whereOf(rubric, [long('first', 259), long('second', 262)])).toEqual({
      first: 'a 1',
      second: 'b 1',
    });
  });

  it('between equal losses takes the least total deviation', () => {
    const rubric = makeRubric({ lines: [part('a', 256), part('b', 258)] });
    expect(whereOf(rubric, [long('first', 258), long('second', 256)])).toEqual({
      first: 'b 1',
      second: 'a 1',
    });
  });

  it('counts the deviation as it is scored, rounded where the rubric rounds', () => {
    const rubric = makeRubric({ readTo: sixtyFourths(4), lines: [part('a', 256), part('b', 257)] });
    // Both pieces round to no deviation at both places, so the laid order decides.
    expect(whereOf(rubric, [long('first', 257), long('second', 256)])).toEqual({
      first: 'a 1',
      second: 'b 1',
    });
  });

  it('otherwise keeps the laid order, and leaves out the pieces laid last', () => {
    const rubric = makeRubric({ lines: [makeLine({ quantity: 2 })] });
    const pieces = ['c', 'a', 'b'].map((id) => laid(id));
    expect(whereOf(rubric, pieces)).toEqual({ c: 'shelf 1', a: 'shelf 2' });
    expect(proposeMatch(rubric, pieces).unplaced).toEqual(['b']);
  });

  it('turns a piece where its line allows it, and not where it does not', () => {
    const turned = laid('p', { thickness: target.width, width: target.thickness });
    expect(proposeMatch(makeRubric(quarter), [turned]).placed[0]?.lose).toBe(0);
    const fixed = makeRubric({ ...quarter, lines: [makeLine({ swap: false })] });
    expect(proposeMatch(fixed, [turned]).unplaced).toEqual(['p']);
  });

  it('prices each piece alone with its checks as assumed', () => {
    const checks = [makeCheck('square', [0, 50], 1), makeCheck('surface', [0, 70], null)];
    const rubric = makeRubric({ lines: [makeLine({ quantity: 2, set: 'worst', checks })] });
    const { placed } = proposeMatch(rubric, [laid('good'), laid('poor', { length: 1 })]);
    expect(placed.map(({ lose }) => lose)).toEqual([50, 350]);
  });

  it('finds a line by its id, whatever it is called', () => {
    expect(whereOf(makeRubric({ lines: [makeLine({ id: 'constructor' })] }), [laid('constructor')])).toEqual({
      constructor: 'constructor 1',
    });
  });

  it('is the first of all possible ones', () => {
    fc.assert(
      fc.property(laidArb, ({ rubric, pieces }) => {
        expect(proposeMatch(rubric, pieces)).toEqual(proposeByLooking(rubric, pieces));
      }),
      { numRuns: 600 },
    );
  });

  it('leaves the rubric and the pieces as they were', () => {
    fc.assert(
      fc.property(laidArb, (given) => {
        const before = structuredClone(given);
        proposeMatch(given.rubric, given.pieces);
        expect(given).toEqual(before);
      }),
      { numRuns: 100 },
    );
  });
});

describe('a hundred pieces', () => {
  const hundred = (length: (at: number) => number) =>
    Array.from({ length: 100 }, (_, at) => laid(`p${at}`, { length: length(at) }));
  const lines = (count: number, quantity: number, every: number) =>
    Array.from({ length: count }, (_, at) => part(`part-${at}`, 200 + (at % every), { quantity }));
  const scattered = (at: number) => sixtyFourths(240 + ((at * 37) % 4)) + ((at * 7919) % 20) * 500_000;

  it.each<[string, Line[], LaidPiece[]]>([
    ['all alike, for one line', [makeLine({ quantity: 100 })], hundred(() => target.length)],
    ['all alike, for 400 places', lines(200, 2, 7), hundred(() => sixtyFourths(203))],
    ['all alike, for 100 different parts', lines(100, 1, 100), hundred(() => target.length)],
    ['laid the wrong way round', lines(100, 1, 100), hundred((at) => sixtyFourths(310 - at))],
    ['crowded about few of 400 places', lines(100, 4, 100), hundred(scattered)],
  ])('%s, are matched in a fraction of a second', (_, all, pieces) => {
    const rubric = makeRubric({ lines: all });
    const spent = Array.from({ length: 5 }, () => {
      const start = performance.now();
      expect(proposeMatch(rubric, pieces).placed).toHaveLength(100);
      return performance.now() - start;
    });
    // Meant to take a tenth of a second; a busy machine gets five times that.
    expect(Math.min(...spent)).toBeLessThan(500);
  });

  it('are matched exactly: laid backwards, each finds its own part', () => {
    const rule = makeRule({ over: [{ within: 0, lose: 0 }], under: [{ within: 0, lose: 0 }] });
    const rubric = makeRubric({
      lines: Array.from({ length: 100 }, (_, at) => ({
        ...part(`part-${at}`, 200 + at),
        sizes: { thickness: rule, width: rule, length: rule },
      })),
    });
    const { placed } = proposeMatch(
      rubric,
      hundred((at) => sixtyFourths(299 - at)),
    );
    expect(placed.map(({ lineId }) => lineId)).toEqual(
      Array.from({ length: 100 }, (_, at) => `part-${99 - at}`),
    );
  });
});
