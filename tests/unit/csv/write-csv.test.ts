import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalLength } from '@/lib/csv/decimal-length';
import { guardText, hundredthsAsDecimal, writeCsv } from '@/lib/csv/write-csv';
import { MAX_LENGTH, TICKS_PER_INCH } from '@/lib/length';

describe('writeCsv', () => {
  it('keeps the promise of its example', () => {
    expect(writeCsv(['name', 'score'], [[{ text: '=1+1' }, { decimal: '-0.5' }]])).toBe(
      "name,score\r\n'=1+1,-0.5\r\n",
    );
  });

  // OWASP ASVS 5, 1.2.10, names the first six; CR stands on OWASP's own page (from memory).
  it.each(['=', '+', '-', '@', '\t', '\0', '\r'])(
    'puts an apostrophe before a text that begins with %j',
    (first) => {
      expect(guardText(`${first}SUM(A1)`)).toBe(`'${first}SUM(A1)`);
      expect(parse(writeCsv(['a', 'b'], [[{ text: `${first}x` }, { text: 'y' }]]))).toEqual([
        ['a', 'b'],
        [`'${first}x`, 'y'],
      ]);
    },
  );

  it('leaves texts alone that only hold such a character further on', () => {
    expect(guardText('Dang, Minh-Anh')).toBe('Dang, Minh-Anh');
    expect(guardText("O'Shea")).toBe("O'Shea");
  });

  it('leaves a number a number, below zero too', () => {
    expect(writeCsv(['deviation'], [[{ decimal: '-0.5' }]])).toBe('deviation\r\n-0.5\r\n');
  });

  it.each(['−0.5', '1,5', '=1', '', '1e3', '+1'])('throws for the decimal %j', (decimal) => {
    expect(() => writeCsv(['a'], [[{ decimal }]])).toThrow(RangeError);
  });

  it('throws for a row that is not as wide as the header', () => {
    expect(() => writeCsv(['a', 'b'], [[null]])).toThrow(RangeError);
  });

  it('ends every line with CR LF and leaves blank what has no value', () => {
    expect(
      writeCsv(
        ['a', 'b'],
        [
          [null, { text: 'x' }],
          [{ text: 'y' }, null],
        ],
      ),
    ).toBe('a,b\r\n,x\r\ny,\r\n');
  });

  it('is read back by csv-parse text for text', () => {
    const text = fc.string({ unit: 'binary', maxLength: 20 });
    fc.assert(
      fc.property(fc.array(fc.tuple(text, text), { minLength: 1, maxLength: 8 }), (rows) => {
        const written = writeCsv(
          ['first', 'second'],
          rows.map((row) => row.map((each) => ({ text: each }))),
        );
        expect(parse(written)).toEqual([['first', 'second'], ...rows.map((row) => row.map(guardText))]);
      }),
    );
  });
});

describe('decimals of a file', () => {
  it.each([
    [8600, '86'],
    [8650, '86.5'],
    [222, '2.22'],
    [5, '0.05'],
    [0, '0'],
    [-50, '-0.5'],
  ])('writes %i hundredths as %s', (points, text) => {
    expect(hundredthsAsDecimal(points)).toBe(text);
  });

  it.each([
    [TICKS_PER_INCH / 32, 'in', '0.03125'],
    [-TICKS_PER_INCH / 32, 'in', '-0.03125'],
    [7 * TICKS_PER_INCH, 'in', '7'],
    [190_000_000, 'in', '0.7480314961'],
    [-5_000_000, 'mm', '-0.5'],
    [2_600_000_000, 'mm', '260'],
    [1, 'mm', '0.0000001'],
    [0, 'in', '0'],
  ] as const)('writes %i ticks in %s as %s', (ticks, unit, text) => {
    expect(decimalLength(ticks, unit)).toBe(text);
  });

  it('names the very tick in either unit', () => {
    fc.assert(
      fc.property(fc.integer({ min: -MAX_LENGTH, max: MAX_LENGTH }), (ticks) => {
        const back = (text: string, perUnit: bigint) => {
          const [whole = '', fraction = ''] = text.replace('-', '').split('.');
          const tenths = BigInt(whole + fraction.padEnd(10, '0')) * perUnit;
          const magnitude = (tenths + 5n * 10n ** 9n) / 10n ** 10n;
          return Number(text.startsWith('-') ? -magnitude : magnitude);
        };
        expect(back(decimalLength(ticks, 'in'), 254_000_000n) === ticks).toBe(true);
        expect(back(decimalLength(ticks, 'mm'), 10_000_000n) === ticks).toBe(true);
      }),
    );
  });
});
