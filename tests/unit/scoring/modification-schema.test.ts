import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MAX_LENGTH } from '@/lib/length';
import type { Modification } from '@/lib/scoring/modification';
import { formatFactor, parseFactor } from '@/lib/scoring/modification-factor';
import { modificationSchema, modifiesNothing } from '@/lib/scoring/modification-schema';

const NONE: Modification = { format: 1, widen: { num: 1, den: 1 }, excused: [], checks: [] };
const check = (lose: unknown, label: unknown = 'square') => ({ checks: [{ label, lose }] });
const excused = (...list: unknown[]) => ({ excused: list });
const takes = (change: object) => modificationSchema.safeParse({ ...NONE, ...change }).success;

describe('modificationSchema', () => {
  it.each([
    [{}],
    [{ widen: { num: 10_000, den: 1000 } }],
    [{ widen: { num: 10_000, den: 9999 } }],
    [excused({ lineId: 'base', axis: null }, { lineId: null, axis: 'width' })],
    [excused({ lineId: null, axis: 'thickness' }, { lineId: null, axis: 'width' })],
    [check(null)],
    [check([0])],
    [check([0, 100_000])],
  ])('takes %j', (change) => {
    expect(takes(change)).toBe(true);
  });

  it.each([
    [{ format: 2 }],
    [{ note: 'x' }],
    [{ widen: { num: 1, den: 2 } }],
    [{ widen: { num: 11, den: 1 } }],
    [{ widen: { num: 1.5, den: 1 } }],
    [{ widen: { num: 0, den: 0 } }],
    [{ widen: { num: 10_001, den: 10_000 } }],
    [{ widen: { num: 3, den: 2, by: 1 } }],
    [excused({ lineId: null, axis: null })],
    [excused({ lineId: 'Base', axis: null })],
    [excused({ lineId: 'base', axis: 'depth' })],
    [excused({ lineId: 'base' })],
    [excused(...['thickness', 'width', 'length'].map((axis) => ({ lineId: null, axis })))],
    [check([100])],
    [check([0, -1])],
    [check([0, 0.5])],
    [check([0, 100_001])],
    [check([])],
    [check(Array(11).fill(0))],
    [check(null, '  ')],
    [check(null, 'x'.repeat(201))],
    [{ checks: [...check(null).checks, ...check([0], ' Square').checks] }],
    [{ checks: [{ label: 'square', lose: null, assume: 0 }] }],
  ])('refuses %j', (change) => {
    expect(takes(change)).toBe(false);
  });

  it('keeps the widest band exact', () => {
    expect(Number.isSafeInteger(2 * MAX_LENGTH * 10_000 + 10_000)).toBe(true);
  });

  it('knows a modification that changes nothing', () => {
    expect(modifiesNothing({ ...NONE, widen: { num: 3, den: 3 } })).toBe(true);
    expect(modifiesNothing({ ...NONE, widen: { num: 3, den: 2 } })).toBe(false);
    expect(modifiesNothing({ ...NONE, checks: [{ label: 'square', lose: null }] })).toBe(false);
  });
});

describe('parseFactor', () => {
  it.each([
    ['1 1/2', 3, 2],
    ['1.5', 3, 2],
    ['1,5', 3, 2],
    ['2', 2, 1],
    [' 1-1/2 ', 3, 2],
    ['3/2', 3, 2],
    ['1½', 3, 2],
    ['1⁄1', 1, 1],
    ['150 %', 3, 2],
    ['150%', 3, 2],
    ['133 1/3 %', 4, 3],
    ['1.5x', 3, 2],
    ['× 1.5', 3, 2],
    ['10', 10, 1],
    ['1.0001', 10_001, 10_000],
  ])('reads %s', (text, num, den) => {
    expect(parseFactor(text)).toEqual(
      num > 10_000
        ? { ok: false, reason: expect.stringContaining('fewer decimals') }
        : { ok: true, widen: { num, den } },
    );
  });

  it.each([
    ['', 'Type how many times'],
    ['wide', 'cannot be read'],
    ['1.5.2', 'cannot be read'],
    ['1 1/0', 'cannot be 0'],
    ['0.5', 'only be made wider'],
    ['50 %', 'only be made wider'],
    ['-2', 'cannot be read'],
    ['10.5', 'at most 10 times'],
    ['1.33333', 'cannot be read'],
    [`1${' '.repeat(40)}1/2`, 'cannot be read'],
  ])('refuses "%s": %s', (text, reason) => {
    expect(parseFactor(text)).toEqual({ ok: false, reason: expect.stringContaining(reason) });
  });

  it('reads what formatFactor writes', () => {
    const den = fc.integer({ min: 1, max: 400 });
    const factor = den.chain((d) => fc.tuple(fc.integer({ min: d, max: 10 * d }), fc.constant(d)));
    fc.assert(
      fc.property(factor, ([num, d]) => {
        const read = parseFactor(formatFactor({ num, den: d }));
        expect(read.ok && read.widen.num * d === num * read.widen.den).toBe(true);
      }),
    );
  });

  it.each([
    [3, 2, '1.5'],
    [4, 3, '1 1/3'],
    [6, 3, '2'],
    [10_000, 9_999, '1 1/9999'],
  ])('%i/%i is written %s', (num, den, text) => {
    expect(formatFactor({ num, den })).toBe(text);
  });
});
