import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DELIMITERS, parseCsv } from '@/lib/csv/parse-csv';

function fieldsOf(text: string): string[][] {
  const parsed = parseCsv(text);
  if (!parsed.ok) throw new Error(parsed.reason);
  return parsed.rows.map(({ fields }) => fields);
}

// RFC 4180 section 2, its own examples and one of shop sizes written by the same rules.
const RFC_4180: [what: string, text: string, rows: string[][]][] = [
  [
    'two records, the last with its line break',
    'aaa,bbb,ccc\r\nzzz,yyy,xxx\r\n',
    [
      ['aaa', 'bbb', 'ccc'],
      ['zzz', 'yyy', 'xxx'],
    ],
  ],
  [
    'two records, the last without',
    'aaa,bbb,ccc\r\nzzz,yyy,xxx',
    [
      ['aaa', 'bbb', 'ccc'],
      ['zzz', 'yyy', 'xxx'],
    ],
  ],
  ['a line break inside quotation marks', '"aaa","b\r\nbb","ccc"\r\n', [['aaa', 'b\r\nbb', 'ccc']]],
  ['a doubled quotation mark', '"aaa","b""bb","ccc"', [['aaa', 'b"bb', 'ccc']]],
  ['spaces, which belong to the field', ' a , b ,c', [[' a ', ' b ', 'c']]],
  ['a comma inside quotation marks', '"Quispe, Wayra",00426', [['Quispe, Wayra', '00426']]],
  ['inch marks inside quotation marks', '"3 1/2"" x 3/4""",x', [['3 1/2" x 3/4"', 'x']]],
];

describe('parseCsv', () => {
  it.each(RFC_4180)('reads %s as RFC 4180 has it, and as csv-parse does', (_, text, rows) => {
    expect(fieldsOf(text)).toEqual(rows);
    expect(parse(text, { delimiter: ',' })).toEqual(rows);
  });

  it('keeps empty fields and leaves out rows in which every field is empty', () => {
    expect(fieldsOf('a,,c\r\n,,\r\n\r\nd,e,f')).toEqual([
      ['a', '', 'c'],
      ['d', 'e', 'f'],
    ]);
  });

  it('keeps a quotation mark inside a bare field, though RFC 4180 has no such field and csv-parse refuses it', () => {
    const text = 'aaa,b"bb,ccc';
    expect(fieldsOf(text)).toEqual([['aaa', 'b"bb', 'ccc']]);
    expect(() => parse(text)).toThrow();
  });

  it.each([
    ['never closed', 'a,b\r\nc,"d\r\ne,f', 2],
    ['closed before the field ends', 'a,b\r\n"c"d,e', 2],
  ])('refuses a quotation mark that is %s and names the line', (_, text, line) => {
    const parsed = parseCsv(text);
    expect(parsed.ok).toBe(false);
    expect(parsed.ok ? '' : parsed.reason).toContain(`line ${line}`);
  });

  it.each([
    [',', '00417,Abara,Chidi\n00422,Aguilar,Renata'],
    [';', '00417;Abara, Chidi\n00422;Aguilar, Renata'],
    ['\t', '00417\tAbara\tChidi\n00422\tAguilar\tRenata'],
    [',', 'Abara\nAguilar'],
    [';', '"a,b,c";1\n"d,e,f";2'],
  ])('finds %j between the fields', (delimiter, text) => {
    expect(parseCsv(text)).toMatchObject({ ok: true, delimiter });
  });

  it('says on which line of the file each row begins', () => {
    const parsed = parseCsv('a,b\r\n"c\r\nd",e\r\n\r\nf,g');
    expect(parsed.ok && parsed.rows.map(({ line }) => line)).toEqual([1, 2, 5]);
  });

  it('ignores a byte order mark', () => {
    expect(fieldsOf('\u{feff}ID,name\r\n1,Abara')).toEqual([
      ['ID', 'name'],
      ['1', 'Abara'],
    ]);
  });

  it('reads back, as csv-parse does, whatever is written in quotation marks', () => {
    const field = fc
      .string({ unit: 'binary', maxLength: 12 })
      .filter((text) => text.trim() !== '' && !text.startsWith('\u{feff}'));
    const table = fc
      .integer({ min: 2, max: 5 })
      .chain((width) =>
        fc.array(fc.array(field, { minLength: width, maxLength: width }), { minLength: 1, maxLength: 6 }),
      );
    fc.assert(
      fc.property(table, fc.constantFrom(...DELIMITERS), (rows, delimiter) => {
        const text = rows
          .map((row) => row.map((each) => `"${each.replaceAll('"', '""')}"`).join(delimiter))
          .join('\r\n');
        expect(fieldsOf(text)).toEqual(rows);
        expect(parse(text, { delimiter })).toEqual(rows);
      }),
    );
  });
});
