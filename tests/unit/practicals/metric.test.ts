import { describe, expect, it } from 'vitest';
import { lengthAsText } from '@/components/ui/length-parts';
import { decimalLength } from '@/lib/csv/decimal-length';
import { TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import { emptyDraft } from '@/lib/practicals/empty-draft';
import { exampleAttempts } from '@/lib/practicals/example-attempts';
import { faceScale } from '@/lib/practicals/face-scale';
import { judgeOwnReading } from '@/lib/practicals/judge-own-reading';
import { lengthPattern } from '@/lib/practicals/length-pattern';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { GRADUATION_TICKS } from '@/lib/practicals/propose-variants-graduation';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';
import { shopInstruments } from '@/lib/practicals/shop-instruments';
import { STARTER_IDS } from '@/lib/practicals/starter-plans';
import { starterDraft } from '@/lib/practicals/starters';
import { ruleScale } from '@/lib/round/rule-scale';
import { AXES, reviewRubric, scoreAttempt } from '@/lib/scoring';
import { ticksOf } from '@/tests/support/rubrics';

const mm = (text: string) => ticksOf(text, 'mm');
const HUNDREDTH = TICKS_PER_MM / 100;

/** Every whole number in a value that is as large as a length has to be; points and counts are far smaller. */
function lengthsIn(value: unknown): number[] {
  if (typeof value === 'number') return Math.abs(value) >= HUNDREDTH ? [value] : [];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(lengthsIn);
}

/** On a hundredth of a millimetre, and on no graduation of an inch rule. */
const isMetric = (ticks: number) => ticks % HUNDREDTH === 0 && ticks % (TICKS_PER_INCH / 64) !== 0;

const withPieces = () => {
  const draft = emptyDraft('mm', 'Rail');
  draft.lines = starterDraft('wall-rack').lines;
  const read = parseDraft(draft);
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  return read;
};

const metricStarters = STARTER_IDS.filter((id) => starterDraft(id).unit === 'mm');

describe('a new metric practical', () => {
  const { form, rubric } = withPieces();

  it('has the product’s metric defaults, none of them a converted inch', () => {
    for (const line of rubric.lines) {
      for (const axis of AXES) {
        const { over, under } = line.sizes[axis];
        expect(over.map(({ within }) => within)).toEqual([mm('0.5'), mm('1'), mm('2')]);
        expect(under).toEqual(over);
      }
    }
    expect(rubric).toMatchObject({ unit: 'mm', margin: mm('0.05'), grossLimit: mm('6'), readTo: null });
    expect(form.policies.prediction.agreeWithin).toBe(mm('0.5'));
    expect(emptyDraft('mm')).toMatchObject({ kerf: '3', reading: { margin: '0.05', grossLimit: '6' } });
  });

  it('types no fraction and names no inch', () => {
    const typed = JSON.stringify({ ...emptyDraft('mm', 'Rail'), prediction: { agreeWithin: '0.5' } });
    expect(typed).not.toMatch(/\d\/\d|inch|"in"/);
  });

  it('is reviewed to half a millimetre, and none of its bands is finer', () => {
    const codes = reviewRubric(rubric, { graduation: mm('0.5') }).map(({ code }) => code);
    expect(codes).not.toContain('band-below-graduation');
    expect(codes).not.toContain('gross-inside-band');
    for (const { text } of reviewRubric(rubric, { graduation: mm('0.5') })) {
      expect(text).not.toMatch(/\d\/\d|\bin\b\.|inch/);
    }
  });

  it('is drawn, read and recorded on graduations of a metric rule', () => {
    const [line] = rubric.lines;
    if (!line) throw new Error('There is no line.');
    for (const axis of AXES) {
      const bench = ruleScale(rubric, line, axis);
      for (const graduation of [
        faceScale(rubric, line, axis).graduation,
        ruleScaleOf([line.sizes[axis]], 'mm').graduation,
        bench?.step ?? 0,
      ]) {
        expect(graduation).toBe(mm('0.5'));
      }
      expect(bench?.graduations.map(({ text }) => text).join(' ')).not.toMatch(/\d\/\d|in\b/);
    }
    expect(Object.values(shopInstruments('mm')).every(({ graduation }) => isMetric(graduation))).toBe(true);
    expect(Object.values(GRADUATION_TICKS.mm).every(isMetric)).toBe(true);
  });

  it('asks about a far reading in millimetres, from 6 mm on where it has no gross limit', () => {
    const [line] = rubric.lines;
    if (!line) throw new Error('There is no line.');
    const context = { line, axis: 'length' as const, unit: 'mm' as const, margin: 0, blank: null };
    const read = (text: string) => judgeOwnReading({ ...context, grossLimit: null }, mm(text), text);
    expect(read('186')).toEqual({ verdict: 'fits' });
    const far = read('186.5');
    expect(far).toMatchObject({ verdict: 'far', asks: expect.stringContaining('mm') });
    expect(JSON.stringify(far)).not.toMatch(/\d\/\d|inch/);
  });

  it('shows example errors and a pattern in millimetres', () => {
    for (const { label, attempt } of exampleAttempts(rubric)) {
      for (const ticks of lengthsIn(label)) expect(isMetric(ticks)).toBe(true);
      const pattern = lengthPattern(rubric, scoreAttempt(rubric, attempt));
      if (pattern?.byAtLeast) expect(pattern.byAtLeast % (TICKS_PER_MM / 10)).toBe(0);
    }
  });
});

describe.each(metricStarters)('the metric starter %s', (id) => {
  it('holds no length that is not a whole hundredth of a millimetre', () => {
    const read = parseDraft(starterDraft(id));
    if (!read.ok) throw new Error(JSON.stringify(read.errors));
    const lengths = lengthsIn([read.task.blank, read.task.kerf, read.task.cutList, read.rubric, read.form]);
    expect(lengths.length).toBeGreaterThan(10);
    for (const ticks of lengths) {
      expect(isMetric(ticks)).toBe(true);
      expect(lengthAsText(ticks, 'mm')).toMatch(/^\d+(\.\d{1,2})?$/);
    }
    expect(JSON.stringify(starterDraft(id).instructions)).not.toMatch(/\binch|\d\/\d/);
  });
});

it('a spreadsheet gets millimetres as they are', () => {
  expect(decimalLength(mm('35'), 'mm')).toBe('35');
  expect(decimalLength(mm('0.5'), 'mm')).toBe('0.5');
});

it('there are metric starters to hold this against', () => {
  expect(metricStarters).toEqual(['wall-rack', 'gauge-kit']);
});
