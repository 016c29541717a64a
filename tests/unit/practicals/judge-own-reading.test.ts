import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { judgeOwnReading, type OwnReadingContext } from '@/lib/practicals/judge-own-reading';
import type { Axis } from '@/lib/scoring';
import { ticksOf } from '../../support/rubrics';

const target = { thickness: ticksOf('3/4'), width: ticksOf('1 1/4'), length: ticksOf('5') };
const blank = { thickness: ticksOf('3/4'), width: ticksOf('7'), length: ticksOf('13') };

function context(axis: Axis, change: Partial<OwnReadingContext> = {}): OwnReadingContext {
  return {
    line: { target },
    axis,
    unit: 'in',
    grossLimit: ticksOf('1/4'),
    margin: ticksOf('0.002'),
    blank,
    ...change,
  };
}

const judge = (axis: Axis, text: string, change: Partial<OwnReadingContext> = {}) =>
  judgeOwnReading(context(axis, change), ticksOf(text), text);

describe('what a piece cannot be', () => {
  test('40 in on a 5 in part is refused, and the question is whether that is along the grain', () => {
    expect(judge('length', '40')).toEqual({
      verdict: 'impossible',
      asks: '40 in is longer than the whole blank (13 in). Is that along the grain?',
    });
  });

  test('each axis asks about its own direction', () => {
    expect(judge('width', '40')).toMatchObject({
      asks: expect.stringContaining('across the grain, on the face?'),
    });
    expect(judge('thickness', '40')).toMatchObject({ asks: expect.stringContaining('from face to face?') });
  });

  test('a tenth over the blank’s longest size can still be, since blanks are seldom nominal; more cannot', () => {
    expect(judge('length', '14.3').verdict).toBe('far');
    expect(judge('length', '14.3001').verdict).toBe('impossible');
  });

  test('without a blank the limit is four times the longest size of the piece', () => {
    expect(judge('width', '20', { blank: null }).verdict).toBe('far');
    expect(judge('width', '20.0001', { blank: null })).toMatchObject({
      verdict: 'impossible',
      asks: expect.stringContaining('over four times the longest size of this piece (5 in)'),
    });
  });

  test('under a tenth of the target is refused, a tenth is not', () => {
    expect(judge('length', '0.4999')).toMatchObject({
      verdict: 'impossible',
      asks: expect.stringContaining('less than a tenth of the 5 in asked for'),
    });
    expect(judge('length', '1/2').verdict).toBe('far');
  });

  test('a number that would fit in the other unit is asked about, not converted', () => {
    expect(judge('length', '127')).toMatchObject({
      verdict: 'impossible',
      asks: expect.stringContaining('Or is it in millimetres? Then type 127 mm.'),
    });
    expect(judge('length', '127in')).toMatchObject({ asks: expect.not.stringContaining('millimetres') });
    const mm = context('length', { unit: 'mm', grossLimit: ticksOf('6', 'mm') });
    expect(judgeOwnReading(mm, ticksOf('5', 'mm'), '5')).toMatchObject({
      verdict: 'impossible',
      asks: expect.stringContaining('Or is it in inches? Then type 5 in.'),
    });
  });
});

describe('what is far, and what fits', () => {
  test('the gross limit and its reading margin fit; past them it is asked once', () => {
    expect(judge('length', '5 1/4').verdict).toBe('fits');
    expect(judge('length', '5.252').verdict).toBe('fits');
    expect(judge('length', '5.2521').verdict).toBe('far');
    expect(judge('length', '4 11/16')).toEqual({
      verdict: 'far',
      asks: '4 11/16 in is far from 5 in. Is that along the grain?',
    });
  });

  test('without a gross limit, 1/4 in or 6 mm is near', () => {
    expect(judge('length', '5 1/4', { grossLimit: null }).verdict).toBe('fits');
    expect(judge('length', '5.2501', { grossLimit: null }).verdict).toBe('far');
  });

  test('whatever lies within the gross limit of a target is never refused, whatever the blank', () => {
    fc.assert(
      fc.property(
        fc.constantFrom<Axis>('thickness', 'width', 'length'),
        fc.integer({ min: -ticksOf('1/4'), max: ticksOf('1/4') }),
        (axis, off) => judgeOwnReading(context(axis), target[axis] + off, '').verdict === 'fits',
      ),
    );
  });
});
