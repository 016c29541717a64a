import { describe, expect, it } from 'vitest';
import { type Axis, type Line, type Reading, type Rubric, scoreAttempt } from '@/lib/scoring';
import {
  makeAttempt,
  makeLine,
  makePiece,
  makeRubric,
  makeRule,
  sixtyFourths,
} from '../../support/scoring-examples';

const { thickness: thin, width: wide } = makeLine({}).target;
const gauged: Reading = { kind: 'gauged' };

/** The sheet of one piece with these readings of thickness and width. */
function pieceOf(
  thickness: number | Reading,
  width: number | Reading,
  line: Parameters<typeof makeLine>[0] = {},
  policy: Partial<Rubric> = {},
  adjust?: Partial<Record<Axis, number>>,
) {
  const rubric = makeRubric({ ...policy, lines: [makeLine(line)] });
  const piece = makePiece('shelf', 1, { thickness, width });
  return scoreAttempt(rubric, makeAttempt([piece], adjust && { adjust: { shelf: adjust } })).pieces[0];
}

describe('thickness and width read the other way round', () => {
  it('are exchanged, and each reading is shown on the axis that it was scored on', () => {
    expect(pieceOf(wide, thin + 5)).toMatchObject({
      swapped: true,
      lose: 0,
      sizes: {
        thickness: { reading: thin + 5, used: thin + 5, deviation: 5, band: 0 },
        width: { reading: wide, used: wide, deviation: 0, band: 0 },
      },
    });
  });

  it('stay as read where the line does not allow it', () => {
    expect(pieceOf(wide, thin, { swap: false })).toMatchObject({ swapped: false, lose: 600 });
  });

  it('stay as read where the exchange costs the same', () => {
    expect(pieceOf(thin, wide)).toMatchObject({ swapped: false, lose: 0 });
    const square: Partial<Line> = { target: { thickness: thin, width: thin, length: wide } };
    expect(pieceOf(thin + 7, thin, square)).toMatchObject({
      swapped: false,
      sizes: { thickness: { reading: thin + 7 }, width: { reading: thin } },
    });
  });

  it.each([
    ['thickness gauged', gauged, thin],
    ['width gauged', wide, gauged],
    ['width spoiled', wide, { kind: 'spoiled' }],
    ['thickness excused', { kind: 'excused' }, thin],
  ] satisfies [string, number | Reading, number | Reading][])(
    'stay as read with %s',
    (_, thickness, width) => {
      expect(pieceOf(thickness, width)).toMatchObject({ swapped: false });
    },
  );

  it('stay as read where one is not read', () => {
    const piece = makePiece('shelf', 1, { thickness: wide });
    const { width: _, ...sizes } = piece.sizes;
    const sheet = scoreAttempt(makeRubric({}), makeAttempt([{ ...piece, sizes }]));
    expect(sheet.pieces[0]).toMatchObject({ swapped: false, lose: 300 });
  });

  it('leave the offsets with their axes', () => {
    const shifted = pieceOf(wide, thin, {}, {}, { thickness: 11, width: -13 });
    expect(shifted).toMatchObject({
      swapped: true,
      sizes: { thickness: { reading: thin, used: thin + 11 }, width: { reading: wide, used: wide - 13 } },
    });
  });
});

describe('which way round stands', () => {
  it('is decided by the loss first', () => {
    // As read the piece is gross and loses its worth; turned it loses its bands.
    const gross = pieceOf(wide, thin, { worth: 700 }, { grossLimit: sixtyFourths(16) });
    expect(gross).toMatchObject({ swapped: true, gross: false, lose: 0 });
  });

  // Width 8/64 more than thickness, its whole range free; off by more than 7/64 is gross.
  const free = [{ within: sixtyFourths(99), lose: 0 }];
  const freeWidth: Partial<Line> = {
    worth: 300,
    target: { thickness: thin, width: thin + sixtyFourths(8), length: wide },
    sizes: { thickness: makeRule(), width: makeRule({ over: free, under: free }), length: makeRule() },
  };
  const nearLimit: Partial<Rubric> = { grossLimit: sixtyFourths(7) };

  it('is decided by gross where the losses are equal: not gross stands, though its sum is dearer', () => {
    // As read 0 + 0 but 15/64 off in width; turned 300 + 0 and nothing gross.
    const sheet = pieceOf(thin + sixtyFourths(1), thin - sixtyFourths(7), freeWidth, nearLimit);
    expect(sheet).toMatchObject({ swapped: true, gross: false, uncapped: 300, lose: 300 });
  });

  it('stays as read where the exchange would be gross at the same loss, though its sum is cheaper', () => {
    const sheet = pieceOf(thin - sixtyFourths(7), thin + sixtyFourths(1), freeWidth, nearLimit);
    expect(sheet).toMatchObject({ swapped: false, gross: false, uncapped: 300, lose: 300 });
  });

  it('is decided by the sum before the worth where loss and gross are equal', () => {
    const line = { worth: 100, target: { thickness: thin, width: thin + sixtyFourths(4), length: wide } };
    // As read: +8/64 and -4/64 lose 300 + 100; turned: 0 and +4/64 lose 0 + 100; both lose the worth of 100.
    expect(pieceOf(thin + sixtyFourths(8), thin, line)).toMatchObject({
      swapped: true,
      uncapped: 100,
      lose: 100,
    });
    // The other way round nothing is gained, so it stays.
    expect(pieceOf(thin, thin + sixtyFourths(8), line)).toMatchObject({
      swapped: false,
      uncapped: 100,
      lose: 100,
    });
  });
});
