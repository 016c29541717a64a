import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MAX_LENGTH, parseLength, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';

const inches = (count: number) => ({ ok: true, ticks: count * TICKS_PER_INCH, unit: 'in' });
const millimetres = (count: number) => ({ ok: true, ticks: count * TICKS_PER_MM, unit: 'mm' });

function reasonFor(text: string, unit: Unit = 'in'): string {
  const parsed = parseLength(text, unit);
  return parsed.ok ? `read as ${parsed.ticks} ${parsed.unit}` : parsed.reason;
}

describe('what is read', () => {
  it('the example of its description', () => {
    expect(parseLength('1-3/8"', 'mm')).toEqual({ ok: true, ticks: 349_250_000, unit: 'in' });
  });

  it.each([
    ['1 3/8', 1.375],
    ['1-3/8', 1.375],
    ['1 - 3/8', 1.375],
    ['1- 3/8', 1.375],
    ['1 -3/8', 1.375],
    ['11/8', 1.375],
    ['1 11/8', 2.375],
    ['3 / 4', 0.75],
    ['1 3 / 4', 1.75],
    ['1.375', 1.375],
    ['.75', 0.75],
    [',75', 0.75],
    ['1,375', 1.375],
    ['1,234', 1.234],
    ['007', 7],
    ['0', 0],
    ['0/4', 0],
    ['2 0/4', 2],
    ['1½', 1.5],
    ['1 ½', 1.5],
    ['1-½', 1.5],
    ['¾', 0.75],
    ['⅛', 0.125],
    ['⅞', 0.875],
    ['11⅜', 11.375],
    ['1⁄2', 0.5],
    ['1 1⁄2', 1.5],
    ['1–3/8', 1.375],
    ['1−3/8', 1.375],
    ['1 – 3/8', 1.375],
    ['  1   3/8  ', 1.375],
    ['\t1\u00a03/8\n', 1.375],
    ['+1/2', 0.5],
    ['-1/2', -0.5],
    ['–1/2', -0.5],
    ['−1/2', -0.5],
    ['-½', -0.5],
    ['-1 3/8', -1.375],
    ['-1-3/8', -1.375],
    ['-.75', -0.75],
    ['0.00010', 0.0001],
  ])('%j in the unit asked for', (text, count) => {
    expect(parseLength(text, 'in')).toEqual(inches(count));
    const counted = parseLength(text, 'mm');
    expect(counted).toEqual({ ok: true, ticks: Math.round(count * TICKS_PER_MM), unit: 'mm' });
  });

  it.each([
    ['3/4"', 0.75],
    ["3/4''", 0.75],
    ['3/4”', 0.75],
    ['3/4“', 0.75],
    ['3/4″', 0.75],
    ['3/4’’', 0.75],
    ['3/4′′', 0.75],
    ['3/4 "', 0.75],
    ['3/4 in', 0.75],
    ['3/4in', 0.75],
    ['3/4 in.', 0.75],
    ['3/4in.', 0.75],
    ['3/4 inch', 0.75],
    ['3/4 inches', 0.75],
    ['3/4 INCHES', 0.75],
    ['3/4 In.', 0.75],
    ['.75in', 0.75],
    ['¾"', 0.75],
    ["1'", 12],
    ["0'", 0],
    ['1’', 12],
    ['1′', 12],
    [`1' 2-1/2"`, 14.5],
    [`1'2-1/2"`, 14.5],
    [`1' 2 1/2"`, 14.5],
    [`1′ 2½″`, 14.5],
    [`1’ 2½”`, 14.5],
    [`1' 2''`, 14],
    [`1'-2"`, 14],
    [`1' 2 in`, 14],
    [`1' 2.5"`, 14.5],
    [`1' 1/2"`, 12.5],
    [`1' 14"`, 26],
    [`0' 3"`, 3],
    [`1' 6`, 18],
    [`-1' 2"`, -14],
    [`+1' 2"`, 14],
  ])('%j as inches, whatever unit was asked for', (text, count) => {
    expect(parseLength(text, 'mm')).toEqual(inches(count));
    expect(parseLength(text, 'in')).toEqual(inches(count));
  });

  it.each([
    ['19.05mm', 19.05],
    ['19.05 mm', 19.05],
    ['19,05 mm', 19.05],
    ['19.05 MM', 19.05],
    ['1/2 mm', 0.5],
    ['1½ mm', 1.5],
    ['-3 mm', -3],
    ['0.0000001 mm', 0.0000001],
  ])('%j as millimetres, whatever unit was asked for', (text, count) => {
    expect(parseLength(text, 'in')).toEqual(millimetres(count));
    expect(parseLength(text, 'mm')).toEqual(millimetres(count));
  });

  it('ten metres to either side, exactly, and 64 characters', () => {
    expect(parseLength('10000 mm', 'mm')).toEqual({ ok: true, ticks: MAX_LENGTH, unit: 'mm' });
    expect(parseLength('-10000 mm', 'mm')).toEqual({ ok: true, ticks: -MAX_LENGTH, unit: 'mm' });
    expect(parseLength(`${' '.repeat(63)}1`, 'mm')).toEqual(millimetres(1));
  });

  it.each(['-0', '-0.0', '-0/8', '- 0', "-0'", '−0 0/4 in'])('%j as zero without a sign', (text) => {
    const parsed = parseLength(text, 'in');
    expect(parsed.ok && Object.is(parsed.ticks, 0)).toBe(true);
  });
});

describe('what is refused, with a reason', () => {
  it('with examples in the unit of the sheet first', () => {
    expect(parseLength('long', 'in')).toMatchObject({
      reason: expect.stringMatching(/like 1 3\/8, 1\.375 or 35 mm\.$/),
    });
    expect(parseLength('long', 'mm')).toMatchObject({
      reason: expect.stringMatching(/like 35, 35\.5 or 1 3\/8 in\.$/),
    });
    expect(parseLength('', 'mm')).toMatchObject({ reason: 'Type a length, such as 35 or 1 3/8 in.' });
  });

  it.each([
    ['', 'Type a length, such as 1 3/8 or 35 mm.'],
    [' \t ', 'Type a length, such as 1 3/8 or 35 mm.'],
    [`${' '.repeat(64)}1`, 'It is longer than 64 characters.'],
    ['1'.repeat(65), 'It is longer than 64 characters.'],
    ['1/0', 'The number below the line of a fraction cannot be 0.'],
    ['0/0', 'The number below the line of a fraction cannot be 0.'],
    ['1 1/00', 'The number below the line of a fraction cannot be 0.'],
    ['1/3 in', 'No rule or caliper reads that. Give a ruler fraction such as 5/16, or fewer decimals.'],
    ['⅓', 'No rule or caliper reads that. Give a ruler fraction such as 5/16, or fewer decimals.'],
    ['0.0000001 in', 'No rule or caliper reads that. Give a ruler fraction such as 5/16, or fewer decimals.'],
    [
      '0.00000001 mm',
      'No rule or caliper reads that. Give a ruler fraction such as 5/16, or fewer decimals.',
    ],
    ['1.2.3', 'It has two decimal signs. Leave out any thousands sign.'],
    ['1,234.5', 'It has two decimal signs. Leave out any thousands sign.'],
    ['1,2,3', 'It has two decimal signs. Leave out any thousands sign.'],
    ['1.', 'A decimal sign needs a digit after it.'],
    ['1,', 'A decimal sign needs a digit after it.'],
    ['1. in', 'A decimal sign needs a digit after it.'],
    ['1.5 1/2', 'Write a decimal or a fraction, not both.'],
    ['1.5½', 'Write a decimal or a fraction, not both.'],
    ['1.5-1/2', 'Write a decimal or a fraction, not both.'],
    ['1.5/2', 'A fraction takes whole numbers above and below the line.'],
    ['1/2.5', 'A fraction takes whole numbers above and below the line.'],
    ["1.5'", `Decimal feet are not read. Write feet and inches, such as 1' 6".`],
    [`1,5' 2"`, `Decimal feet are not read. Write feet and inches, such as 1' 6".`],
    ["1/2'", `Parts of a foot are not read. Write feet and inches, such as 1' 6".`],
    ["1½'", `Parts of a foot are not read. Write feet and inches, such as 1' 6".`],
    ["1' 5 mm", 'Feet go with inches, not with millimetres.'],
    ['1 ft', "Only inches, millimetres and feet with a ' mark are read."],
    ['1 foot', "Only inches, millimetres and feet with a ' mark are read."],
    ['1cm', "Only inches, millimetres and feet with a ' mark are read."],
    ['1 m', "Only inches, millimetres and feet with a ' mark are read."],
    ['1e3', 'Powers of ten are not read. Write the number out.'],
    ['1E-3 mm', 'Powers of ten are not read. Write the number out.'],
    ['10000.0000001 mm', 'It is longer than 10 m.'],
    ['-10000.0000001 mm', 'It is longer than 10 m.'],
    ['393.8 in', 'It is longer than 10 m.'],
    ["33'", 'It is longer than 10 m.'],
    ['9'.repeat(64), 'It is longer than 10 m.'],
    ['-', 'There is no number in it.'],
    ['+', 'There is no number in it.'],
    ['3/', 'A fraction needs a number above and one below the line.'],
    ['/4', 'A fraction needs a number above and one below the line.'],
    ['1//2', 'A fraction needs a number above and one below the line.'],
    ['1/½', 'A fraction needs a number above and one below the line.'],
    ['½/2', 'A fraction needs a number above and one below the line.'],
  ])('%j', (text, reason) => {
    expect(reasonFor(text)).toBe(reason);
  });

  it.each([
    ...['x', 'in', 'mm', '"', "''", "'", '.', '--1', '+-1', '1--3/8', '1+3/8', '1 3/8 x', '1 2', '1 000'],
    ...['1-3', '1/2-3/8', '1/2/3', '½2', '1½½', '1"1', '3/4" in', '3/4 in in', "1'''", "1' '", "1' 2' 3\""],
    ...[
      "1' mm",
      '1 in 3/8',
      '1 inch.',
      '1 mm.',
      '0x10',
      '1_000',
      '١',
      '１',
      'NaN',
      'Infinity',
      '1—3/8',
      '1 3/8 1/2',
    ],
    ...['$1', '(1)', '1;', '1:2', '1*2', '1 in 2 mm', '25,4 mm 1'],
  ])('%j, since something is left over', (text) => {
    expect(parseLength(text, 'in').ok).toBe(false);
    expect(parseLength(text, 'mm').ok).toBe(false);
    expect(reasonFor(text).length).toBeGreaterThan(20);
  });
});

describe('any text at all', () => {
  const typed = fc.string({ unit: fc.constantFrom(...'0123456789 ./,-+\'"½¾⁄–−′″inchmft'), maxLength: 12 });

  it('is either read as whole ticks to 10 m or refused with a sentence', () => {
    fc.assert(
      fc.property(fc.oneof(typed, fc.string()), fc.constantFrom<Unit>('in', 'mm'), (text, unit) => {
        const parsed = parseLength(text, unit);
        if (!parsed.ok) return /^[A-Z].*\.$/.test(parsed.reason);
        return (
          Number.isInteger(parsed.ticks) &&
          Math.abs(parsed.ticks) <= MAX_LENGTH &&
          !Object.is(parsed.ticks, -0)
        );
      }),
      { numRuns: 3000 },
    );
  });

  it('reads the same when it is padded, put in capitals or given its own unit', () => {
    fc.assert(
      fc.property(typed, fc.constantFrom<Unit>('in', 'mm'), (text, unit) => {
        const parsed = parseLength(text, unit);
        fc.pre(parsed.ok);
        expect(parseLength(`  ${text.toUpperCase()} `, unit)).toEqual(parsed);
        if (/^[\d ./,+-]+$/.test(text))
          expect(parseLength(`${text} ${unit}`, unit === 'in' ? 'mm' : 'in')).toEqual(parsed);
      }),
      { numRuns: 500 },
    );
  });
});
