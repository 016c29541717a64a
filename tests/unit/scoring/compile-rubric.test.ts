import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  AXES,
  type CutList,
  compileRubric,
  cutListSchema,
  defaultRubricForm,
  type Line,
  type LineException,
  type RubricForm,
  rubricFormSchema,
  rubricSchema,
  scoreAttempt,
} from '@/lib/scoring';
import { makeAttempt, makeCheck, makePiece, makeRule, sixtyFourths } from '../../support/scoring-examples';

const cutList: CutList = {
  lines: ['base', 'hook', 'constructor'].map((id, at) => ({
    id,
    label: `The ${id}`,
    quantity: at + 1,
    target: {
      thickness: sixtyFourths(48),
      width: sixtyFourths(80 + at),
      length: sixtyFourths(320 - 64 * at),
    },
  })),
};

function withException(
  lineId: string,
  exception: LineException,
  changes: Partial<RubricForm> = {},
): RubricForm {
  return { ...defaultRubricForm('in'), exceptions: { [lineId]: exception }, ...changes };
}

function lineOf(form: RubricForm, id: string): Line {
  const line = compileRubric(form, cutList).lines.find((each) => each.id === id);
  if (!line) throw new Error(`no line ${id}`);
  return line;
}

const plain = (id: string) => lineOf(defaultRubricForm('in'), id);

describe('compiling a form', () => {
  it('gives the example of its description', () => {
    expect(compileRubric(defaultRubricForm('in'), cutList).lines[0]?.worth).toBe(900);
  });

  it('takes the policies of the whole rubric as they are', () => {
    const form: RubricForm = {
      ...defaultRubricForm('mm'),
      basis: 'start',
      start: 10_000,
      outOf: 5000,
      floor: 40,
      roundTo: 50,
      readTo: 7,
      margin: 3,
      grossLimit: null,
      ceiling: 110,
      workChecks: [makeCheck('laid-out', [0, 50], null)],
    };
    form.policies.late = { perDay: 5, max: 20 };
    const { lines: _, ...rubric } = compileRubric(form, cutList);
    expect(rubric).toEqual({
      unit: 'mm',
      basis: 'start',
      start: 10_000,
      outOf: 5000,
      floor: 40,
      roundTo: 50,
      readTo: 7,
      margin: 3,
      grossLimit: null,
      workChecks: form.workChecks,
      late: { perDay: 5, max: 20 },
      ceiling: 110,
    });
  });

  it('keeps the lines in cut-list order, with their labels, quantities and targets', () => {
    const lines = compileRubric(defaultRubricForm('in'), cutList).lines;
    expect(lines.map(({ id, label, quantity, target }) => ({ id, label, quantity, target }))).toEqual(
      cutList.lines,
    );
  });

  it('prices a line without exception by the defaults, missing at its worth', () => {
    const { defaults } = defaultRubricForm('in');
    const { worth, sizes, checks, swap, set } = defaults;
    for (const { id } of cutList.lines)
      expect(plain(id)).toMatchObject({ worth, missing: worth, sizes, checks, swap, set });
  });

  it.each<[string, LineException, Partial<Line>]>([
    ['worth, and missing with it', { worth: 1200 }, { worth: 1200, missing: 1200 }],
    ['worth of nothing', { worth: 0 }, { worth: 0, missing: 0 }],
    ['missing', { missing: 400 }, { missing: 400 }],
    ['missing that costs nothing', { missing: 0 }, { missing: 0 }],
    ['checks', { checks: [makeCheck('grain', [0, 200])] }, { checks: [makeCheck('grain', [0, 200])] }],
    ['no checks', { checks: [] }, { checks: [] }],
    ['swap', { swap: false }, { swap: false }],
    ['set', { set: 'worst' }, { set: 'worst' }],
  ])('lets an exception replace the default it names and no other: %s', (_, exception, changed) => {
    const form = withException('hook', exception);
    expect(lineOf(form, 'hook')).toEqual({ ...plain('hook'), ...changed });
    expect(lineOf(form, 'base')).toEqual(plain('base'));
  });

  it.each(AXES)('lets an exception of one axis leave the two others as all lines have them: %s', (axis) => {
    const rule = makeRule({ cap: 100 });
    const form = withException('hook', { sizes: { [axis]: rule } });
    expect(lineOf(form, 'hook').sizes).toEqual({ ...plain('hook').sizes, [axis]: rule });
    expect(lineOf(form, 'base').sizes).toEqual(plain('base').sizes);
  });

  it('reads a missing price of its own as the worth again where an exception says so', () => {
    const form = withException('hook', { missing: null, worth: 500 });
    form.defaults.missing = 200;
    expect(lineOf(form, 'base').missing).toBe(200);
    expect(lineOf(form, 'hook').missing).toBe(500);
  });

  it('takes exceptions by own name: a line called constructor has none unless it is written', () => {
    expect(plain('constructor').worth).toBe(900);
    expect(lineOf(withException('constructor', { worth: 100 }), 'constructor').worth).toBe(100);
  });

  it('passes over an exception for a line that the cut list does not have', () => {
    const form = withException('shelf', { worth: 1 });
    expect(compileRubric(form, cutList)).toEqual(compileRubric(defaultRubricForm('in'), cutList));
  });

  it('leaves no trace of presets, redo and prediction policy in the rubric', () => {
    const form = defaultRubricForm('in');
    const other: RubricForm = {
      ...form,
      presets: ['start-from-100'],
      policies: { ...form.policies, redo: { kind: 'average', roundTo: 1 } },
    };
    expect(compileRubric(other, cutList)).toEqual(compileRubric(form, cutList));
  });
});

describe('a compiled rubric', () => {
  it.each(['in', 'mm'] as const)('of the default form is one that may be scored by: %s', (unit) => {
    const rubric = compileRubric(defaultRubricForm(unit), cutList);
    expect(rubricSchema.parse(rubric)).toEqual(rubric);
  });

  it('shares nothing with its form or cut list, and changes neither', () => {
    const [form, list] = [withException('hook', { sizes: { width: makeRule() } }), structuredClone(cutList)];
    const before = structuredClone({ form, list });
    const rubric = compileRubric(form, list);
    for (const line of rubric.lines) {
      line.target.length = 1;
      line.checks.push(makeCheck('grain', [0]));
      for (const axis of AXES) line.sizes[axis].over.pop();
    }
    rubric.workChecks.pop();
    expect({ form, list }).toEqual(before);
  });

  it('of two forms that are equal is equal, to the last byte', () => {
    const anyForm = fc
      .record({
        worth: fc.integer({ min: 0, max: 100_000 }),
        missing: fc.option(fc.integer({ min: 0, max: 100_000 })),
        swap: fc.boolean(),
        lineId: fc.constantFrom('base', 'hook', 'constructor', 'none'),
        margin: fc.integer({ min: 0, max: 1_000_000 }),
      })
      .map(({ worth, missing, swap, lineId, margin }) =>
        withException(lineId, { worth, missing, swap }, { margin }),
      );
    fc.assert(
      fc.property(anyForm, (form) => {
        const again = JSON.parse(JSON.stringify(form));
        const rubric = compileRubric(form, cutList);
        expect(
          JSON.stringify(compileRubric(rubricFormSchema.parse(again), cutListSchema.parse(cutList))),
        ).toBe(JSON.stringify(rubric));
        expect(rubricSchema.parse(rubric)).toEqual(rubric);
      }),
    );
  });

  it('of two forms that say the same in other words scores the same', () => {
    const byDefault = defaultRubricForm('in');
    byDefault.defaults.worth = 600;
    const byException = defaultRubricForm('in');
    byException.exceptions = Object.fromEntries(cutList.lines.map(({ id }) => [id, { worth: 600 }]));
    const rubrics = [byDefault, byException].map((form) => compileRubric(form, cutList));
    const attempt = makeAttempt([makePiece('base', 1, { length: sixtyFourths(300) })]);
    const [one, other] = rubrics.map((rubric) => scoreAttempt(rubric, attempt));
    expect(rubrics[0]).toEqual(rubrics[1]);
    expect(one).toEqual(other);
  });
});

describe('a form that comes from outside', () => {
  const parse = (json: string) =>
    rubricFormSchema.safeParse(JSON.parse(json)).error?.issues.map(({ message }) => message);
  const json = (changes: object) => JSON.stringify({ ...defaultRubricForm('in'), ...changes });

  it.each([
    ['an unknown key', json({ colour: 'blue' }), 'Unrecognized key: "colour"'],
    ['another version of the format', json({ format: 2 }), 'Invalid input: expected 1'],
    ['an exception for what is no id', json({ exceptions: { Base: {} } }), 'unknown key: an id has 1 to 64'],
    [
      'an exception that knows more',
      json({ exceptions: { base: { colour: 1 } } }),
      'Unrecognized key: "colour"',
    ],
    [
      'an exception for __proto__',
      json({}).replace('"exceptions":{', '"exceptions":{"__proto__":{}'),
      'unknown key __proto__',
    ],
    ['a start without the basis', json({ start: 100 }), 'a starting score is given when'],
    ['a preset nobody knows', json({ presets: ['half-price'] }), 'Invalid option'],
  ])('is refused with %s', (_, text, message) => {
    expect(parse(text)).toEqual([expect.stringContaining(message)]);
  });
});
