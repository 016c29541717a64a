import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MAX_LENGTH } from '@/lib/length';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import { differingSpans } from '@/lib/practicals/compare-curves';
import { compareRubrics, cutListSignature } from '@/lib/practicals/compare-rubrics';
import type { Compared, Phrase } from '@/lib/practicals/compare-types';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { AXES, priceCurve, type SizeRule } from '@/lib/scoring';
import { comparedStarter } from '@/tests/support/compared';
import { defaultRule, ticksOf } from '@/tests/support/rubrics';
import { sizeRuleArb } from '@/tests/support/scoring-arbitraries';

const say = (phrase: Phrase): string =>
  phrase.map((part) => (typeof part === 'string' ? part : lengthAsTyped(part.ticks, 'in'))).join('');

const sentences = (compared: Compared[]) => compareRubrics(compared).sentences.map(say);

/** Charges for short lengths from 1/64 on, twice as much as others do. */
function chargeShort(draft: PracticalDraft): void {
  draft.all.sizes.length.under = {
    bands: [
      { within: '1/64', lose: '0' },
      { within: '1/32', lose: '1' },
      { within: '1/16', lose: '2' },
      { within: '3/32', lose: '4' },
    ],
    beyond: '5',
  };
}

describe('where two prices part', () => {
  const rule = defaultRule();

  it('nowhere, when they are the same', () => {
    expect(
      differingSpans([
        { rule, margin: 5 },
        { rule: structuredClone(rule), margin: 5 },
      ]),
    ).toEqual([]);
  });

  it('is exact to the tick, edges included, with every price on it', () => {
    const tighter: SizeRule = {
      ...rule,
      under: [
        { within: ticksOf('1/64'), lose: 0 },
        { within: ticksOf('1/16'), lose: 100 },
        { within: ticksOf('3/32'), lose: 200 },
      ],
    };
    const margin = ticksOf('0.002');
    expect(
      differingSpans([
        { rule, margin },
        { rule: tighter, margin },
      ]),
    ).toEqual([{ from: -ticksOf('1/32') - margin, to: -ticksOf('1/64') - margin - 1, lose: [0, 100] }]);
  });

  it('is a band as wide as the margin at each edge, when only the margins differ', () => {
    const margin = ticksOf('0.002');
    const spans = differingSpans([
      { rule, margin },
      { rule, margin: 0 },
    ]);
    expect(spans.filter(({ from }) => from > 0)).toEqual(
      ['1/32', '1/16', '3/32'].map((edge, index) => ({
        from: ticksOf(edge) + 1,
        to: ticksOf(edge) + margin,
        lose: [index * 100, (index + 1) * 100],
      })),
    );
    expect(spans).toHaveLength(6);
  });

  it('reaches as far as a length can, when what lies past the last band differs', () => {
    const dearer = { ...rule, beyondOver: 400 };
    expect(
      differingSpans([
        { rule, margin: 0 },
        { rule: dearer, margin: 0 },
      ]),
    ).toEqual([{ from: ticksOf('3/32') + 1, to: MAX_LENGTH, lose: [300, 400] }]);
  });

  it('agrees with the price curves on every deviation tried, inside and outside of its stretches', () => {
    const priced = fc.tuple(sizeRuleArb(2), fc.integer({ min: 0, max: 5 }));
    fc.assert(
      fc.property(fc.array(priced, { minLength: 2, maxLength: 4 }), (rules) => {
        const prices = rules.map(([each, margin]) => ({ rule: each, margin }));
        const spans = differingSpans(prices);
        const curves = prices.map((price) => priceCurve(price.rule, { margin: price.margin }));
        for (let deviation = -40; deviation <= 40; deviation++) {
          const lose = curves.map((curve) => curve.find(({ to }) => deviation <= to)?.lose);
          const span = spans.find(({ from, to }) => from <= deviation && deviation <= to);
          if (new Set(lose).size > 1) expect(span?.lose).toEqual(lose);
          else expect(span).toBeUndefined();
        }
        for (const [index, span] of spans.entries()) {
          expect(span.from).toBeLessThanOrEqual(span.to);
          expect(spans[index + 1]?.from ?? MAX_LENGTH + 1).toBeGreaterThan(span.to);
        }
      }),
    );
  });
});

describe('two rubrics of one cut list', () => {
  it('say that there is no difference when there is none, whatever the lines are called and in any order', () => {
    const renamed = comparedStarter('Okonjo', (draft) => {
      draft.lines.reverse();
      for (const line of draft.lines)
        Object.assign(line, { id: `x-${line.id}`, label: `${line.label} piece` });
    });
    const comparison = compareRubrics([comparedStarter('Lindqvist'), renamed]);
    expect(comparison.same).toBe(true);
    expect(comparison.sentences.map(say)).toEqual([
      'No difference: every reading costs the same under each of them.',
    ]);
  });

  it('say in words on which sizes, on which side and by how much', () => {
    expect(sentences([comparedStarter('Lindqvist'), comparedStarter('Okonjo', chargeShort)])).toEqual([
      'Okonjo takes 1 to 2 points more than Lindqvist for every length under, past 1/64.',
    ]);
    expect(sentences([comparedStarter('Okonjo', chargeShort), comparedStarter('Lindqvist')])).toEqual([
      'Lindqvist takes 1 to 2 points less than Okonjo for every length under, past 1/64.',
    ]);
  });

  it('name the one size of one line, and the stretch when they agree again further out', () => {
    const one = comparedStarter('Okonjo', (draft) => {
      const [, end] = draft.lines;
      if (!end) return;
      end.sizes.length = structuredClone(draft.all.sizes.length);
      Object.assign(end.sizes.length.over.bands[1] ?? {}, { within: '3/64' });
    });
    expect(sentences([comparedStarter('Lindqvist'), one])).toEqual([
      'Okonjo takes 1 point more than Lindqvist for length of end over, between 3/64 and 1/16.',
    ]);
  });

  it('name both sides at once when they differ alike', () => {
    const dearer = comparedStarter('Okonjo', (draft) => {
      for (const axis of AXES) {
        draft.all.sizes[axis].over.beyond = '4';
        draft.all.sizes[axis].under.beyond = '4';
      }
    });
    expect(sentences([comparedStarter('Lindqvist'), dearer])).toEqual([
      'Okonjo takes 1 point more than Lindqvist for every size over or under, past 3/32.',
    ]);
  });

  it('list what else differs, with what each says', () => {
    const other = comparedStarter('Okonjo', (draft) => {
      draft.reading.margin = '0';
      draft.redo.capPercent = '100';
    });
    expect(sentences([comparedStarter('Lindqvist'), other])).toEqual([
      'They price every size alike, and differ in reading margin (0.002, 0) and a redo counts up to (90%, 100%).',
    ]);
  });
});

it('a cap above every price is no difference', () => {
  const capped = comparedStarter('Okonjo', (d) => Object.assign(d.all.sizes.width, { cap: '3' }));
  expect(compareRubrics([comparedStarter('Lindqvist'), capped]).same).toBe(true);
});

it('three rubrics: how far apart they are, and who takes most and least', () => {
  const mild = comparedStarter('department', (draft) => {
    draft.all.sizes.length.under.beyond = '2';
  });
  expect(sentences([comparedStarter('Lindqvist'), comparedStarter('Okonjo', chargeShort), mild])).toEqual([
    'For every length under, past 1/64, the prices are up to 3 points apart: Okonjo most, department least.',
  ]);
});

describe('the table of differences', () => {
  it('has a row for each stretch between the edges of any of them', () => {
    const { sizes } = compareRubrics([comparedStarter('Lindqvist'), comparedStarter('Okonjo', chargeShort)]);
    expect(sizes.map(({ name }) => say(name))).toEqual(['every thickness and every width', 'every length']);
    const under = sizes[1]?.rows.filter(({ label }) => say(label).endsWith('under'));
    expect(under?.map(({ label, values, differs }) => [say(label), values, differs])).toEqual(
      [
        ['to 1/64 under', 0, 0],
        ['to 1/32 under', 0, 100],
        ['to 1/16 under', 100, 200],
        ['to 3/32 under', 200, 400],
        ['past 3/32 under', 300, 500],
      ].map(([label, a, b]) => [
        label,
        [
          { kind: 'points', points: a },
          { kind: 'points', points: b },
        ],
        a !== b,
      ]),
    );
  });

  it('lists a line apart that is worth or checked otherwise', () => {
    const other = comparedStarter('Okonjo', (draft) => {
      Object.assign(draft.lines[3] ?? {}, { worth: '6' });
    });
    const { pieces } = compareRubrics([comparedStarter('Lindqvist'), other]);
    expect(pieces.map(({ label, differs }) => [say(label), differs]).slice(0, 4)).toEqual([
      ['worth of a piece, base, end and side', false],
      ['worth of a piece, divider', true],
      ['a missing piece, base, end and side', false],
      ['a missing piece, divider', true],
    ]);
  });

  const CHANGES: [what: string, change: (draft: PracticalDraft) => void][] = [
    ['a band', (d) => Object.assign(d.all.sizes.width.over.bands[0] ?? {}, { within: '1/64' })],
    ['what a band costs', (d) => Object.assign(d.all.sizes.width.over.bands[2] ?? {}, { lose: '2.5' })],
    ['what lies past the bands', (d) => Object.assign(d.all.sizes.width.under, { beyond: '4' })],
    ['the cap', (d) => Object.assign(d.all.sizes.width, { cap: '2' })],
    ['the worth', (d) => Object.assign(d.all, { worth: '10' })],
    ['missing', (d) => Object.assign(d.all, { missing: '6' })],
    ['swap', (d) => Object.assign(d.all, { swap: false })],
    ['set', (d) => Object.assign(d.all, { set: 'worst' })],
    ['a check that is gone', (d) => d.all.checks.pop()],
    ['what a check costs', (d) => Object.assign(d.all.checks[0]?.levels[1] ?? {}, { lose: '2' })],
    ['what a check is taken as', (d) => Object.assign(d.all.checks[0] ?? {}, { assume: null })],
    ['a check of one line', (d) => Object.assign(d.lines[2] ?? {}, { checks: [] })],
    ['a check of the whole work', (d) => d.workChecks.pop()],
    ['the basis', (d) => Object.assign(d.total, { basis: 'start', start: '63' })],
    ['the total', (d) => Object.assign(d.total, { outOf: '50' })],
    ['no scaling', (d) => Object.assign(d.total, { outOf: '' })],
    ['the rounding', (d) => Object.assign(d.total, { roundTo: '0.5' })],
    ['the floor', (d) => Object.assign(d.total, { floor: '40' })],
    ['the ceiling', (d) => Object.assign(d.total, { ceiling: '100' })],
    ['the margin', (d) => Object.assign(d.reading, { margin: '0.003' })],
    ['rounded deviations', (d) => Object.assign(d.reading, { readTo: '1/64' })],
    ['the gross limit', (d) => Object.assign(d.reading, { grossLimit: '' })],
    ['lateness', (d) => Object.assign(d.late, { perDay: '5', max: '20' })],
    ['which attempt counts', (d) => Object.assign(d.redo, { kind: 'latest' })],
    ['a mean of attempts', (d) => Object.assign(d.redo, { kind: 'average' })],
    ['the cap of a redo', (d) => Object.assign(d.redo, { capPercent: '80' })],
    ...(
      ['agreeWithin', 'agreeShare', 'caughtShare', 'valueShare', 'full', 'closeWithin', 'close'] as const
    ).map((key): (typeof CHANGES)[number] => [
      `the prediction: ${key}`,
      (d) => Object.assign(d.prediction, { [key]: key.endsWith('Share') ? '7/8' : '1/4' }),
    ]),
  ];

  it.each(CHANGES)('finds %s', (_, change) => {
    const comparison = compareRubrics([comparedStarter('Lindqvist'), comparedStarter('Okonjo', change)]);
    expect(comparison.same).toBe(false);
    expect(comparison.sentences.length).toBeGreaterThan(0);
    expect(comparison.sentences.map(say).join()).not.toContain('No difference');
  });
});

it('refuses one rubric alone, and rubrics that ask for other pieces', () => {
  const caddy = comparedStarter('Lindqvist');
  expect(() => compareRubrics([caddy])).toThrow(RangeError);
  const longer = comparedStarter('Okonjo', (d) => Object.assign(d.lines[0] ?? {}, { length: '7 1/8' }));
  expect(cutListSignature(longer.task)).not.toBe(cutListSignature(caddy.task));
  expect(() => compareRubrics([caddy, longer])).toThrow(RangeError);
});
