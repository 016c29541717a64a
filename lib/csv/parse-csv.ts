import Papa from 'papaparse';

/** In the order of preference: commas stand in names too. */
export const DELIMITERS = ['\t', ';', ','] as const;

export type Delimiter = (typeof DELIMITERS)[number];

export interface CsvRow {
  /** The line of the file that the row begins on, from 1. */
  line: number;
  fields: string[];
}

export type ParsedCsv = { ok: true; delimiter: Delimiter; rows: CsvRow[] } | { ok: false; reason: string };

/**
 * The rows of a CSV as RFC 4180 reads it, with comma, semicolon or TAB between the fields, whichever fits the text.
 * Fields are taken as they stand, spaces too; empty lines are left out. A quotation mark inside a field that has
 * none around it is kept as it is. Refused: a field whose quotation mark is never closed, or closed too early.
 * @example parseCsv('00417;Abara') // { ok: true, delimiter: ';', rows: [{ line: 1, fields: ['00417', 'Abara'] }] }
 */
export function parseCsv(text: string): ParsedCsv {
  const plain = text.replace(/^\u{feff}/u, '');
  const delimiter = guessDelimiter(plain);
  const { data, errors } = Papa.parse<string[]>(plain, { delimiter, header: false });
  const quote = errors.find((error) => error.type === 'Quotes');
  if (quote) return { ok: false, reason: unbalanced(lineOf(data, quote.row ?? 0, quote.code)) };
  let line = 1;
  const rows: CsvRow[] = [];
  for (const fields of data) {
    if (fields.some((field) => field.trim() !== '')) rows.push({ line, fields });
    line += linesIn(fields);
  }
  return { ok: true, delimiter, rows };
}

/** The delimiter that stands outside quotation marks in most lines, and as often in each; a comma when none does. */
function guessDelimiter(text: string): Delimiter {
  const scored = DELIMITERS.map((delimiter) => {
    const { data } = Papa.parse<string[]>(text, { delimiter, preview: 50, skipEmptyLines: 'greedy' });
    const widths = data.map((fields) => fields.length);
    const width = mostFrequent(widths);
    const agreeing = widths.filter((each) => each === width).length;
    return { delimiter, score: width > 1 ? agreeing * 100 + width : widths.some((each) => each > 1) ? 1 : 0 };
  });
  const best = scored.reduce((a, b) => (b.score > a.score ? b : a));
  return best.score === 0 ? ',' : best.delimiter;
}

function mostFrequent(numbers: readonly number[]): number {
  const counts = new Map<number, number>();
  for (const number of numbers) counts.set(number, (counts.get(number) ?? 0) + 1);
  return [...counts].reduce((a, b) => (b[1] > a[1] ? b : a), [0, 0])[0];
}

function linesIn(fields: readonly string[]): number {
  return 1 + fields.reduce((sum, field) => sum + (field.match(/\r\n|\r|\n/g)?.length ?? 0), 0);
}

/** Papa names the row it was in; a mark that is never closed swallows the rest, so its own row is the last. */
function lineOf(rows: readonly string[][], row: number, code: string): number {
  const upTo = code === 'MissingQuotes' ? rows.length - 1 : row;
  return 1 + rows.slice(0, upTo).reduce((sum, fields) => sum + linesIn(fields), 0);
}

function unbalanced(line: number): string {
  return `From line ${line} on a quotation mark is not closed, so names cannot be told apart. Remove it or write it twice, and try again.`;
}
