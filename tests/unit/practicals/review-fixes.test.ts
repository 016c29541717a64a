import { describe, expect, it } from 'vitest';
import { bandChances, chanceInShort, reviewInstruments, sayChance } from '@/lib/practicals/band-chances';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { placeFindings } from '@/lib/practicals/place-findings';
import { shopInstruments } from '@/lib/practicals/shop-instruments';
import { starterDraft } from '@/lib/practicals/starters';
import { type FindingCode, reviewRubric } from '@/lib/scoring';
import { FINDING_CODES } from '@/lib/scoring/review/finding';
import { defaultRule, ticksOf } from '@/tests/support/rubrics';

type Change = (draft: PracticalDraft) => void;

const everySize = (draft: PracticalDraft, text: { edges: string[]; beyond?: string }) => {
  for (const axis of ['thickness', 'width', 'length'] as const) {
    const side = {
      bands: text.edges.map((within, index) => ({ within, lose: String(index) })),
      beyond: text.beyond ?? '3',
    };
    Object.assign(draft.all.sizes[axis], {
      mirrored: true,
      over: side,
      under: structuredClone(side),
      cap: '',
    });
  }
};

/** A caddy that causes each finding, and where it must stand. */
const CAUSES: Record<FindingCode, [path: string, change: Change]> = {
  'band-below-graduation': [
    'all.sizes.thickness',
    (draft) => everySize(draft, { edges: ['1/32', '5/128', '3/32'] }),
  ],
  'no-free-band': ['all.sizes.thickness', (draft) => everySize(draft, { edges: ['0', '1/16', '3/32'] })],
  'rounding-and-margin': [
    'reading.readTo',
    (draft) => {
      draft.reading.readTo = '1/64';
    },
  ],
  'one-wrong-keeps-most': [
    'all.sizes.thickness',
    (draft) => everySize(draft, { edges: ['1/32', '1/16'], beyond: '2' }),
  ],
  'lines-alike': [
    'lines.1.label',
    (draft) => Object.assign(draft.lines[2] ?? {}, { width: '3 1/2', length: '4' }),
  ],
  'missing-is-cheaper': [
    'all.missing',
    (draft) => {
      draft.all.missing = '6';
    },
  ],
  'symmetric-undersize': ['all.sizes.thickness', () => {}],
  'gross-inside-band': [
    'reading.grossLimit',
    (draft) => {
      draft.reading.grossLimit = '1/16';
    },
  ],
  'start-runs-out': [
    'total.start',
    (draft) => Object.assign(draft.total, { basis: 'start', start: '20', outOf: '' }),
  ],
  'total-off-grid': [
    'total.roundTo',
    (draft) => {
      draft.all.worth = '9.5';
    },
  ],
};

function review(draft: PracticalDraft) {
  const read = parseDraft(draft);
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  const found = reviewRubric(read.rubric, { graduation: ticksOf('1/64') });
  return placeFindings(draft, read.rubric, [...found, ...reviewInstruments(read.rubric)]);
}

const NO_PRESS: FindingCode[] = ['band-below-graduation', 'lines-alike'];

describe('a finding', () => {
  it.each(FINDING_CODES)(
    '%s stands at the field that causes it, says what to do and is settled by its press',
    (code) => {
      const draft = starterDraft('desk-caddy');
      const [path, change] = CAUSES[code];
      change(draft);
      const found = review(draft).filter((each) => each.code === code);
      expect(found.map((each) => each.path)).toContain(path);
      const [first] = found;
      expect(first?.text).toMatch(/\b(set|settle|change|raise|give|keep|lower|widen|make|have)\b/i);
      expect(first?.fix === null).toBe(NO_PRESS.includes(code));
      if (!first?.fix) return;
      first.fix.apply(draft);
      expect(review(draft).map((each) => `${each.code} ${each.path}`)).not.toContain(`${code} ${path}`);
      expect(parseDraft(draft).ok).toBe(true);
    },
  );

  it('of sizes that are priced alike is settled for all of them, and they stay alike', () => {
    const draft = starterDraft('desk-caddy');
    review(draft)
      .find(({ code }) => code === 'symmetric-undersize')
      ?.fix?.apply(draft);
    const { thickness, width, length } = draft.all.sizes;
    expect(width).toEqual(thickness);
    expect(length).toEqual(thickness);
    expect(thickness.under.beyond).toBe('6');
    expect(draft.presets).toEqual(['undersize-doubles']);
  });

  it('of one line that is priced by itself is settled there alone', () => {
    const draft = starterDraft('desk-caddy');
    const [base] = draft.lines;
    if (base) base.sizes.width = structuredClone({ ...draft.all.sizes.width, cap: '2' });
    const found = review(draft).find(({ code }) => code === 'one-wrong-keeps-most');
    expect([found?.path, found?.fix?.label]).toEqual([
      'lines.0.sizes.width',
      'let it lose 2.25 past the last band',
    ]);
    found?.fix?.apply(draft);
    expect(base?.sizes.width?.cap).toBe('2.25');
    expect(draft.all.sizes.width.cap).toBe('');
  });

  it('of a set that counts as its worst asks as much of a missing piece as the set can lose', () => {
    const draft = starterDraft('desk-caddy');
    draft.all.set = 'worst';
    const found = review(draft).find(({ code }) => code === 'missing-is-cheaper');
    expect([found?.path, found?.fix?.label]).toEqual(['all.missing', 'set it to 18']);
  });
});

describe('the chance that an instrument prices a part in the next band', () => {
  const reading = { unit: 'in', margin: ticksOf('0.002'), readTo: null } as const;

  it('is told for each band of each side, for a rule and a caliper', () => {
    const chances = bandChances(defaultRule(), reading);
    expect(chances.map(({ side, index }) => `${side} ${index}`)).toEqual([
      'under 0',
      'under 1',
      'under 2',
      'over 0',
      'over 1',
      'over 2',
    ]);
    // Own quadrature: rule u = 1/64 in / √12, parts spread by 0.3 mm, margin 0.002 in.
    expect(chances[0]?.chances.rule).toBeCloseTo(0.00367458, 7);
    expect(chances[0]?.chances.caliper).toBeLessThan(1e-6);
  });

  it('is not told where the next band costs the same, and is larger without a margin', () => {
    const free = defaultRule();
    const flat = { ...free, over: free.over.map((band) => ({ ...band, lose: 0 })), beyondOver: 0 };
    expect(bandChances(flat, reading).filter(({ side }) => side === 'over')[0]?.chances.rule).toBeNull();
    const bare = bandChances(free, { ...reading, margin: 0 });
    expect(bare[0]?.chances.rule ?? 0).toBeGreaterThan(0.00367458);
  });

  it('reckons where deviations are rounded from the last reading that is rounded into the band', () => {
    const rounded = bandChances(defaultRule(), { unit: 'in', margin: 0, readTo: ticksOf('1/64') });
    const bare = bandChances(defaultRule(), { unit: 'in', margin: ticksOf('1/128'), readTo: null });
    expect(rounded[0]?.chances.rule).toBe(bare[0]?.chances.rule);
  });

  it('is a finding at the size when a rule misjudges more than one part in ten', () => {
    const draft = starterDraft('desk-caddy');
    everySize(draft, { edges: ['1/128', '1/32', '1/16'] });
    draft.reading.margin = '0';
    const found = review(draft).filter(({ code }) => code === 'instrument-blurs-band');
    expect(found.map(({ path }) => path)).toEqual([
      'all.sizes.thickness',
      'all.sizes.width',
      'all.sizes.length',
    ]);
    expect(found[0]?.text).toMatch(
      /^Read with a rule \(1\/64 in\), about \d\d in 100 parts truly within 1\/128 in are priced in the next band\. Have this size read with a caliper/,
    );
    expect(review(starterDraft('desk-caddy')).map(({ code }) => code)).not.toContain('instrument-blurs-band');
  });

  it('is said so that a person can use it', () => {
    expect([0.00004, 0.0037, 0.0096, 0.02, 0.125].map(sayChance)).toEqual([
      'fewer than 1 in 1000',
      'about 4 in 1000',
      'about 1 in 100',
      'about 2 in 100',
      'about 13 in 100',
    ]);
    expect([0.0004, 0.02].map(chanceInShort)).toEqual(['< 1 in 1000', '2 in 100']);
  });

  it('rests on instruments whose uncertainty is stated', () => {
    const mm = (ticks: number) => ticks / 10_000_000;
    expect(shopInstruments('in').map(({ uncertainty }) => mm(uncertainty))).toEqual([
      expect.closeTo(0.11456794404231636, 12),
      expect.closeTo(Math.hypot(0.007332348418708248, 0.014664696837416495), 12),
    ]);
    expect(shopInstruments('mm').map(({ uncertainty }) => mm(uncertainty))).toEqual([
      expect.closeTo(0.5 / Math.sqrt(12), 12),
      expect.closeTo(Math.hypot(0.002886751345948129, 0.011547005383792516), 12),
    ]);
  });
});
