import Papa from 'papaparse';

/** A text is guarded; a number is a decimal with a point and an ASCII minus; null is an empty cell. */
export type CsvCell = { text: string } | { decimal: string } | null;

/** First characters on which a spreadsheet takes a text for a formula (OWASP ASVS 5, 1.2.10; CR from memory). */
const FORMULA_START = /^[=+\-@\t\r\0]/;

const DECIMAL = /^-?\d+(\.\d+)?$/;

/**
 * A CSV by RFC 4180: a header, CRLF after every line, fields in quotation marks where they need them. Texts that a
 * spreadsheet would run as a formula get an apostrophe before them; numbers stay numbers, −0.5 too. The same cells
 * give the same text, byte for byte. Throws RangeError for a decimal that is none or a row of another width.
 * @example writeCsv(['name', 'score'], [[{ text: '=1+1' }, { decimal: '-0.5' }]]) // "name,score\r\n'=1+1,-0.5\r\n"
 */
export function writeCsv(header: readonly string[], rows: readonly (readonly CsvCell[])[]): string {
  const lines = rows.map((row) => {
    if (row.length !== header.length) throw new RangeError('a row has as many cells as the header');
    return row.map(writeCell);
  });
  return `${Papa.unparse([[...header], ...lines], { newline: '\r\n' })}\r\n`;
}

function writeCell(cell: CsvCell): string {
  if (cell === null) return '';
  if ('text' in cell) return guardText(cell.text);
  if (!DECIMAL.test(cell.decimal)) throw new RangeError(`${cell.decimal} is no decimal`);
  return cell.decimal;
}

/** The text as it may stand in a cell: an apostrophe before what would be run as a formula. */
export function guardText(text: string): string {
  return FORMULA_START.test(text) ? `'${text}` : text;
}

/** Hundredths as a decimal without needless zeros: 8600 gives `86`, 8650 `86.5`, -50 `-0.5`. */
export function hundredthsAsDecimal(hundredths: number): string {
  return scaledAsDecimal(hundredths, 2);
}

/** `whole` / 10^places, exactly, without needless zeros. */
export function scaledAsDecimal(whole: number, places: number): string {
  if (!Number.isSafeInteger(whole)) throw new RangeError(`${whole} is no whole number`);
  const digits = Math.abs(whole)
    .toString()
    .padStart(places + 1, '0');
  const cut = digits.length - places;
  const fraction = digits.slice(cut).replace(/0+$/, '');
  const sign = whole < 0 ? '-' : '';
  return `${sign}${digits.slice(0, cut)}${fraction === '' ? '' : `.${fraction}`}`;
}
