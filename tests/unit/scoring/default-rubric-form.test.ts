import { describe, expect, it } from 'vitest';
import { parseLength, type Unit } from '@/lib/length';
import { AXES, compileRubric, defaultRubricForm, rubricFormSchema, scoreAttempt } from '@/lib/scoring';
import { makeAttempt, makePiece } from '../../support/scoring-examples';

function ticksOf(text: string, unit: Unit): number {
  const parsed = parseLength(text, unit);
  if (!parsed.ok) throw new Error(parsed.reason);
  return parsed.ticks;
}

describe('the form of a new rubric', () => {
  it('gives the example of its description', () => {
    expect(defaultRubricForm('mm').margin).toBe(500_000);
  });

  it.each<[Unit, string[], string, string]>([
    ['in', ['1/32', '1/16', '3/32'], '0.002', '1/4'],
    ['mm', ['0.5', '1', '2'], '0.05', '6'],
  ])('has bands, margin and gross limit of its own unit: %s', (unit, edges, margin, grossLimit) => {
    const form = defaultRubricForm(unit);
    const bands = edges.map((edge, at) => ({ within: ticksOf(edge, unit), lose: at * 100 }));
    const rule = { over: bands, under: bands, beyondOver: 300, beyondUnder: 300, cap: null };
    expect(form.defaults.sizes).toEqual({ thickness: rule, width: rule, length: rule });
    expect(form.margin).toBe(ticksOf(margin, unit));
    expect(form.grossLimit).toBe(ticksOf(grossLimit, unit));
    expect(form.policies.prediction.agreeWithin).toBe(bands[0]?.within);
    expect(form.unit).toBe(unit);
  });

  it.each<Unit>(['in', 'mm'])('has the policies of a new rubric: %s', (unit) => {
    const { policies, defaults, ...form } = defaultRubricForm(unit);
    expect(form).toMatchObject({ basis: 'worth', start: null, outOf: 10_000, floor: 0, roundTo: 100 });
    expect(form).toMatchObject({ format: 1, readTo: null, ceiling: 102, presets: [], exceptions: {} });
    expect(defaults).toMatchObject({ worth: 900, missing: null, swap: true, set: 'each' });
    expect(policies).toMatchObject({
      late: null,
      redo: { kind: 'higher', capPercent: 90 },
      prediction: {
        agreeShare: { num: 9, den: 10 },
        caughtShare: { num: 2, den: 3 },
        valueShare: { num: 1, den: 2 },
        full: 200,
        closeWithin: 300,
        close: 100,
      },
    });
  });

  it('takes square and surface as good, and has name and period recorded, each for a point', () => {
    const { defaults, workChecks } = defaultRubricForm('in');
    const summary = [...defaults.checks, ...workChecks].map(({ label, levels, assume }) => ({
      label,
      loses: levels.map(({ lose }) => lose),
      assume,
    }));
    expect(summary).toEqual([
      { label: 'square', loses: [0, 100], assume: 0 },
      { label: 'surface', loses: [0, 100], assume: 0 },
      { label: 'name and period on pieces', loses: [0, 100], assume: null },
    ]);
  });

  it.each<Unit>(['in', 'mm'])('is one that may be stored, and a new object each time: %s', (unit) => {
    const form = defaultRubricForm(unit);
    expect(rubricFormSchema.parse(form)).toEqual(form);
    for (const axis of AXES) form.defaults.sizes[axis].over.pop();
    form.workChecks.pop();
    expect(defaultRubricForm(unit)).not.toEqual(form);
    expect(defaultRubricForm(unit).defaults.sizes.width.over).toHaveLength(3);
    expect(form.defaults.sizes.width.under).toHaveLength(3);
  });

  it('lets the bonus of a perfect student count', () => {
    const target = { thickness: 190_000_000, width: 381_000_000, length: 1_000_000_000 };
    const rubric = compileRubric(defaultRubricForm('in'), {
      lines: [{ id: 'base', label: 'Base', quantity: 1, target }],
    });
    const perfect = makeAttempt([makePiece('base', 1, target)], {
      bonus: 200,
      work: { 'name-and-period': 0 },
    });
    expect(scoreAttempt(rubric, perfect).score).toBe(10_200);
  });
});
