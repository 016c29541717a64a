import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MAX_LENGTH, parseLength } from '@/lib/length';
import { lengthAsTyped, pointsAsTyped } from '@/lib/practicals/as-typed';
import { emptyLine, type PracticalDraft, practicalDraftSchema } from '@/lib/practicals/draft';
import { draftOf } from '@/lib/practicals/draft-of';
import { emptyDraft } from '@/lib/practicals/empty-draft';
import { readPoints, readShare } from '@/lib/practicals/field-reader';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { starterDraft } from '@/lib/practicals/starters';
import { compileRubric, defaultRubricForm, type RubricForm } from '@/lib/scoring';
import { formArb } from '@/tests/support/form-arbitraries';
import { defaultTask, ticksOf } from '@/tests/support/rubrics';

/** The bench-hook kit with something else typed at one place. */
function withTyped(change: (draft: PracticalDraft) => void): PracticalDraft {
  const draft = starterDraft('bench-hook');
  change(draft);
  return draft;
}

const errorsOf = (draft: PracticalDraft) => {
  const read = parseDraft(draft);
  return read.ok ? {} : read.errors;
};

describe('a new practical', () => {
  it.each(['in', 'mm'] as const)('has every price and policy of a new rubric in %s, and no lines', (unit) => {
    const draft = emptyDraft(unit, 'Box');
    const read = parseDraft({
      ...draft,
      lines: [{ ...emptyLine([]), label: 'side', thickness: '1/2 in', width: '3 in', length: '4 in' }],
    });
    expect(read).toMatchObject({ ok: true, form: defaultRubricForm(unit) });
    expect(draft.lines).toEqual([]);
  });

  it('keeps metric bands of their own, no converted inches', () => {
    const [, second] = emptyDraft('mm').all.sizes.length.over.bands;
    expect(second).toEqual({ within: '1', lose: '1' });
    expect(emptyDraft('mm').reading).toEqual({ margin: '0.05', readTo: '', grossLimit: '6' });
    expect(emptyDraft('in').reading).toEqual({ margin: '0.002', readTo: '', grossLimit: '1/4' });
  });

  it('says what is missing before it can be published', () => {
    expect(errorsOf(emptyDraft('in'))).toEqual({
      title: ['Give the practical a title.'],
      lines: ['A cut list has at least one line.'],
    });
  });
});

describe('reading a draft', () => {
  it('reads lengths as people write them, and the unit that was typed wins', () => {
    const read = parseDraft(
      withTyped((draft) => {
        const [line] = draft.lines;
        if (line) Object.assign(line, { thickness: '3/4"', width: '4-1/2', length: '228.6 mm' });
      }),
    );
    expect(read.ok && read.task.cutList.lines[0]?.target).toEqual({
      thickness: ticksOf('3/4'),
      width: ticksOf('4 1/2'),
      length: ticksOf('9'),
    });
  });

  it('gives the rubric that the form and cut list compile to', () => {
    const read = parseDraft(starterDraft('desk-caddy'));
    expect(read.ok && read.rubric).toEqual(read.ok && compileRubric(read.form, read.task.cutList));
  });

  it('keeps exceptions for a line and for one axis apart from what holds for all lines', () => {
    const read = parseDraft(
      withTyped((draft) => {
        const [, hook] = draft.lines;
        if (!hook) return;
        hook.missing = '6';
        hook.worth = '12';
        hook.sizes.length = structuredClone(draft.all.sizes.length);
        hook.sizes.length.under.beyond = '5';
      }),
    );
    const { length } = defaultRubricForm('in').defaults.sizes;
    expect(read).toMatchObject({
      ok: true,
      form: {
        exceptions: {
          hook: { worth: 1200, missing: 600, sizes: { length: { ...length, beyondUnder: 500 } } },
        },
      },
    });
    expect(read.ok && Object.keys(read.form.exceptions)).toEqual(['hook']);
  });

  it('takes the word worth, and an empty field, as the worth of the piece', () => {
    const read = parseDraft(
      withTyped((draft) => {
        draft.all.missing = '4';
        const [base] = draft.lines;
        if (base) base.missing = 'worth';
      }),
    );
    expect(read.ok && read.rubric.lines.map(({ missing }) => missing)).toEqual([900, 400, 400, 400]);
    expect(parseDraft(starterDraft('bench-hook'))).toMatchObject({
      rubric: { lines: [{ missing: 900 }, { missing: 900 }, { missing: 900 }, { missing: 900 }] },
    });
  });

  it('names a preset only while the prices still are what it made of them', () => {
    const tight = starterDraft('six-stick');
    expect(parseDraft(tight)).toMatchObject({ form: { presets: ['oversize-doubles'] } });
    for (const axis of ['thickness', 'width', 'length'] as const) tight.all.sizes[axis].over.beyond = '4';
    expect(parseDraft(tight)).toMatchObject({ form: { presets: [] } });
  });
});

describe('a bad field is told where it stands', () => {
  const cases: [title: string, path: string, change: (draft: PracticalDraft) => void, message: RegExp][] = [
    ['no title', 'title', (d) => Object.assign(d, { title: '  ' }), /title/],
    ['a title too long', 'title', (d) => Object.assign(d, { title: 'x'.repeat(121) }), /120/],
    [
      'a size that is no length',
      'lines.1.width',
      (d) => Object.assign(d.lines[1] ?? {}, { width: 'wide' }),
      /length/,
    ],
    ['a size of 0', 'lines.1.width', (d) => Object.assign(d.lines[1] ?? {}, { width: '0' }), /more than 0/],
    [
      'a size below 0',
      'lines.1.width',
      (d) => Object.assign(d.lines[1] ?? {}, { width: '-1' }),
      /more than 0/,
    ],
    [
      'an empty size',
      'lines.2.length',
      (d) => Object.assign(d.lines[2] ?? {}, { length: '' }),
      /Type a length/,
    ],
    [
      'a third of an inch',
      'lines.2.length',
      (d) => Object.assign(d.lines[2] ?? {}, { length: '1/3' }),
      /rule/,
    ],
    ['a part with no name', 'lines.0.label', (d) => Object.assign(d.lines[0] ?? {}, { label: '' }), /Name/],
    ['no pieces', 'lines.0.quantity', (d) => Object.assign(d.lines[0] ?? {}, { quantity: '0' }), /1 to 200/],
    [
      'half a piece',
      'lines.0.quantity',
      (d) => Object.assign(d.lines[0] ?? {}, { quantity: '1.5' }),
      /whole/,
    ],
    ['a blank half given', 'blank.width', (d) => Object.assign(d.blank, { width: '' }), /Type a length/],
    ['a kerf of nothing', 'kerf', (d) => Object.assign(d, { kerf: '0' }), /more than 0/],
    [
      'a band that does not ascend',
      'all.sizes.length.over.bands.1.within',
      (d) => Object.assign(d.all.sizes.length.over.bands[1] ?? {}, { within: '1/32' }),
      /further/,
    ],
    [
      'a price that falls',
      'all.sizes.width.under.bands.2.lose',
      (d) => Object.assign(d.all.sizes.width.under.bands[2] ?? {}, { lose: '0.5' }),
      /no less/,
    ],
    [
      'less past the last band than in it',
      'all.sizes.width.under.beyond',
      (d) => Object.assign(d.all.sizes.width.under, { beyond: '1' }),
      /no less/,
    ],
    [
      'a cap above the worth',
      'all.sizes.width.cap',
      (d) => Object.assign(d.all.sizes.width, { cap: '10' }),
      /worth, 9/,
    ],
    ['points that are none', 'all.worth', (d) => Object.assign(d.all, { worth: 'nine' }), /number/],
    ['a thousandth of a point', 'all.worth', (d) => Object.assign(d.all, { worth: '1.005' }), /number/],
    ['a negative price', 'all.missing', (d) => Object.assign(d.all, { missing: '-3' }), /number/],
    ['a margin below 0', 'reading.margin', (d) => Object.assign(d.reading, { margin: '-0.002' }), /minus/],
    ['a rounding that is none', 'total.roundTo', (d) => Object.assign(d.total, { roundTo: '0.3' }), /0.5/],
    ['a floor above the whole', 'total.floor', (d) => Object.assign(d.total, { floor: '101' }), /0 to 100/],
    ['a start that is missing', 'total.start', (d) => Object.assign(d.total, { basis: 'start' }), /points/],
    [
      'lateness that costs less at most than a day',
      'late.max',
      (d) => Object.assign(d.late, { perDay: '10', max: '5' }),
      /no less/,
    ],
    [
      'a share of nothing',
      'prediction.agreeShare',
      (d) => Object.assign(d.prediction, { agreeShare: '0%' }),
      /share/,
    ],
    [
      'a check with no name',
      'all.checks.0.label',
      (d) => Object.assign(d.all.checks[0] ?? {}, { label: '' }),
      /Name/,
    ],
    [
      'two checks of one name',
      'all.checks.1.label',
      (d) => Object.assign(d.all.checks[1] ?? {}, { label: 'Square' }),
      /Another/,
    ],
    [
      'a level that costs no number',
      'workChecks.0.levels.1.lose',
      (d) => Object.assign(d.workChecks[0]?.levels[1] ?? {}, { lose: '' }),
      /points/,
    ],
  ];

  it.each(cases)('%s, at %s', (_, path, change, message) => {
    const errors = errorsOf(withTyped(change));
    expect(Object.keys(errors)).toEqual([path]);
    expect(errors[path]?.join()).toMatch(message);
  });

  it('all of them at once, not only the first', () => {
    const draft = starterDraft('bench-hook');
    for (const [, , change] of cases.slice(2, 9)) change(draft);
    expect(Object.keys(errorsOf(draft)).sort()).toEqual([
      'lines.0.label',
      'lines.0.quantity',
      'lines.1.width',
      'lines.2.length',
    ]);
  });

  it('400 rows with five bad ones: each bad one, and that there are too many', () => {
    const draft = emptyDraft('in', 'Many');
    draft.lines = Array.from({ length: 400 }, (_, index) => ({
      ...emptyLine([]),
      id: `line-${index}`,
      label: `part ${index}`,
      ...{ thickness: '1/2', width: '2', length: index % 80 === 0 ? 'x' : '3' },
    }));
    expect(practicalDraftSchema.safeParse(draft).success).toBe(true);
    expect(Object.keys(errorsOf(draft))).toEqual([
      'lines',
      ...[0, 80, 160, 240, 320].map((index) => `lines.${index}.length`),
    ]);
  });

  it('more than 400 pieces', () => {
    const errors = errorsOf(
      withTyped((draft) => {
        for (const line of draft.lines) line.quantity = '150';
      }),
    );
    expect(errors.lines?.join()).toMatch(/at most 400 pieces in all; these are 600/);
  });
});

describe('what was published can be edited again', () => {
  it('comes back exactly: task, form and compiled rubric', () => {
    const task = defaultTask();
    fc.assert(
      fc.property(formArb(task.cutList), (form: RubricForm) => {
        const read = parseDraft(draftOf({ ...task, unit: form.unit }, form));
        expect(read).toEqual({
          ok: true,
          task: { ...task, unit: form.unit },
          form: { ...form, presets: read.ok ? read.form.presets : [] },
          rubric: compileRubric(form, task.cutList),
        });
      }),
      { numRuns: 60 },
    );
  });

  it('every length reads back as the very same ticks, in either unit', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: MAX_LENGTH }),
        fc.constantFrom('in' as const, 'mm' as const),
        (ticks, unit) => {
          expect(parseLength(lengthAsTyped(ticks, unit), unit)).toMatchObject({ ok: true, ticks });
        },
      ),
    );
    expect(lengthAsTyped(ticksOf('1 3/8'), 'in')).toBe('1 3/8');
    expect(lengthAsTyped(ticksOf('0.002'), 'in')).toBe('0.002');
    expect(lengthAsTyped(ticksOf('0.05 mm'), 'in')).toBe('0.05 mm');
    expect(lengthAsTyped(ticksOf('3/4'), 'mm')).toBe('19.05');
  });

  it('every amount of points reads back as the very same hundredths', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1_000_000 }), (points) => {
        expect(readPoints(pointsAsTyped(points))).toBe(points);
      }),
    );
  });
});

it.each([
  ['9', 900],
  ['1.5', 150],
  ['1,25', 125],
  ['.5', 50],
  ['½', 50],
  ['1 1/2', 150],
  ['1½', 150],
  ['3/4', 75],
  ['1/3', null],
  ['1/0', null],
  ['', null],
  ['1.', null],
  ['-1', null],
  ['1e2', null],
  ['2 points', null],
])('points typed as "%s" are %s hundredths', (text, points) => {
  expect(readPoints(text)).toBe(points);
});

it.each([
  ['90%', { num: 9, den: 10 }],
  ['90', { num: 9, den: 10 }],
  ['2/3', { num: 2, den: 3 }],
  ['100%', { num: 1, den: 1 }],
  ['3/2', null],
  ['0', null],
  ['1/0', null],
  ['half', null],
])('a share typed as "%s" is %o', (text, share) => {
  expect(readShare(text)).toEqual(share);
});
