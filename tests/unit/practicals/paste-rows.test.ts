import { describe, expect, it } from 'vitest';
import { splitCells } from '@/lib/csv/split-cells';
import { emptyLine, type SheetColumn } from '@/lib/practicals/draft';
import { emptyDraft } from '@/lib/practicals/empty-draft';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { pasteRows } from '@/lib/practicals/paste-rows';
import { readPasted, splitSizes } from '@/lib/practicals/read-pasted';
import { starterDraft } from '@/lib/practicals/starters';
import { ticksOf } from '@/tests/support/rubrics';

const rowsOf = (text: string, at: SheetColumn = 'label') => readPasted(text, at, splitCells)?.rows ?? null;

/** A text from the clipboard laid over nothing, from the first cell on. */
function pasted(text: string, unit: 'in' | 'mm' = 'in', at: SheetColumn = 'label') {
  const table = readPasted(text, at, splitCells);
  if (!table) throw new Error('this is no table');
  return pasteRows([], { row: 0, column: at }, table, unit);
}

const cellsOf = ({ lines }: ReturnType<typeof pasted>) =>
  lines.map(({ label, quantity, thickness, width, length, note }) => [
    label,
    quantity,
    thickness,
    width,
    length,
    note,
  ]);

describe('a text from the clipboard', () => {
  it('is a table when it has tabs or rows, and plain text for one cell otherwise', () => {
    expect(rowsOf('base\t1\r\nside\t2\r\n')).toEqual([
      ['base', '1'],
      ['side', '2'],
    ]);
    expect(rowsOf('4 1/2\r\n5\r\n', 'width')).toEqual([['4 1/2'], ['5']]);
    for (const [text, at] of [
      ['4 1/2', 'width'],
      ['4 1/2\r\n', 'width'],
      ['1,5', 'length'],
      ['square; true; flat', 'note'],
      ['', 'label'],
    ] as const) {
      expect(readPasted(text, at, splitCells)).toBeNull();
    }
  });

  it('may be parted by semicolons with decimal commas, or by commas', () => {
    expect(rowsOf('Leiste;2;13,5;35;260')).toEqual([['Leiste', '2', '13,5', '35', '260']]);
    expect(rowsOf('base,1,3/4,4 1/2,9\nhook,1\nfence,1,3/4,1 1/4,4 1/4')).toEqual([
      ['base', '1', '3/4', '4 1/2', '9'],
      ['hook', '1'],
      ['fence', '1', '3/4', '1 1/4', '4 1/4'],
    ]);
    expect(rowsOf('1,5\n2,5\n3', 'length')).toEqual([['1,5'], ['2,5'], ['3']]);
  });

  it('gives feet and inches as written, whether or not the spreadsheet put them in quotes', () => {
    expect(rowsOf('rail\t1\t"3/4"""\t2"\t"1\' 2-1/2"""')).toEqual([
      ['rail', '1', '3/4"', '2"', '1\' 2-1/2"'],
    ]);
    expect(rowsOf('"rail\t1\t2\nstile\t1\t2')).toEqual([
      ['"rail', '1', '2'],
      ['stile', '1', '2'],
    ]);
  });

  it.each([
    ['3/4 x 4-1/2 x 9', ['3/4', '4-1/2', '9']],
    ['13×35×260', ['13', '35', '260']],
    ['3/4 by 2 by 4', ['3/4', '2', '4']],
    ['3/4 x 4', null],
    ['box x y', null],
  ])('"%s" is three sizes, or none', (text, sizes) => {
    expect(splitSizes(text)).toEqual(sizes);
  });
});

describe('pasting rows of a spreadsheet', () => {
  it('makes lines of them, kept as they are, good or bad; empty rows are passed over', () => {
    const result = pasted('base\t1\t3/4\t 4 1/2 \t9\tgrain along\n\t\t\nguide\ttwo\t3/4\t3/4');
    expect(cellsOf(result)).toEqual([
      ['base', '1', '3/4', '4 1/2', '9', 'grain along'],
      ['guide', 'two', '3/4', '3/4', '', ''],
    ]);
    expect(new Set(result.into).size).toBe(2);
    expect(result.leftOut).toEqual({ rows: 0, cells: 0, columns: [] });
  });

  it('follows a head row in whatever order it names the columns, and says which it has no place for', () => {
    const result = pasted(
      'Qty.\tPart name\tWood\tLength (mm)\tWidth\tThickness\n2\tpost\tpine\t180\t35\t35\n1\tfoot\tpine\t120\t35\t35',
    );
    expect(cellsOf(result)).toEqual([
      ['post', '2', '35', '35', '180 mm', ''],
      ['foot', '1', '35', '35', '120 mm', ''],
    ]);
    expect(result.leftOut.columns).toEqual(['Wood']);
    expect(cellsOf(pasted('Part\tLength (mm)\npost\t180', 'mm'))).toEqual([['post', '1', '', '', '180', '']]);
  });

  it('takes no row of parts for a head', () => {
    expect(cellsOf(pasted('part\t1\t1\t1\t1\nlength\t1\t1\t1\t1'))).toHaveLength(2);
    expect(cellsOf(pasted('width\n1\n2', 'in', 'width')).map((cells) => cells[3])).toEqual(['1', '2']);
  });

  it('spreads a size in one cell over the three columns', () => {
    expect(cellsOf(pasted('base\t1\t3/4 x 4-1/2 x 9\tflat'))).toEqual([
      ['base', '1', '3/4', '4-1/2', '9', 'flat'],
    ]);
    expect(cellsOf(pasted('part\tsize (in)\npost\t1 x 2 x 3', 'mm'))).toEqual([
      ['post', '1', '1 in', '2 in', '3 in', ''],
    ]);
    expect(cellsOf(pasted('3/4 x 4-1/2 x 9', 'in', 'thickness'))).toEqual([
      ['', '1', '3/4', '4-1/2', '9', ''],
    ]);
  });

  it('overwrites from the cell in hand, keeps what the rows do not cover, and does not touch its input', () => {
    const before = starterDraft('bench-hook').lines;
    const copy = structuredClone(before);
    const { lines, into } = pasteRows(
      before,
      { row: 3, column: 'width' },
      {
        head: null,
        rows: [
          ['1', '3 1/2'],
          ['1', '4'],
        ],
      },
      'in',
    );
    expect(lines[3]).toMatchObject({ id: 'guide', label: 'guide', width: '1', length: '3 1/2' });
    expect(lines[4]).toMatchObject({ label: '', width: '1', length: '4' });
    expect(into).toEqual(['guide', lines[4]?.id]);
    expect(before).toEqual(copy);
  });

  it('counts what finds no place, and says what it had to shorten', () => {
    const row = ['part', '1', '1', '1', '1', '', 'one too many'].join('\t');
    const { lines, leftOut } = pasted(Array.from({ length: 402 }, () => row).join('\n'));
    expect(lines).toHaveLength(400);
    expect(leftOut).toEqual({ rows: 2, cells: 400, columns: [] });
    const long = pasted(`${'x'.repeat(500)}\t1`);
    expect([long.lines[0]?.label.length, long.shortened]).toEqual([400, 1]);
  });
});

it('of 400 pasted rows with five bad ones all are kept, each bad field is told, and that there are too many', () => {
  const bad: Record<number, string> = {
    17: 'part 17\t1\t1/2\twide\t3',
    80: 'part 80\t1.5\t1/2\t2\t3',
    160: '\t1\t1/2\t2\t3',
    240: 'part 240\t1\t1/3\t2\t3',
    399: 'part 399\t1\t1/2\t2\t-3',
  };
  const rows = Array.from({ length: 400 }, (_, index) => bad[index + 1] ?? `part ${index + 1}\t1\t1/2\t2\t3`);
  const draft = { ...emptyDraft('in', 'Many'), lines: pasted(rows.join('\n')).lines };
  const read = parseDraft(draft);
  expect(read.ok ? {} : read.errors).toEqual({
    lines: [expect.stringMatching(/at most 200 lines; these are 400\. All are kept as typed: remove 200/)],
    'lines.16.width': [expect.stringMatching(/cannot be read as a length/)],
    'lines.79.quantity': [expect.stringMatching(/whole number from 1 to 200/)],
    'lines.159.label': ['Name the part.'],
    'lines.239.thickness': [expect.stringMatching(/No rule or caliper reads that/)],
    'lines.398.length': ['A size is more than 0.'],
  });
  expect(draft.lines[16]?.width).toBe('wide');
});

describe('a cell as people write it', () => {
  const lineOf = (cells: Partial<Record<SheetColumn, string>>) => {
    const line = { ...emptyLine([]), label: 'rail', thickness: '1', width: '1', length: '1', ...cells };
    return parseDraft({ ...emptyDraft('in', 'One'), lines: [line] });
  };

  it.each([
    ['2', 2],
    [' 12 ', 12],
    ['x2', 2],
    ['2 ×', 2],
    ['2 pcs', 2],
    ['2 pieces', 2],
    ['2.00', 2],
    ['2,0', 2],
    ['200', 200],
  ])('"%s" are %i pieces', (quantity, pieces) => {
    const read = lineOf({ quantity });
    expect(read.ok && read.task.cutList.lines[0]?.quantity).toBe(pieces);
  });

  it.each(['', '0', '1.5', '201', '-1', 'two', '1/2', '1e2', '2 in'])(
    '"%s" is no number of pieces',
    (quantity) => {
      expect(lineOf({ quantity })).toMatchObject({
        errors: { 'lines.0.quantity': ['The number of pieces is a whole number from 1 to 200.'] },
      });
    },
  );

  it('reads feet and inches and decimal commas', () => {
    const read = lineOf({ thickness: '0,75', width: '1½', length: '1\' 2-1/2"' });
    expect(read.ok && read.task.cutList.lines[0]?.target).toEqual({
      thickness: ticksOf('3/4'),
      width: ticksOf('1 1/2'),
      length: ticksOf('14 1/2'),
    });
  });

  it.each([
    ['11000 mm', /longer than 10 m/],
    ['11 m', /Only inches, millimetres and feet/],
    ['1/3', /No rule or caliper reads that/],
    ['-1', /more than 0/],
    ['0', /more than 0/],
    ['4-Mar', /made a date of this size/],
    ['Mar-04', /made a date of this size/],
    ['3/4/2026', /made a date of this size/],
    ['march hare', /cannot be read as a length/],
  ])('a length of "%s" is told', (length, message) => {
    const read = lineOf({ length });
    expect(read.ok ? {} : read.errors).toEqual({ 'lines.0.length': [expect.stringMatching(message)] });
  });
});
