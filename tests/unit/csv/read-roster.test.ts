import { describe, expect, it } from 'vitest';
import { idProblems, type ReadRoster, type RosterText, readRoster } from '@/lib/csv/read-roster';
import { detectColumns } from '@/lib/csv/roster-columns';
import { splitName } from '@/lib/csv/split-name';

function read(text: string, more: Partial<RosterText> = {}): Extract<ReadRoster, { ok: true }> {
  const roster = readRoster({ kind: 'csv', text, ...more });
  if (!roster.ok) throw new Error(roster.reason);
  return roster;
}

const students = (roster: Extract<ReadRoster, { ok: true }>) =>
  roster.lines.map(({ localId, familyName, givenName }) => [localId, familyName, givenName]);

describe('columns of a roster', () => {
  it.each([
    [['ID', 'Surname', 'First name'], ['localId', 'familyName', 'givenName'], true],
    [
      ['Student ID', 'Last Name', 'First Name', 'E-mail'],
      ['localId', 'familyName', 'givenName', 'none'],
      true,
    ],
    [
      ['local_id', 'family name', 'given-name', 'period'],
      ['localId', 'familyName', 'givenName', 'none'],
      true,
    ],
    [['Name'], ['fullName'], true],
    [['id', 'name', 'surname'], ['localId', 'fullName', 'familyName'], false],
    [['id', 'id', 'name'], ['localId', 'localId', 'fullName'], false],
    [['id', 'surname'], ['localId', 'familyName'], false],
  ])('reads the header %j', (header, columns, sure) => {
    expect(detectColumns([header])).toEqual({ header: true, columns, sure });
  });

  it.each([
    [
      [
        ['00417', 'Abara', 'Chidi'],
        ['00422', 'Aguilar', 'Renata'],
      ],
      ['localId', 'familyName', 'givenName'],
    ],
    [
      [
        ['Abara', 'Chidi', '00417'],
        ['Aguilar', 'Renata', '00422'],
      ],
      ['familyName', 'givenName', 'localId'],
    ],
    [[['Abara, Chidi', '417']], ['fullName', 'localId']],
    [[['Abara', 'Chidi']], ['familyName', 'givenName']],
    [[['Abara']], ['fullName']],
  ])('guesses the columns of %j without a header, and asks', (rows, columns) => {
    expect(detectColumns(rows)).toEqual({ header: false, columns, sure: false });
  });
});

describe('splitName', () => {
  it.each([
    ['Quispe, Wayra', 'Quispe', 'Wayra'],
    ['Wayra Quispe', 'Quispe', 'Wayra'],
    ['  Mary   Ann Smith ', 'Smith', 'Mary Ann'],
    ['van Dyke, Mary Ann', 'van Dyke', 'Mary Ann'],
    ['Cher', 'Cher', ''],
    ['Jose\u{301} Pe\u{301}rez', 'Pérez', 'José'],
  ])('splits %j', (text, familyName, givenName) => {
    expect(splitName(text)).toEqual({ familyName, givenName });
  });
});

describe('readRoster', () => {
  it('reads pasted names, one a line, without IDs', () => {
    const roster = read('Abara, Chidi\r\n\r\nRenata Aguilar\n', { kind: 'names' });
    expect(students(roster)).toEqual([
      ['', 'Abara', 'Chidi'],
      ['', 'Aguilar', 'Renata'],
    ]);
    expect(roster.lines.map(({ line }) => line)).toEqual([1, 3]);
    expect(roster.layout.sure).toBe(true);
  });

  it.each([',', ';', '\t'])('keeps the zeros of IDs with %j between the fields', (mark) => {
    const text = ['ID,family name,given name', '00417,Abara,Chidi', '0,Zero,Ana']
      .join('\r\n')
      .replaceAll(',', mark);
    expect(students(read(text))).toEqual([
      ['00417', 'Abara', 'Chidi'],
      ['0', 'Zero', 'Ana'],
    ]);
  });

  it('takes the columns that a person chose over those it would find', () => {
    const roster = read('Chidi,Abara,417', {
      layout: { header: false, columns: ['givenName', 'familyName', 'localId'] },
    });
    expect(students(roster)).toEqual([['417', 'Abara', 'Chidi']]);
    expect(roster.layout.sure).toBe(true);
  });

  // One case for each thing that can be wrong with a row.
  const HEADER = 'ID,family name,given name';
  it.each([
    ['a missing name', '00417,,', /name is missing/],
    ['a name of spaces', '00417,"  ", ', /name is missing/],
    ['an ID that begins with =', '=1+1,Abara,Chidi', /begins with =.*formula/],
    ['an ID that begins with +', '+417,Abara,Chidi', /begins with \+/],
    ['an ID that begins with -', '-417,Abara,Chidi', /begins with -/],
    ['an ID that begins with @', '@417,Abara,Chidi', /begins with @/],
    ['an ID shortened to a power of ten', '4.17E+02,Abara,Chidi', /4\.17E\+02.*power of ten/],
    ['an ID shortened with a decimal comma', '"4,17E+05",Abara,Chidi', /power of ten/],
    ['an ID turned into a decimal', '417.0,Abara,Chidi', /decimal/],
    ['an ID with a line end', '"41\r\n7",Abara,Chidi', /cannot be seen/],
    ['an ID with a bell', '41\u{7}7,Abara,Chidi', /cannot be seen/],
    ['an ID that is too long', `${'1'.repeat(41)},Abara,Chidi`, /more than 40/],
    ['a name that is too long', `00417,${'A'.repeat(81)},Chidi`, /more than 80/],
    ['a name with a control character', '00417,Ab\u{1}ara,Chidi', /cannot be seen/],
    ['a field too many', '00417,Abara,Chidi,x', /comma inside a name/],
  ])('names %s at its row', (_, row, problem) => {
    const [line] = read(`${HEADER}\r\n${row}\r\n`).lines;
    expect(line?.problems.join(' ')).toMatch(problem);
    expect(line?.line).toBe(2);
  });

  it('takes a name that begins like a formula: it is guarded when it goes out again', () => {
    expect(read(`${HEADER}\r\n00417,=Abara,Chidi`).lines[0]?.problems).toEqual([]);
  });

  it('names the line of an ID that stands twice, and not the first one', () => {
    const { lines } = read(`${HEADER}\n00417,Abara,Chidi\n00422,Aguilar,Renata\n00417,Ito,Kenji`);
    expect(lines.map(({ problems }) => problems.length)).toEqual([0, 0, 1]);
    expect(lines[2]?.problems[0]).toContain('also stands in line 2');
  });

  it('tells 0417 from 417: IDs are text', () => {
    const { lines } = read(`${HEADER}\n0417,Abara,Chidi\n417,Aguilar,Renata`);
    expect(lines.flatMap(({ problems }) => problems)).toEqual([]);
  });

  it('names a repeated name without an ID', () => {
    const { lines } = read('Kim, Ji\nkim, ji', { kind: 'names' });
    expect(lines[1]?.problems[0]).toContain('also stands in line 1');
  });

  it('takes 500 rows and refuses 501 with a sentence', () => {
    const rows = (count: number) => Array.from({ length: count }, (_, at) => `Name${at}, Given`).join('\n');
    expect(read(rows(500), { kind: 'names' }).lines).toHaveLength(500);
    expect(readRoster({ kind: 'names', text: rows(501) })).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/501 rows.*Keep the rows of one section/),
    });
  });

  it.each([
    ['', /Write one name a line/],
    ['ID,name\r\n', /no students under them/],
    ['a,"b', /quotation mark is not closed/],
  ])('refuses %j with what to do', (text, reason) => {
    expect(readRoster({ kind: 'csv', text })).toMatchObject({
      ok: false,
      reason: expect.stringMatching(reason),
    });
  });

  it('keeps the promise of its example', () => {
    expect(read('Abara, Chidi', { kind: 'names' }).lines[0]).toMatchObject({
      familyName: 'Abara',
      givenName: 'Chidi',
    });
  });

  it('takes no ID for one to be made', () => {
    expect(idProblems('')).toEqual([]);
  });
});
