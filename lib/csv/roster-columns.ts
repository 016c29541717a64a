/** What a column of a roster can hold; a column that is none of these is not read. */
export const ROSTER_COLUMNS = ['localId', 'familyName', 'givenName', 'fullName', 'none'] as const;

export type RosterColumn = (typeof ROSTER_COLUMNS)[number];

export interface RosterLayout {
  /** Whether the first row names the columns. */
  header: boolean;
  columns: RosterColumn[];
  /** False when a person should look at the columns before they are believed. */
  sure: boolean;
}

const HEADER_WORDS: Record<Exclude<RosterColumn, 'none'>, readonly string[]> = {
  localId: [
    'id',
    'local id',
    'student id',
    'student number',
    'student no',
    'id number',
    'pupil number',
    'number',
    'no',
    'student local id',
  ],
  familyName: ['family name', 'family', 'last name', 'last', 'surname', 'student last name'],
  givenName: ['given name', 'given', 'given names', 'first name', 'first', 'forename', 'student first name'],
  fullName: ['name', 'full name', 'student', 'student name', 'names', 'pupil'],
};

/**
 * Which column holds what. A first row of known words names them; otherwise the column of numbers is taken for the
 * ID and the rest for names, and `sure` is false. `sure` is also false where the names are not found, or one is
 * there twice.
 * @example detectColumns([['ID', 'Surname', 'First name']]) // columns: localId, familyName, givenName; sure
 */
export function detectColumns(rows: readonly (readonly string[])[]): RosterLayout {
  const named = (rows[0] ?? []).map(columnOfWord);
  if (named.some((column) => column !== 'none')) {
    return { header: true, columns: named, sure: holdsNames(named) && !hasTwice(named) };
  }
  const width = Math.max(0, ...rows.map((row) => row.length));
  return { header: false, columns: guessColumns(rows, width), sure: false };
}

/** Whether these columns give every student a name. */
export function holdsNames(columns: readonly RosterColumn[]): boolean {
  const has = (column: RosterColumn) => columns.includes(column);
  return has('fullName') ? !has('familyName') && !has('givenName') : has('familyName') && has('givenName');
}

export function hasTwice(columns: readonly RosterColumn[]): boolean {
  const used = columns.filter((column) => column !== 'none');
  return new Set(used).size !== used.length;
}

function columnOfWord(field: string): RosterColumn {
  const word = field
    .normalize('NFKD')
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, ' ')
    .trim();
  const found = Object.entries(HEADER_WORDS).find(([, words]) => words.includes(word));
  return ROSTER_COLUMNS.find((column) => column === found?.[0]) ?? 'none';
}

function guessColumns(rows: readonly (readonly string[])[], width: number): RosterColumn[] {
  const columns = Array.from({ length: width }, (): RosterColumn => 'none');
  const digits = columns.map((_, index) => rows.filter((row) => /\d/.test(row[index] ?? '')).length);
  const most = Math.max(0, ...digits);
  const idAt = most * 2 > rows.length ? digits.indexOf(most) : -1;
  if (idAt >= 0) columns[idAt] = 'localId';
  const free = columns.flatMap((column, index) => (column === 'none' ? [index] : []));
  const [first, second] = free;
  if (first === undefined) return columns;
  if (second === undefined) columns[first] = 'fullName';
  else {
    columns[first] = 'familyName';
    columns[second] = 'givenName';
  }
  return columns;
}
