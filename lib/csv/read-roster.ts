import { type CsvRow, parseCsv } from './parse-csv';
import { detectColumns, hasTwice, holdsNames, type RosterColumn, type RosterLayout } from './roster-columns';
import { splitName, tidyName } from './split-name';

export const MAX_ROSTER_ROWS = 500;
export const MAX_ID_LENGTH = 40;
export const MAX_NAME_LENGTH = 80;

/** One student as the text has it; an ID of '' is to be made. */
export interface RosterLine {
  line: number;
  localId: string;
  familyName: string;
  givenName: string;
  /** What is wrong with this line alone, in sentences. */
  problems: string[];
}

export interface RosterText {
  kind: 'names' | 'csv';
  text: string;
  /** What a person chose; without it the columns are found out. */
  layout?: { header: boolean; columns: readonly RosterColumn[] } | undefined;
}

export type ReadRoster =
  | { ok: true; layout: RosterLayout; first: CsvRow[]; lines: RosterLine[] }
  | { ok: false; reason: string };

/**
 * The students that a pasted or uploaded text names. `names` is one name a line; `csv` has columns, chosen or found
 * out; `first` are its first rows as they stand, to show beside the columns. IDs are text and keep their zeros. Lines
 * carry their own problems; a whole text is refused when it names nobody, more than 500, or cannot be read as CSV.
 * @example readRoster({ kind: 'names', text: 'Abara, Chidi' }) // one line: family name Abara, given name Chidi
 */
export function readRoster({ kind, text, layout }: RosterText): ReadRoster {
  return kind === 'names' ? readNames(text) : readTable(text, layout);
}

function readNames(text: string): ReadRoster {
  const rows = text
    .split(/\r\n|\r|\n/)
    .map((name, index) => ({ line: index + 1, fields: [name] }))
    .filter(({ fields }) => fields.some((name) => name.trim() !== ''));
  const layout: RosterLayout = { header: false, columns: ['fullName'], sure: true };
  return gather(rows, layout, rows);
}

function readTable(text: string, chosen: RosterText['layout']): ReadRoster {
  const parsed = parseCsv(text);
  if (!parsed.ok) return parsed;
  const found = detectColumns(parsed.rows.map(({ fields }) => fields));
  const layout: RosterLayout = chosen
    ? {
        header: chosen.header,
        columns: [...chosen.columns],
        sure: holdsNames(chosen.columns) && !hasTwice(chosen.columns),
      }
    : found;
  return gather(layout.header ? parsed.rows.slice(1) : parsed.rows, layout, parsed.rows);
}

function gather(rows: CsvRow[], layout: RosterLayout, all: CsvRow[]): ReadRoster {
  if (rows.length === 0) {
    return {
      ok: false,
      reason:
        all.length > 0
          ? 'There are column names and no students under them.'
          : 'There is no name here yet. Write one name a line.',
    };
  }
  if (rows.length > MAX_ROSTER_ROWS) {
    return {
      ok: false,
      reason: `There are ${rows.length} rows; a section takes ${MAX_ROSTER_ROWS} at most. Keep the rows of one section and try again.`,
    };
  }
  const lines = rows.map((row) => readLine(row, layout));
  return { ok: true, layout, first: all.slice(0, 4), lines: markRepeats(lines) };
}

function readLine({ line, fields }: CsvRow, { columns }: RosterLayout): RosterLine {
  const at = (column: RosterColumn) => {
    const index = columns.indexOf(column);
    return index < 0 ? '' : (fields[index] ?? '');
  };
  const full = splitName(at('fullName'));
  const student = {
    localId: tidyName(at('localId')),
    familyName: columns.includes('fullName') ? full.familyName : tidyName(at('familyName')),
    givenName: columns.includes('fullName') ? full.givenName : tidyName(at('givenName')),
  };
  const extra = fields.slice(columns.length).some((field) => field.trim() !== '');
  const problems = [...nameProblems(student), ...idProblems(student.localId)];
  if (extra) {
    problems.push(
      `This row has ${fields.length} fields, the first one ${columns.length}: is there a comma inside a name?`,
    );
  }
  return { line, ...student, problems };
}

function nameProblems({ familyName, givenName }: { familyName: string; givenName: string }): string[] {
  if (familyName === '' && givenName === '') return ['The name is missing.'];
  const problems: string[] = [];
  if (Math.max(familyName.length, givenName.length) > MAX_NAME_LENGTH) {
    problems.push(`A name has more than ${MAX_NAME_LENGTH} characters.`);
  }
  if (/\p{Cc}|\p{Cs}/u.test(familyName + givenName)) {
    problems.push('The name has a character that cannot be seen, such as a line end. Type it again.');
  }
  return problems;
}

/** Why this text cannot be an ID. One that begins like a formula would be run by the next spreadsheet it reaches. */
export function idProblems(localId: string): string[] {
  if (localId === '') return [];
  if (/^[=+\-@]/.test(localId)) {
    return [
      `The ID begins with ${localId[0]}: spreadsheets run such a text as a formula. Take the ID from the school’s own list.`,
    ];
  }
  if (/^\d(?:[.,]\d+)?E[+-]?\d+$/i.test(localId)) {
    return [
      `${localId} is an ID that a spreadsheet has shortened to a power of ten; its digits are lost. Set the column to text there and save it again.`,
    ];
  }
  if (/^\d+[.,]0+$/.test(localId)) {
    return [
      `${localId} is an ID that a spreadsheet has turned into a decimal. Set the column to text there and save it again.`,
    ];
  }
  if (localId.length > MAX_ID_LENGTH) return [`The ID has more than ${MAX_ID_LENGTH} characters.`];
  if (/\p{Cc}|\p{Cs}/u.test(localId)) {
    return ['The ID has a character that cannot be seen, such as a line end. Type it again.'];
  }
  return [];
}

/** An ID, or a name without one, that stands twice: every line but the first says where the other is. */
function markRepeats(lines: RosterLine[]): RosterLine[] {
  const seen = new Map<string, RosterLine>();
  return lines.map((line) => {
    if (line.familyName === '' && line.givenName === '' && line.localId === '') return line;
    const byName = line.localId === '';
    const key = byName ? `name ${nameKey(line)}` : `id ${line.localId}`;
    const other = seen.get(key);
    if (!other) {
      seen.set(key, line);
      return line;
    }
    const problem = byName
      ? `This name also stands in line ${other.line}. If they are two people, give each an ID; otherwise leave one out.`
      : `The ID ${line.localId} also stands in line ${other.line}. Only one of them can have it.`;
    return { ...line, problems: [...line.problems, problem] };
  });
}

/** Equal for one name however it is capitalized. */
export function nameKey({ familyName, givenName }: { familyName: string; givenName: string }): string {
  return `${familyName.toLocaleLowerCase('en')}\u{1f}${givenName.toLocaleLowerCase('en')}`;
}
