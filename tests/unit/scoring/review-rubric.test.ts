import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { TICKS_PER_MM } from '@/lib/length';
import {
  type Axis,
  type Band,
  type Finding,
  type FindingCode,
  type Line,
  type Rubric,
  reviewRubric,
  type SizeRule,
} from '@/lib/scoring';
import { rubricArb } from '../../support/scoring-arbitraries';
import { makeCheck, makeLine, makeRubric, makeRule, sixtyFourths } from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const graduation = sixtyFourths(1);
const AXES: Axis[] = ['thickness', 'width', 'length'];

/** Under costs twice what over costs, so that nothing is to be said of the rubric of one shelf. */
const dearUnder = (changes: Partial<SizeRule> = {}): SizeRule => {
  const { over } = makeRule();
  return makeRule({
    under: over.map(({ within, lose }) => ({ within, lose: 2 * lose })),
    beyondUnder: 600,
    ...changes,
  });
};
const shelf = (changes: Parameters<typeof makeLine>[0] = {}) => makeLine({ rule: dearUnder(), ...changes });
/** The rule on one axis, the quiet one on the others. */
const only = (axis: Axis, rule: SizeRule): Line['sizes'] => ({
  thickness: dearUnder(),
  width: dearUnder(),
  length: dearUnder(),
  [axis]: rule,
});

function found(code: FindingCode, changes: Partial<Rubric>, read = graduation): Finding[] {
  const rubric = makeRubric({ lines: [shelf()], ...changes });
  return reviewRubric(rubric, { graduation: read }).filter((finding) => finding.code === code);
}

const foundOfShelf = (
  code: FindingCode,
  line: Parameters<typeof makeLine>[0],
  changes: Partial<Rubric> = {},
) => found(code, { ...changes, lines: [shelf(line)] });

const bands = (...edges: number[]): Band[] => edges.map((within, at) => ({ within, lose: at * 100 }));

describe('the review of a rubric', () => {
  it('gives the example of its description', () => {
    const rubric = makeRubric({});
    const codes = reviewRubric({ ...rubric, readTo: 100, margin: 50 }, { graduation: 100 }).map(
      ({ code }) => code,
    );
    expect(codes).toContain('rounding-and-margin');
  });

  it('has nothing to say where there is nothing to see', () => {
    expect(reviewRubric(makeRubric({ lines: [shelf()] }), { graduation })).toEqual([]);
  });

  it('goes by code, then by the cut list, then by axis', () => {
    const free = makeRule({ over: bands(0), under: bands(0) });
    const rubric = makeRubric({
      ...{ readTo: 5, margin: 5 },
      lines: [makeLine({ id: 'z', rule: free }), makeLine({ id: 'a', rule: free, swap: false, worth: 0 })],
    });
    const listed = reviewRubric(rubric, { graduation }).map(({ code, lineId, axis }) => [code, lineId, axis]);
    const everySize = (code: FindingCode) => ['z', 'a'].flatMap((id) => AXES.map((axis) => [code, id, axis]));
    expect(listed).toEqual([
      ...everySize('band-below-graduation'),
      ...everySize('no-free-band'),
      ['rounding-and-margin', undefined, undefined],
      ['lines-alike', 'z', undefined],
      ...everySize('symmetric-undersize'),
    ]);
  });

  it('says everything in a sentence and what to do, with lengths in the rubric’s own unit', () => {
    const texts = (unit: 'in' | 'mm') =>
      reviewRubric(
        makeRubric({
          ...{
            unit,
            readTo: TICKS_PER_MM / 2,
            margin: TICKS_PER_MM / 20,
            grossLimit: 1,
            basis: 'start',
            start: 1,
          },
          lines: [makeLine({ missing: 0 }), makeLine({ id: 'rail', label: 'Rail' })],
        }),
        { graduation },
      ).map(({ text }) => text);
    const [inches, millimetres] = [texts('in'), texts('mm')];
    expect(inches).toHaveLength(millimetres.length);
    for (const text of [...inches, ...millimetres]) expect(text).toMatch(/^[A-Z“].+\..+\.$/);
    expect(inches.join()).toContain('3/32 in');
    expect(inches.join()).not.toContain('mm');
    expect(millimetres.join()).toContain('0.05 mm');
    expect(millimetres.join()).not.toMatch(/\d in\b/);
  });

  it('names a line by its label, or by its id where the label is blank', () => {
    const [named] = foundOfShelf('no-free-band', { rule: dearUnder({ over: bands(0) }), label: 'Top shelf' });
    const [blank] = foundOfShelf('no-free-band', { rule: dearUnder({ over: bands(0) }), label: ' ' });
    expect([named?.text, blank?.text]).toEqual([
      expect.stringContaining('“Top shelf”, thickness: '),
      expect.stringContaining('“shelf”, thickness: '),
    ]);
  });

  it('leaves the rubric as it was, and finds the same again', () => {
    fc.assert(
      fc.property(rubricArb, fc.integer({ min: 1, max: 2_000_000 }), (rubric, read) => {
        const before = structuredClone(rubric);
        const first = reviewRubric(rubric, { graduation: read });
        expect(rubric).toEqual(before);
        expect(reviewRubric(rubric, { graduation: read })).toEqual(first);
      }),
      { numRuns: 200 },
    );
  });
});

describe('bands narrower than what is read', () => {
  const code = 'band-below-graduation';
  const at = (...edges: number[]) => dearUnder({ over: bands(...edges) });

  it.each<[string, SizeRule, number, boolean]>([
    ['a band of just the graduation', at(sixtyFourths(1), sixtyFourths(2)), 0, false],
    ['a band of a tick less', at(sixtyFourths(1), sixtyFourths(2) - 1), 0, true],
    ['a free distance of a tick less', at(sixtyFourths(1) - 1, sixtyFourths(4)), 0, true],
    ['a free distance that the margin fills up', at(sixtyFourths(1) - 1, sixtyFourths(4)), 1, false],
    ['a later band, which the margin does not widen', at(sixtyFourths(1), sixtyFourths(2) - 1), 9, true],
    ['the other side', dearUnder({ under: bands(sixtyFourths(1) - 1) }), 0, true],
  ])('%s', (_, rule, margin, isFound) => {
    const findings = foundOfShelf(code, { sizes: only('width', rule) }, { margin });
    const where = findings.map(({ lineId, axis }) => [lineId, axis]);
    expect(where).toEqual(isFound ? [['shelf', 'width']] : []);
  });

  it('are named with their side, once where both sides are alike', () => {
    const narrow = bands(sixtyFourths(2), sixtyFourths(2.5));
    const textOf = (rule: SizeRule) => foundOfShelf(code, { sizes: only('width', rule) })[0]?.text;
    expect(textOf(dearUnder({ over: narrow }))).toContain('up to 5/128 in over.');
    expect(textOf(dearUnder({ over: narrow, under: narrow }))).toContain('up to 5/128 in over and under.');
    expect(textOf(dearUnder({ over: narrow, under: bands(0) }))).toContain(
      'up to 5/128 in over and 0 in under.',
    );
  });
});

describe('a first band of nothing', () => {
  it.each([0, 7])('is found on either side, with a margin of %i too', (margin) => {
    for (const side of ['over', 'under'] as const) {
      const findings = foundOfShelf(
        'no-free-band',
        { sizes: only('length', dearUnder({ [side]: bands(0) })) },
        { margin },
      );
      expect(findings.map(({ lineId, axis }) => [lineId, axis])).toEqual([['shelf', 'length']]);
      expect(findings[0]?.text).toContain(`free ${side}.`);
    }
    expect(foundOfShelf('no-free-band', { rule: dearUnder({ over: bands(1) }) }, { margin })).toEqual([]);
  });
});

describe('rounding and margin', () => {
  it.each<[Rubric['readTo'], number, number]>([
    [null, 0, 0],
    [null, 5, 0],
    [5, 0, 0],
    [5, 1, 1],
  ])('rounded to %s with a margin of %i', (readTo, margin, count) => {
    expect(found('rounding-and-margin', { readTo, margin })).toHaveLength(count);
  });
});

describe('one dimension past its last band', () => {
  const code = 'one-wrong-keeps-most';
  const beyond = (over: number, under: number, cap: number | null = null) =>
    dearUnder({
      over: bands(9).slice(0, 1),
      under: bands(9).slice(0, 1),
      beyondOver: over,
      beyondUnder: under,
      cap,
    });

  it.each<[string, SizeRule, number, boolean]>([
    ['keeping just three quarters', beyond(225, 300), 900, false],
    ['keeping a hundredth more', beyond(224, 300), 900, true],
    ['keeping more on the other side', beyond(300, 224), 900, true],
    ['keeping more because of the cap', beyond(300, 300, 224), 900, true],
    ['keeping all of nothing', beyond(0, 0), 0, false],
    ['keeping the worth that it cannot lose', beyond(300, 300), 100, false],
  ])('%s', (_, rule, worth, isFound) => {
    const findings = foundOfShelf(code, { sizes: only('thickness', rule), worth }, { grossLimit: 9 });
    expect(findings.some(({ axis }) => axis === 'thickness')).toBe(isFound);
  });

  it('is found at the axis that it is about', () => {
    const findings = foundOfShelf(code, { sizes: only('width', beyond(100, 400)) });
    expect(findings.map(({ lineId, axis }) => [lineId, axis])).toEqual([['shelf', 'width']]);
    expect(findings[0]?.text).toContain('past the last band over, a piece loses 1 of 9 points');
  });
});

describe('two lines alike', () => {
  const { target } = makeLine({});
  const last = sixtyFourths(6);
  const pair = (change: Partial<Line['target']>, changes: Partial<Rubric> = {}, line: Partial<Line> = {}) =>
    found('lines-alike', {
      ...changes,
      lines: [shelf(line), shelf({ id: 'rail', label: 'Rail', target: { ...target, ...change }, ...line })],
    });

  it('differ by no more than twice the last band', () => {
    expect(pair({ length: target.length + 2 * last })).toEqual([
      expect.objectContaining({ lineId: 'shelf', text: expect.stringContaining('“Shelf” and “Rail”') }),
    ]);
    expect(pair({ length: target.length + 2 * last + 1 })).toEqual([]);
  });

  it('differ by no more than the gross limit where that is larger', () => {
    const grossLimit = sixtyFourths(16);
    expect(pair({ length: target.length - grossLimit }, { grossLimit })).toHaveLength(1);
    expect(pair({ length: target.length - grossLimit - 1 }, { grossLimit })).toEqual([]);
    expect(pair({ length: target.length + 2 * last }, { grossLimit: 1 })).toHaveLength(1);
  });

  it('go by the larger last band of the two, on any axis and side', () => {
    const wide = shelf({
      sizes: only('width', dearUnder({ under: bands(2 * last) })),
      target: { ...target, length: 4 * last + target.length },
    });
    expect(found('lines-alike', { lines: [shelf(), { ...wide, id: 'rail' }] })).toHaveLength(1);
  });

  it('are apart by their largest difference', () => {
    expect(pair({ length: target.length + 1, width: target.width + 2 * last + 1 })).toEqual([]);
  });

  it('may be turned, where one of the lines allows it', () => {
    const turned = { thickness: target.width, width: target.thickness };
    expect(pair(turned)).toHaveLength(1);
    expect(pair(turned, {}, { swap: false })).toEqual([]);
  });

  it('are found pair by pair', () => {
    const lines = ['a', 'b', 'c'].map((id) => shelf({ id, label: id }));
    expect(found('lines-alike', { lines }).map(({ lineId, text }) => [lineId, text.slice(0, 11)])).toEqual([
      ['a', '“a” and “b”'],
      ['a', '“a” and “c”'],
      ['b', '“b” and “c”'],
    ]);
  });
});

describe('a missing piece that is cheaper', () => {
  const code = 'missing-is-cheaper';

  it.each<[string, Partial<Line>, Partial<Rubric>, boolean]>([
    ['the worth', { missing: 900 }, {}, false],
    ['less than the worth, which bands can take', { missing: 899 }, {}, true],
    ['more than everything can take', { missing: 1800, worth: 5000 }, {}, false],
    ['less than everything can take', { missing: 1799, worth: 5000 }, {}, true],
    [
      'less than the worth, which a gross piece loses',
      { missing: 1800, worth: 5000 },
      { grossLimit: 5 },
      true,
    ],
    ['checks can take', { missing: 1849, worth: 5000, checks: [makeCheck('square', [0, 50, 20])] }, {}, true],
    [
      'all that checks can take',
      { missing: 1850, worth: 5000, checks: [makeCheck('square', [0, 50, 20])] },
      {},
      false,
    ],
    ['one worth, where the worst prices two', { missing: 900, quantity: 2, set: 'worst' }, {}, true],
    ['two worths, where the worst prices two', { missing: 1800, quantity: 2, set: 'worst' }, {}, false],
    ['one worth, where each of two is priced alone', { missing: 900, quantity: 2 }, {}, false],
  ])('loses %s', (_, line, changes, isFound) => {
    expect(foundOfShelf(code, line, changes).map(({ lineId }) => lineId)).toEqual(isFound ? ['shelf'] : []);
  });

  it('counts the cap of a dimension', () => {
    const line = { rule: dearUnder({ cap: 100 }), missing: 300 };
    expect(foundOfShelf(code, line)).toEqual([]);
    expect(foundOfShelf(code, { ...line, missing: 299 })).toHaveLength(1);
  });
});

describe('over and under that lose alike', () => {
  const ruleFound = (rule: SizeRule) =>
    foundOfShelf('symmetric-undersize', { sizes: only('length', rule) }).map(({ axis }) => axis);

  it.each<[string, SizeRule, boolean]>([
    ['the same bands', makeRule(), true],
    ['the same but for the last price', makeRule({ beyondUnder: 301 }), false],
    [
      'the same but for an edge',
      makeRule({ under: bands(sixtyFourths(2), sixtyFourths(3), sixtyFourths(6)) }),
      false,
    ],
    ['the same because of the cap', makeRule({ beyondUnder: 600, cap: 300 }), true],
    [
      'a band on one side that changes no price',
      makeRule({ over: bands(5), under: [...bands(5), { within: 9, lose: 300 }] }),
      true,
    ],
    [
      'nothing lost on either side',
      makeRule({ over: bands(5), under: bands(5), beyondOver: 0, beyondUnder: 0 }),
      false,
    ],
  ])('%s', (_, rule, isFound) => {
    expect(ruleFound(rule)).toEqual(isFound ? ['length'] : []);
  });
});

describe('a gross limit inside the bands', () => {
  it.each<[string, number | null, string[]]>([
    ['none', null, []],
    ['at the last band', sixtyFourths(6), []],
    ['a tick before it', sixtyFourths(6) - 1, AXES],
  ])('%s', (_, grossLimit, axes) => {
    expect(found('gross-inside-band', { grossLimit }).map(({ axis }) => axis)).toEqual(axes);
  });

  it('is found where one side alone reaches past it', () => {
    const rule = dearUnder({ under: bands(sixtyFourths(9)) });
    const findings = foundOfShelf(
      'gross-inside-band',
      { sizes: only('width', rule) },
      { grossLimit: sixtyFourths(8) },
    );
    expect(findings.map(({ axis }) => axis)).toEqual(['width']);
  });
});

describe('a starting score that runs out', () => {
  const started = (start: number, lines: Line[]) => found('start-runs-out', { basis: 'start', start, lines });

  it('is less than the dearest half of the pieces can lose', () => {
    const lines = [shelf({ quantity: 2 }), shelf({ id: 'key', quantity: 2, worth: 2000, missing: 1800 })];
    expect(started(3600, lines)).toEqual([]);
    expect(started(3599, lines)).toHaveLength(1);
  });

  it('takes the larger half of an odd number', () => {
    expect(started(1799, [shelf({ quantity: 3 })])).toHaveLength(1);
    expect(started(1800, [shelf({ quantity: 3 })])).toEqual([]);
    expect(started(899, [shelf()])).toHaveLength(1);
  });

  it('counts a missing piece where that is the dearest it can be', () => {
    expect(started(1000, [shelf({ missing: 1001 })])).toHaveLength(1);
  });

  it('does not concern a score that is the sum of the worths', () => {
    expect(found('start-runs-out', { basis: 'worth', start: null })).toEqual([]);
  });
});

describe('a total off the grid of the rounding', () => {
  it.each<[string, Partial<Rubric>, boolean]>([
    ['worths on it', { roundTo: 100 }, false],
    ['worths off it', { roundTo: 100, lines: [shelf({ worth: 950 })] }, true],
    [
      'worths off it, scaled to a total on it',
      { roundTo: 100, outOf: 10_000, lines: [shelf({ worth: 950 })] },
      true,
    ],
    ['a total off it', { roundTo: 100, outOf: 9950 }, true],
    ['a finer grid', { roundTo: 50, outOf: 9950 }, false],
    ['hundredths', { roundTo: 1, outOf: 9951 }, false],
    ['a start off it', { roundTo: 10, basis: 'start', start: 9999 }, true],
    [
      'a start on it, whatever the worths',
      { roundTo: 10, basis: 'start', start: 9990, lines: [shelf({ worth: 3 })] },
      false,
    ],
    ['worths on it by their number', { roundTo: 100, lines: [shelf({ worth: 950, quantity: 2 })] }, false],
  ])('%s', (_, changes, isFound) => {
    expect(found('total-off-grid', changes)).toHaveLength(isFound ? 1 : 0);
  });
});
