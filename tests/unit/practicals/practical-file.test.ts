import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseDraft } from '@/lib/practicals/parse-draft';
import {
  MAX_PRACTICAL_FILE_BYTES,
  practicalFileName,
  writePracticalFile,
} from '@/lib/practicals/practical-file';
import { type FileProblem, readPracticalFile } from '@/lib/practicals/read-practical-file';
import { STARTER_IDS } from '@/lib/practicals/starter-plans';
import { starterDraft } from '@/lib/practicals/starters';
import type { Task } from '@/lib/practicals/task';
import type { RubricForm } from '@/lib/scoring';
import { formArb } from '@/tests/support/form-arbitraries';
import { defaultForm, defaultTask } from '@/tests/support/rubrics';

const task: Task = { ...defaultTask(), lineNotes: { end: 'Grain up: „ätsch“ \\ "so"' } };
const example = readFileSync('tests/support/data/bench-hook.practical.json', 'utf8');

function read(text: string): { task: Task; form: RubricForm } {
  const result = readPracticalFile(text);
  if (!result.ok) throw new Error(JSON.stringify(result.problems));
  return { task: result.task, form: result.form };
}

function problemsOf(text: string): FileProblem[] {
  const result = readPracticalFile(text);
  return result.ok ? [] : result.problems;
}

const shown = (text: string) =>
  problemsOf(text).map(({ path, line, column, reason }) => `${line}:${column} ${path}: ${reason}`);

/** The worked example with one spot written otherwise. */
function spoiled(from: string, to: string, base = example): string {
  if (!base.includes(from)) throw new Error(`The example has no ${from}.`);
  return base.replace(from, to);
}

/** Keys in the order in which a database gives them back: the shortest first. */
function inStoredOrder(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(inStoredOrder);
  if (typeof value !== 'object' || value === null) return value;
  const entries = Object.entries(value).toSorted(([a], [b]) => a.length - b.length || (a < b ? -1 : 1));
  return Object.fromEntries(entries.map(([key, each]) => [key, inStoredOrder(each)]));
}

/** A generated form as one that the editor itself could have made. */
const editorForm = (form: RubricForm): RubricForm => ({ ...form, unit: task.unit });

describe('the file of a practical', () => {
  it('brings back the very same task and form', () => {
    fc.assert(
      fc.property(formArb(task.cutList), (given) => {
        const form = editorForm(given);
        const result = readPracticalFile(writePracticalFile(task, form));
        expect(result).toEqual({ ok: true, task, form });
      }),
      { numRuns: 60 },
    );
  });

  it('is the same byte for byte however its parts were stored', () => {
    fc.assert(
      fc.property(formArb(task.cutList), (given) => {
        const form = editorForm(given);
        const stored = inStoredOrder({ task, form }) as { task: Task; form: RubricForm };
        expect(writePracticalFile(stored.task, stored.form)).toBe(writePracticalFile(task, form));
      }),
      { numRuns: 30 },
    );
  });

  it.each(STARTER_IDS)('takes the starter %s out and in again', (starter) => {
    const parsed = parseDraft(starterDraft(starter));
    if (!parsed.ok) throw new Error('a starter reads');
    const text = writePracticalFile(parsed.task, parsed.form);
    expect(read(text)).toEqual({ task: parsed.task, form: parsed.form });
    expect(text.endsWith('}\n')).toBe(true);
  });

  it('reads the worked example, and writes it back as it is', () => {
    const { task: hook, form } = read(example);
    expect(hook.title).toBe('Bench-hook kit');
    expect(hook.cutList.lines.map(({ id, quantity }) => [id, quantity])).toEqual([
      ['base', 1],
      ['hook', 1],
      ['fence', 1],
      ['guide', 2],
    ]);
    expect(form.exceptions).toMatchObject({ hook: { worth: 1200, sizes: { length: { beyondUnder: 500 } } } });
    expect(writePracticalFile(hook, form)).toBe(example);
  });

  it('leaves out what belongs to no line, as it is without effect', () => {
    const form = { ...defaultForm(), exceptions: { gone: { worth: 1 } } };
    const text = writePracticalFile({ ...task, lineNotes: { gone: 'x' } }, form);
    expect(text).not.toContain('gone');
    expect(read(text).form.exceptions).toEqual({});
  });

  it('has a name that every system keeps', () => {
    expect(practicalFileName('Bench-hook kit', 2)).toBe('bench-hook-kit-version-2.practical.json');
    expect(practicalFileName('../é “x”\r\n', null)).toBe('e-x-draft.practical.json');
    expect(practicalFileName('箱', 1)).toBe('practical-version-1.practical.json');
    expect(practicalFileName('a'.repeat(120), 1).length).toBeLessThan(100);
  });
});

describe('a file that is taken as it comes', () => {
  it('may begin with a byte order mark and end its lines either way', () => {
    expect(read(`\uFEFF${example}`)).toEqual(read(example));
    expect(read(example.replaceAll('\n', '\r\n'))).toEqual(read(example));
    expect(read(example.replaceAll(/\n\s*/g, ''))).toEqual(read(example));
  });

  it('may have its names in any order', () => {
    const { task: hook, form } = read(example);
    const turned = JSON.stringify(inStoredOrder({ form, task: hook, version: 1, trymark: 'practical' }));
    expect(read(turned)).toEqual({ task: hook, form });
  });
});

describe('a file that is no practical', () => {
  it.each([
    ['nothing', '', '1:1 : There is nothing in it.'],
    ['white space', ' \n ', '1:1 : There is nothing in it.'],
    [
      'another format',
      '{"kind":"roster"}',
      '1:1 : This is not a practical file: one begins with "trymark": "practical".',
    ],
    [
      'another kind',
      '{"trymark":"roster"}',
      '1:12 trymark: This is not a practical file: one begins with "trymark": "practical".',
    ],
    ['a list', '[1]', '1:1 : This is not a practical file: one begins with "trymark": "practical".'],
    ['null', 'null', '1:1 : This is not a practical file: one begins with "trymark": "practical".'],
    ['no version', '{"trymark":"practical"}', '1:1 : The version of the format is 1.'],
    ['version 0', '{"trymark":"practical","version":0}', '1:34 version: The version of the format is 1.'],
    [
      'a later version',
      '{"trymark":"practical",\n"version":2,"task":7}',
      '2:11 version: This file was made by a newer Trymark: it is in version 2 of the format, and this one reads version 1.',
    ],
  ])('is refused: %s', (_, text, expected) => {
    expect(shown(text)).toEqual([expected]);
  });

  it.each([
    ['cut off', example.slice(0, 300), 'The closing double quote of this text is missing.'],
    ['with a remark', `// mine\n${example}`, 'A remark has no place in this file. Take it out.'],
    ['with a comma too many', spoiled('"kerf": 31750000,', '"kerf": 31750000,,'), 'A name in double quotes'],
    ['with text after its end', `${example}{}`, 'The file goes on after its end.'],
    ['in single quotes', "{'trymark': 1}", 'This word has no meaning here.'],
    ['with a tab in a text', spoiled('poplar', 'pop\tlar'), 'A text cannot hold this sign as it is'],
    ['of plain words', 'Bench-hook kit, 5 pieces', 'This word has no meaning here.'],
  ])('is refused as no JSON: %s', (_, text, expected) => {
    const [first] = problemsOf(text);
    expect(first?.reason).toContain(expected);
  });

  it('is refused when it is nested without end, at the place where it is too deep', () => {
    for (const text of ['['.repeat(500_000), '{"a":'.repeat(100_000)]) {
      const problems = problemsOf(text);
      expect(problems).toHaveLength(1);
      expect(problems[0]?.reason).toBe('This is nested more than 32 deep. No practical is.');
    }
  });

  it('is refused past 1 MB, counted as it is stored', () => {
    const long = example.replace('poplar', 'é'.repeat(MAX_PRACTICAL_FILE_BYTES / 2));
    expect(shown(long)).toEqual(['1:1 : A practical file has at most 1 MB. This one has more.']);
  });
});

describe('a practical file with faults', () => {
  it.each([
    ['a missing name', '"kerf": 31750000,\n', '', '“kerf” is missing here.', 'task.kerf'],
    [
      'an unknown name',
      '"kerf"',
      '"kurf"',
      'A practical file knows no such name in this place.',
      'task.kurf',
    ],
    [
      'a size of nothing',
      '"thickness": 190500000',
      '"thickness": 0',
      'This is more than 0.',
      'task.blank.thickness',
    ],
    [
      'a size below nothing',
      '"width": 317500000',
      '"width": -1',
      'A length is more than 0.',
      'task.cutList.lines[1].target.width',
    ],
    [
      'a size past 10 m',
      '"length": 1270000000',
      '"length": 100000000001',
      'A length is at most 10 m.',
      'task.cutList.lines[1].target.length',
    ],
    [
      'a fraction of a tick',
      '"kerf": 31750000',
      '"kerf": 31750000.5',
      'Every number here is whole: write it out, without a point or an exponent.',
      'task.kerf',
    ],
    [
      'an exponent',
      '"kerf": 31750000',
      '"kerf": 3175e4',
      'Every number here is whole: write it out, without a point or an exponent.',
      'task.kerf',
    ],
    [
      'a number past 2^53',
      '"kerf": 31750000',
      '"kerf": 9007199254740993',
      'This number is past 2^53, too large to be kept exactly.',
      'task.kerf',
    ],
    ['a text for a number', '"kerf": 31750000', '"kerf": "1/8"', 'A number belongs here.', 'task.kerf'],
    ['an unknown unit', '"unit": "in"', '"unit": "cm"', 'Write "in" or "mm" here.', 'task.unit'],
    ['no title', '"title": "Bench-hook kit"', '"title": ""', 'This is empty.', 'task.title'],
    ['a title too long', 'Bench-hook kit', 'x'.repeat(121), 'Use at most 120 characters.', 'task.title'],
    [
      'blanks around a word',
      '"fence"',
      '" fence"',
      'An id has 1 to 64 small letters, digits, - or _, and begins with a letter or a digit.',
      'task.cutList.lines[2].id',
    ],
    [
      'blanks around a name',
      '"label": "fence"',
      '"label": "fence "',
      'This would be kept as "fence". Write it so.',
      'task.cutList.lines[2].label',
    ],
    [
      'a line without a name',
      '"label": "fence"',
      '"label": ""',
      'Name the part.',
      'task.cutList.lines[2].label',
    ],
    [
      'a line twice',
      '"id": "fence"',
      '"id": "hook"',
      'Two lines have the same id.',
      'task.cutList.lines[2].id',
    ],
    [
      'too many pieces',
      '"quantity": 2',
      '"quantity": 201',
      'The quantity is at most 200.',
      'task.cutList.lines[3].quantity',
    ],
    [
      'a note of no line',
      '"lineNotes": {',
      '"lineNotes": { "lid": "x",',
      'The cut list has no line “lid”.',
      'task.lineNotes.lid',
    ],
    [
      'an exception of no line',
      '"exceptions": {',
      '"exceptions": { "lid": { "worth": 1 },',
      'The cut list has no line “lid”.',
      'form.exceptions.lid',
    ],
    [
      'an exception that says nothing',
      '"exceptions": {',
      '"exceptions": { "base": {},',
      'This says nothing that would be kept. Take it out.',
      'form.exceptions.base',
    ],
    [
      'bands that do not ascend',
      '"within": 15875000,',
      '"within": 7937500,',
      'Each band reaches further than the one before it.',
      'form.defaults.sizes.thickness.over[1].within',
    ],
    [
      'a loss that falls',
      '"lose": 200',
      '"lose": 50',
      'A band loses no less than the one before it.',
      'form.defaults.sizes.thickness.over[2].lose',
    ],
    [
      'a free band that costs',
      '"lose": 0',
      '"lose": 5',
      'The first band loses 0.',
      'form.defaults.sizes.thickness.over[0].lose',
    ],
    [
      'less past the last band',
      '"beyondOver": 300',
      '"beyondOver": 100',
      'Past the last band a size loses no less than in it.',
      'form.defaults.sizes.thickness.beyondOver',
    ],
    [
      'a cap above the worth',
      '"cap": null',
      '"cap": 1000',
      'The most a size can lose is at most the piece’s worth, 9.',
      'form.defaults.sizes.thickness.cap',
    ],
    [
      'a level that is not there',
      '"assume": 0',
      '"assume": 7',
      'The assumed level is one of the levels.',
      'form.defaults.checks[0].assume',
    ],
    [
      'an unknown redo',
      '"higher"',
      '"best"',
      'Write "higher", "latest" or "average" here.',
      'form.policies.redo.kind',
    ],
    [
      'a share not in lowest terms',
      '"num": 2,\n          "den": 3',
      '"num": 4,\n          "den": 6',
      'This would be kept as 2. Write it so.',
      'form.policies.prediction.caughtShare.num',
    ],
    [
      'lateness that falls',
      '"max": 20',
      '"max": 1',
      'The greatest percent is no less than the percent a day.',
      'form.policies.late.max',
    ],
    [
      'a start without its basis',
      '"start": null',
      '"start": 9000',
      'A starting score is given when the basis is start, and only then.',
      'form.start',
    ],
    [
      'a total of nothing',
      '"outOf": 10000',
      '"outOf": 0',
      'Scale to more than 0 points, or leave it empty.',
      'form.outOf',
    ],
    [
      'yes for true',
      '"swap": true',
      '"swap": "yes"',
      'This is true or false, without quotes.',
      'form.defaults.swap',
    ],
    ['a later format of the rubric', '"format": 1', '"format": 2', 'Write 1 here.', 'form.format'],
    [
      'a preset that the prices do not follow',
      '"presets": []',
      '"presets": ["undersize-doubles"]',
      'This says nothing that would be kept. Take it out.',
      'form.presets[0]',
    ],
  ])('tells %s at its place', (_, from, to, reason, path) => {
    const text = spoiled(from, to);
    const at = problemsOf(text).filter((problem) => problem.path === path);
    expect(at.map((problem) => problem.reason)).toContain(reason);
    const [{ line = 0 } = {}] = at;
    expect(line).toBeGreaterThan(1);
  });

  it('tells two units that do not agree', () => {
    const text = spoiled('"format": 1,\n    "unit": "in"', '"format": 1,\n    "unit": "mm"');
    expect(shown(text)).toContainEqual(
      expect.stringMatching(
        /form\.unit: The task is in inches, its prices in millimetres\. Both are in one unit\.$/,
      ),
    );
  });

  it('tells a name that stands twice, and __proto__, at the name itself', () => {
    const twice = spoiled('"kerf": 31750000,', '"kerf": 31750000,\n    "kerf": 1,');
    expect(shown(twice)).toEqual(['15:5 task.kerf: “kerf” stands here twice. Keep one of them.']);
    const proto = spoiled('"exceptions": {', '"exceptions": {"__proto__": {"worth": 1},');
    expect(shown(proto)).toEqual([
      expect.stringMatching(/^\d+:20 form\.exceptions\.__proto__: A practical file knows no such name\.$/),
    ]);
    const inNotes = spoiled('"lineNotes": {', '"lineNotes": {"__proto__": "x",');
    expect(problemsOf(inNotes).map(({ path }) => path)).toContain('task.lineNotes.__proto__');
    expect(Object.prototype).not.toHaveProperty('worth');
  });

  it('tells every one of many, in the order of the file, with line and column as an editor counts them', () => {
    const text = spoiled(
      '"quantity": 2',
      '"quantity": 0',
      spoiled('"kerf": 31750000', '"kerf": -1', spoiled('"max": 20', '"max": 200')),
    ).replaceAll('\n', '\r\n');
    expect(shown(text)).toEqual([
      '14:13 task.kerf: This is more than 0.',
      '50:23 task.cutList.lines[3].quantity: The quantity is at least 1.',
      expect.stringMatching(/^\d+:16 form\.policies\.late\.max: The greatest percent is at most 100\.$/),
    ]);
  });

  it('names each place as a person would', () => {
    const places = (text: string) => problemsOf(text).map(({ place }) => place);
    expect(places(spoiled('"within": 15875000,', '"within": 1,'))).toEqual([
      'all lines, price of thickness, over, band 2, within',
    ]);
    expect(places(spoiled('"worth": 1200', '"worth": -1'))).toEqual(['exception of hook, worth']);
    expect(places(spoiled('"label": "fence"', '"label": ""'))).toEqual(['line 3, name']);
    expect(places(spoiled('"Grain along the length."', '" x"'))).toEqual(['note of hook']);
    expect(places(spoiled('"task": {', '"task": 1, "x": {'))).toEqual(['the task', 'x']);
  });

  it('tells 400 lines that are too many, and each bad one of them', () => {
    const { task: hook, form } = read(example);
    const [base] = hook.cutList.lines;
    const lines = Array.from({ length: 400 }, (_, index) => ({
      ...base,
      id: `line-${index + 1}`,
      quantity: [17, 33, 120, 250, 399].includes(index) ? 0 : 1,
    }));
    const text = JSON.stringify({
      trymark: 'practical',
      version: 1,
      task: { ...hook, lineNotes: {}, cutList: { lines } },
      form: { ...form, exceptions: {} },
    });
    const paths = problemsOf(text).map(({ path }) => path);
    expect(paths).toContain('task.cutList.lines');
    for (const index of [17, 33, 120, 250, 399]) {
      expect(paths).toContain(`task.cutList.lines[${index}].quantity`);
    }
  });

  it('tells the first 500 of very many names that are wrong, and that there are more, before anybody tires', () => {
    const names = Array.from({ length: 50_000 }, (_, at) => `"k${at}":1.5`);
    const text = `{"trymark":"practical","version":1,"task":{${names.join()}},"form":{}}`;
    const problems = problemsOf(text);
    expect(problems).toHaveLength(501);
    expect(problems.at(-1)?.reason).toBe(
      'Here and further on more is wrong. Put right what stands above it first.',
    );
  });

  it('tells a list that no practical could have by its place alone', () => {
    const text = `{"trymark":"practical","version":1,"task":{"cutList":{"lines":[${'{},'.repeat(250_000)}{}]}},"form":{}}`;
    expect(shown(text)).toEqual(['1:63 : This list has more than 1000 entries. No practical has so many.']);
  });

  it('never throws, whatever the text', () => {
    const soup = fc.oneof(
      fc.string(),
      fc.json(),
      fc.tuple(fc.nat(example.length), fc.nat(40), fc.string()).map(([at, length, put]) => {
        return example.slice(0, at) + put + example.slice(at + length);
      }),
    );
    fc.assert(
      fc.property(soup, (text) => {
        const result = readPracticalFile(text);
        if (result.ok)
          expect(readPracticalFile(writePracticalFile(result.task, result.form))).toEqual(result);
        else expect(result.problems.length).toBeGreaterThan(0);
      }),
      { numRuns: 300 },
    );
  });
});
