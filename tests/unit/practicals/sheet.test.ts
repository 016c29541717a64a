import { describe, expect, it } from 'vitest';
import { textAt, typeAt } from '@/lib/practicals/draft-paths';
import { draftDifferences, fieldName, stepOfPath } from '@/lib/practicals/field-names';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { placeFindings } from '@/lib/practicals/place-findings';
import { doubleSide, isDoubled, isRatePerStep } from '@/lib/practicals/presets';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';
import { starterDraft } from '@/lib/practicals/starters';
import { bandsFromRate, reviewRubric } from '@/lib/scoring';
import { comparedStarter } from '@/tests/support/compared';
import { defaultRule, ticksOf } from '@/tests/support/rubrics';

describe('paths into a draft', () => {
  it('read and type texts, and leave alone what is none', () => {
    const draft = starterDraft('bench-hook');
    typeAt(draft, 'lines.1.width', '1 3/8');
    expect(textAt(draft, 'lines.1.width')).toBe('1 3/8');
    for (const path of ['lines', 'lines.9.width', 'all.swap', 'no.such.field', '__proto__.width']) {
      typeAt(draft, path, 'x');
      expect(textAt(draft, path)).toBe('');
    }
    typeAt(draft, 'lines.1.width', '1 1/4');
    expect(draft).toEqual(starterDraft('bench-hook'));
  });

  it.each([
    ['lines.1.width', 'line 2, width', 'prices'],
    ['lines.0.quantity', 'line 1, pieces', 'prices'],
    ['all.sizes.length.over.bands.1.within', 'all lines, length, over, band 2, within', 'prices'],
    ['lines.2.sizes.width.under.beyond', 'line 3, width, under, past the last band', 'prices'],
    ['all.checks.0.levels.1.lose', 'all lines, check 1, level 2, points', 'prices'],
    ['workChecks.0.label', 'check of the whole work 1, name', 'rules'],
    ['blank.thickness', 'blank, thickness', 'task'],
    ['reading.margin', 'reading, reading margin', 'rules'],
    ['lines', 'cut list', 'prices'],
  ])('%s is called "%s" and stands on the sheet of %s', (path, name, step) => {
    expect(fieldName(path)).toBe(name);
    expect(stepOfPath(path)).toBe(step);
  });

  it('lists what two drafts say otherwise, by name', () => {
    const here = starterDraft('bench-hook');
    const there = starterDraft('bench-hook');
    there.title = 'Hook';
    there.lines.pop();
    here.all.swap = false;
    expect(draftDifferences(here, there).map(({ name, here: a, there: b }) => [name, a, b])).toEqual([
      ['title', 'Bench-hook kit', 'Hook'],
      ['line 4, name', 'guide', ''],
      ['line 4, pieces', '2', ''],
      ['line 4, thickness', '3/4', ''],
      ['line 4, width', '3/4', ''],
      ['line 4, length', '3', ''],
      ['line 4, note', 'a pair: cut both at one stop setting', ''],
      ['all lines, thickness and width may change places', 'no', 'yes'],
    ]);
    expect(draftDifferences(here, here)).toEqual([]);
  });
});

describe('presets', () => {
  it('make one side twice as dear, from what both cost before', () => {
    const doubled = doubleSide(defaultRule(), 'under', 'in');
    expect(doubled && isDoubled(doubled, 'under')).toBe(true);
    expect(doubled?.under.map(({ lose }) => lose)).toEqual([0, 200, 400]);
    expect(doubled?.beyondUnder).toBe(600);
    expect(doubled?.over).toEqual(defaultRule().over);
    const turned = doubled && doubleSide(doubled, 'over', 'in');
    expect(turned?.beyondOver).toBe(600);
    expect(turned?.beyondUnder).toBe(300);
  });

  it('do nothing where a price would pass what a price can be', () => {
    const dear = { ...defaultRule(), beyondOver: 60_000, beyondUnder: 60_000 };
    expect(doubleSide(dear, 'under', 'in')).toBeNull();
  });

  it('know a rate per step when they see one', () => {
    const rate = bandsFromRate({ free: ticksOf('1/64'), step: ticksOf('1/32'), lose: 50, cap: 200 });
    expect(isRatePerStep(rate)).toBe(true);
    expect(isRatePerStep(defaultRule())).toBe(true);
    expect(isRatePerStep(defaultRule('mm'))).toBe(false);
  });
});

describe('findings stand at the field that causes them', () => {
  const place = (change: Parameters<typeof comparedStarter>[1]) => {
    const draft = starterDraft('desk-caddy');
    change?.(draft);
    const read = parseDraft(draft);
    if (!read.ok) throw new Error(JSON.stringify(read.errors));
    return placeFindings(
      draft,
      read.rubric,
      reviewRubric(read.rubric, { graduation: ticksOf('1/64') }),
    ).filter(({ isNote }) => !isNote);
  };

  it('once at all lines, when all lines share the price', () => {
    const found = place((draft) => {
      draft.all.missing = '6';
    });
    expect(found.map(({ path, code, fix }) => [path, code, fix?.label])).toEqual([
      ['all.missing', 'missing-is-cheaper', 'set it to the worth'],
    ]);
    expect(found[0]?.text).toMatch(/^A missing piece loses 6 points/);
  });

  it('at the line that has its own, and typing what settles it settles it', () => {
    const cheap = (missing: string) =>
      place((draft) => Object.assign(draft.lines[3] ?? {}, { missing })).map(({ path }) => path);
    expect(cheap('6')).toEqual(['lines.3.missing']);
    expect(cheap('worth')).toEqual([]);
  });

  it('at the axis of the line that is priced by itself, and at fields of the whole', () => {
    const found = place((draft) => {
      const [base] = draft.lines;
      if (base) base.sizes.width = structuredClone(draft.all.sizes.width);
      Object.assign(base?.sizes.width?.over.bands[1] ?? {}, { within: '5/128' });
      draft.reading.readTo = '1/64';
      draft.reading.grossLimit = '1/16';
    });
    expect(found.map(({ path, code }) => [path, code])).toEqual(
      expect.arrayContaining([
        ['lines.0.sizes.width', 'band-below-graduation'],
        ['reading.readTo', 'rounding-and-margin'],
        ['reading.grossLimit', 'gross-inside-band'],
      ]),
    );
  });
});

describe('the stretch of rule a price is drawn on', () => {
  it('is the coarsest graduation that all edges stand on', () => {
    expect(ruleScaleOf([defaultRule()], 'in')).toEqual({ graduation: ticksOf('1/32'), span: 6 });
    expect(ruleScaleOf([defaultRule('mm')], 'mm')).toEqual({ graduation: ticksOf('0.5', 'mm'), span: 7 });
    const tight = comparedStarter('tight', () => {}, 'six-stick').rubric.lines[0]?.sizes.length;
    expect(tight && ruleScaleOf([tight], 'in')).toEqual({ graduation: ticksOf('1/64'), span: 6 });
  });

  it('shows every edge of every price, however far apart they are', () => {
    const wide = {
      ...defaultRule(),
      over: [
        { within: ticksOf('1/128'), lose: 0 },
        { within: ticksOf('2'), lose: 100 },
      ],
    };
    const { graduation, span } = ruleScaleOf([wide, defaultRule()], 'in');
    expect(graduation * span).toBeGreaterThan(ticksOf('2'));
    expect(span).toBeLessThanOrEqual(16);
  });
});
