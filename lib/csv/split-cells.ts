import Papa from 'papaparse';

/**
 * Parts a pasted text into rows and cells; empty rows are passed over. A quote that is never closed, such as an inch
 * mark at the head of a cell, is taken as written instead of swallowing what follows. Pure.
 *
 * @example splitCells('a\tb\nc\td', '\t') // [['a', 'b'], ['c', 'd']]
 */
export function splitCells(text: string, delimiter: string): string[][] {
  const { data, errors } = Papa.parse<string[]>(text, { delimiter, skipEmptyLines: 'greedy' });
  const torn = errors.some(({ type }) => type === 'Quotes');
  return torn ? text.split(/\r\n?|\n/).map((line) => line.split(delimiter)) : data;
}
