import { describe, expect, it } from 'vitest';
import { MAX_LENGTH } from '@/lib/length';
import { type Axis, type Line, type Reading, type Rubric, type SizeSheet, scoreAttempt } from '@/lib/scoring';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  makeRule,
  sixtyFourths,
  value,
} from '../../support/scoring-examples';

const target = makeLine({}).target.length;

/** The sheet of a length that is off by so many ticks, or holds the reading given. */
function lengthSheet(
  given: number | Reading,
  policy: Partial<Rubric> = {},
  line: Parameters<typeof makeLine>[0] = {},
  shift?: Partial<Record<Axis, number>>,
): SizeSheet | undefined {
  const reading = typeof given === 'number' ? value(target + given) : given;
  const rubric = makeRubric({ ...policy, lines: [makeLine({ worth: 100_000, ...line })] });
  const attempt = makeAttempt(
    [makePiece('shelf', 1, { length: reading })],
    shift && { adjust: { shelf: shift } },
  );
  return scoreAttempt(rubric, attempt).pieces[0]?.sizes?.length;
}

const read = (deviation: number) => ({ reading: target + deviation, used: target + deviation, deviation });

describe('a reading', () => {
  it.each([
    [0, 0, 0],
    [1, 0, 0],
    [sixtyFourths(2), 0, 0],
    [sixtyFourths(2) + 1, 1, 100],
    [sixtyFourths(4), 1, 100],
    [sixtyFourths(4) + 1, 2, 200],
    [sixtyFourths(6), 2, 200],
    [sixtyFourths(6) + 1, 'beyond', 300],
    [sixtyFourths(64), 'beyond', 300],
  ] as const)('%i ticks off lies in band %s and loses %i, over as under', (distance, band, lose) => {
    expect(lengthSheet(distance)).toEqual({ ...read(distance), band, lose });
    expect(lengthSheet(-distance)).toEqual({ ...read(0 - distance), band, lose });
  });

  it('over looks only in the bands of over, under only in those of under', () => {
    const rule = makeRule({ under: [{ within: 10, lose: 0 }], beyondUnder: 700 });
    expect(lengthSheet(11, {}, { rule })).toMatchObject({ band: 0, lose: 0 });
    expect(lengthSheet(-10, {}, { rule })).toMatchObject({ band: 0, lose: 0 });
    expect(lengthSheet(-11, {}, { rule })).toMatchObject({ band: 'beyond', lose: 700 });
  });

  it('on the target lies in band 0 even where that has no width', () => {
    const rule = makeRule({ over: [{ within: 0, lose: 0 }], under: [{ within: 0, lose: 0 }] });
    expect(lengthSheet(0, {}, { rule })).toEqual({ ...read(0), band: 0, lose: 0 });
    expect(lengthSheet(1, {}, { rule })).toMatchObject({ band: 'beyond', lose: 300 });
  });

  it('may lie past every band edge by the reading margin, and no tick more', () => {
    expect(lengthSheet(sixtyFourths(2) + 50, { margin: 50 })).toMatchObject({ band: 0, lose: 0 });
    expect(lengthSheet(sixtyFourths(2) + 51, { margin: 50 })).toMatchObject({ band: 1, lose: 100 });
    expect(lengthSheet(-sixtyFourths(6) - 50, { margin: 50 })).toMatchObject({ band: 2, lose: 200 });
    expect(lengthSheet(-sixtyFourths(6) - 51, { margin: 50 })).toMatchObject({ band: 'beyond', lose: 300 });
  });

  it('loses at most the cap of its dimension, and keeps its band', () => {
    const rule = makeRule({ cap: 150 });
    expect(lengthSheet(sixtyFourths(4), {}, { rule })).toMatchObject({ band: 1, lose: 100 });
    expect(lengthSheet(sixtyFourths(6), {}, { rule })).toMatchObject({ band: 2, lose: 150 });
    expect(lengthSheet(sixtyFourths(9), {}, { rule })).toMatchObject({ band: 'beyond', lose: 150 });
  });
});

describe('a deviation rounded to what the instrument reads', () => {
  it.each([
    [49, 0],
    [50, 0],
    [51, 100],
    [149, 100],
    [150, 100],
    [151, 200],
    [250, 200],
  ])('of %i ticks is scored as %i where 100 are read, a tie toward zero', (exact, rounded) => {
    const sheet = { band: 0, lose: 0 };
    expect(lengthSheet(exact, { readTo: 100 })).toEqual({
      reading: target + exact,
      used: target + rounded,
      deviation: rounded,
      ...sheet,
    });
    expect(lengthSheet(-exact, { readTo: 100 })).toEqual({
      reading: target - exact,
      used: target - rounded,
      deviation: 0 - rounded,
      ...sheet,
    });
  });

  it('has no tie where the step is odd', () => {
    expect(lengthSheet(1, { readTo: 3 })).toMatchObject({ deviation: 0 });
    expect(lengthSheet(2, { readTo: 3 })).toMatchObject({ deviation: 3 });
    expect(lengthSheet(-2, { readTo: 3 })).toMatchObject({ deviation: -3 });
  });

  it('is rounded before it is looked up', () => {
    const readTo = sixtyFourths(2);
    expect(lengthSheet(sixtyFourths(3), { readTo })).toMatchObject({ deviation: sixtyFourths(2), band: 0 });
    expect(lengthSheet(sixtyFourths(3) + 1, { readTo })).toMatchObject({
      deviation: sixtyFourths(4),
      band: 1,
    });
  });

  it('is rounded with the offset of its line, not before it', () => {
    expect(lengthSheet(40, { readTo: 100 }, {}, { length: 20 })).toMatchObject({ deviation: 100 });
  });
});

describe('an offset', () => {
  it('is added to every value on its axis, and the reading shown stays as recorded', () => {
    const shift = { length: -5, width: 1000 };
    expect(lengthSheet(7, {}, {}, shift)).toEqual({
      reading: target + 7,
      used: target + 2,
      deviation: 2,
      band: 0,
      lose: 0,
    });
  });

  it('may take a value to the target or below nothing', () => {
    expect(lengthSheet(5, {}, {}, { length: -5 })).toMatchObject({ deviation: 0, used: target });
    expect(lengthSheet(value(1), {}, {}, { length: -MAX_LENGTH })).toMatchObject({
      used: 1 - MAX_LENGTH,
      band: 'beyond',
    });
  });

  it('leaves what is not a value alone', () => {
    expect(lengthSheet({ kind: 'gauged' }, {}, {}, { length: MAX_LENGTH })).toMatchObject({
      band: 'gauged',
      lose: 0,
    });
  });
});

describe('what is not a value', () => {
  const empty = { reading: null, used: null, deviation: null };

  it.each(['gauged', 'excused'] as const)('loses nothing where it is %s', (kind) => {
    expect(lengthSheet({ kind })).toEqual({ ...empty, band: kind, lose: 0 });
  });

  it('loses the larger price past the last bands where it is spoiled, at most the cap', () => {
    const spoiled: Reading = { kind: 'spoiled' };
    const over = makeRule({ beyondOver: 800 });
    const under = makeRule({ beyondUnder: 700 });
    expect(lengthSheet(spoiled, {}, { rule: over })).toEqual({ ...empty, band: 'spoiled', lose: 800 });
    expect(lengthSheet(spoiled, {}, { rule: under })).toEqual({ ...empty, band: 'spoiled', lose: 700 });
    expect(lengthSheet(spoiled, {}, { rule: { ...under, cap: 500 } })).toEqual({
      ...empty,
      band: 'spoiled',
      lose: 500,
    });
  });

  it('loses nothing for now where it is not read, and makes the sheet incomplete', () => {
    const piece = makePiece('shelf', 1);
    const sheet = scoreAttempt(
      makeRubric({}),
      makeAttempt([{ ...piece, sizes: { width: { kind: 'gauged' } } }]),
    );
    expect(sheet.pieces[0]?.sizes?.length).toEqual({ ...empty, band: 'unread', lose: 0 });
    expect(sheet).toMatchObject({ complete: false, provisional: 900, score: null });
    expect(sheet.unread).toEqual([
      { lineId: 'shelf', ordinal: 1, what: 'thickness' },
      { lineId: 'shelf', ordinal: 1, what: 'length' },
    ]);
  });
});

describe('a gross size', () => {
  const grossLimit = sixtyFourths(16);
  const pieceAt = (deviation: number, policy: Partial<Rubric> = {}, line: Partial<Line> = {}) => {
    const rubric = makeRubric({ grossLimit, ...policy, lines: [makeLine(line)] });
    return scoreAttempt(rubric, makeAttempt([makePiece('shelf', 1, { length: target + deviation })]))
      .pieces[0];
  };

  it.each([1, -1])('begins a tick past the limit and the margin, side %i', (side) => {
    expect(pieceAt(side * grossLimit)).toMatchObject({ gross: false, lose: 300 });
    expect(pieceAt(side * (grossLimit + 1))).toMatchObject({ gross: true, uncapped: 300, lose: 900 });
    expect(pieceAt(side * (grossLimit + 50), { margin: 50 })).toMatchObject({ gross: false, lose: 300 });
    expect(pieceAt(side * (grossLimit + 51), { margin: 50 })).toMatchObject({ gross: true, lose: 900 });
  });

  it('is judged on the rounded deviation', () => {
    expect(pieceAt(grossLimit + 50, { readTo: grossLimit })).toMatchObject({ gross: false });
  });

  it('is nothing that happens without a limit', () => {
    expect(pieceAt(MAX_LENGTH - target, { grossLimit: null })).toMatchObject({ gross: false, lose: 300 });
  });

  it('is anything off the target where the limit is 0', () => {
    expect(pieceAt(0, { grossLimit: 0 })).toMatchObject({ gross: false, lose: 0 });
    expect(pieceAt(1, { grossLimit: 0 })).toMatchObject({ gross: true, uncapped: 0, lose: 900 });
  });

  it('takes the whole worth, be that more or less than its losses', () => {
    expect(pieceAt(grossLimit + 1, {}, { worth: 50 })).toMatchObject({
      gross: true,
      uncapped: 300,
      lose: 50,
    });
  });

  it('is never what is spoiled', () => {
    const rubric = makeRubric({ grossLimit: 0 });
    const piece = makePiece('shelf', 1, { length: { kind: 'spoiled' } });
    expect(scoreAttempt(rubric, makeAttempt([piece])).pieces[0]).toMatchObject({ gross: false, lose: 300 });
  });
});

describe('a piece', () => {
  it('loses its sizes and its checks, at most its worth', () => {
    const checks = [makeCheck('square', [0, 100, 250]), makeCheck('surface', [0, 50])];
    const piece = makePiece('shelf', 1, { length: target + sixtyFourths(4) }, { square: 2 });
    const scoreWith = (worth: number) =>
      scoreAttempt(makeRubric({ lines: [makeLine({ checks, worth })] }), makeAttempt([piece])).pieces[0];
    expect(scoreWith(900)).toMatchObject({ uncapped: 350, lose: 350 });
    expect(scoreWith(350)).toMatchObject({ uncapped: 350, lose: 350 });
    expect(scoreWith(349)).toMatchObject({ uncapped: 350, lose: 349 });
    expect(scoreWith(900)?.checks).toEqual([
      { id: 'square', level: 2, lose: 250 },
      { id: 'surface', level: 0, lose: 0 },
    ]);
  });
});
