import { describe, expect, test } from 'vitest';
import { planFor, TestBench } from '../../support/bench';
import { defaultRubric, SIX_STICKS_MM, ticksOf } from '../../support/rubrics';

function caliper(bench = new TestBench()) {
  let at = 0;
  return {
    bench,
    /** A reading a second after the one before, or as soon as asked. */
    type: (text: string, after = 1000) => {
      at += after;
      return bench.feed({ do: 'instrument', text, at });
    },
    axis: () => bench.state.spot?.axis,
  };
}

describe('an instrument that types', () => {
  test('a reading is kept with what was typed and its unit, and the cursor goes on', () => {
    const { type, axis } = caliper();
    expect(type('0.531').made).toMatchObject([
      {
        value: { kind: 'value', ticks: ticksOf('0.531') },
        typed: '0.531',
        unit: 'in',
        instrument: 'caliper',
      },
    ]);
    expect(axis()).toBe('width');
  });

  test('the same text within 300 ms is a bounce, after that a reading', () => {
    const { type, axis } = caliper();
    type('0.5');
    expect(type('0.5', 299).made).toEqual([]);
    expect(axis()).toBe('width');
    // 0.5 in for 3 1/2 in is gross, so it is heard, and refused.
    expect(type('0.5', 1).sound).toBe('refused');
  });

  test('a comma, a unit in the text and a fraction are read as everywhere', () => {
    const { bench, type } = caliper();
    expect(type('0,531').made).toHaveLength(1);
    expect(type('88.9mm').made).toMatchObject([{ unit: 'mm', value: { ticks: ticksOf('3 1/2') } }]);
    expect(type('6 15/16').made).toHaveLength(1);
    expect(bench.state.caliper.unit).toBe('in');
  });

  test('what is no length is refused and shown as typed', () => {
    const { bench, type } = caliper();
    expect(type('1.2.3').sound).toBe('refused');
    expect(bench.state.said).toMatchObject({ kind: 'refused', text: expect.stringContaining('1.2.3') });
  });

  test('closed jaws log the zero; closed again, the cursor steps back one; undo passes over zeros', () => {
    const { bench, type, axis } = caliper();
    type('0.531');
    const zero = type('0.012');
    expect(zero.made).toMatchObject([
      { cell: { what: '@zero' }, value: { kind: 'zero', ticks: ticksOf('0.012') }, supersedes: [] },
    ]);
    expect(bench.state.said).toEqual({ kind: 'zero', ticks: ticksOf('0.012'), past: true });
    expect(axis()).toBe('width');
    expect(type('0.011').made).toEqual([]);
    expect(axis()).toBe('thickness');
    type('0.0299');
    expect(axis()).toBe('thickness');
    bench.tap({ do: 'undo' });
    expect(bench.made.at(-1)).toMatchObject({ cell: { what: 'thickness' }, value: { kind: 'cleared' } });
  });

  test('0.030 in is no closed jaw', () => {
    const { type } = caliper();
    expect(type('0.030').made).toEqual([]);
    expect(type('-0.5').sound).toBe('refused');
  });

  test('a negative zero error is logged too', () => {
    const { type } = caliper();
    expect(type('-0.004').made).toMatchObject([{ value: { kind: 'zero', ticks: -ticksOf('0.004') } }]);
  });

  test('25.4 times the target asks once whether it is in millimetres; yes is remembered', () => {
    const { bench, type, axis } = caliper();
    expect(type('12.7').made).toEqual([]);
    expect(bench.state.asked).toMatchObject({ about: 'unit', other: 'mm', text: '12.7' });
    const answered = bench.tap({ do: 'answer-unit', yes: true });
    expect(answered.made).toMatchObject([{ typed: '12.7', unit: 'mm', value: { ticks: ticksOf('1/2') } }]);
    expect(type('89.7').made).toMatchObject([{ unit: 'mm' }]);
    expect(axis()).toBe('length');
  });

  test('no is remembered as well, and the reading goes the way of a gross one', () => {
    const { bench, type } = caliper();
    type('12.7');
    expect(bench.tap({ do: 'answer-unit', yes: false }).made).toEqual([]);
    expect(bench.state.said).toMatchObject({ kind: 'doubt' });
    expect(type('12.71').made).toMatchObject([{ unit: 'in', value: { ticks: ticksOf('12.71') } }]);
    expect(type('88.9').sound).toBe('refused');
    expect(bench.state.asked).toBeNull();
  });

  test('on a rubric in millimetres a reading in inches is asked about', () => {
    const { bench, type } = caliper(new TestBench(planFor(defaultRubric(SIX_STICKS_MM, 'mm'))));
    type('0.630');
    expect(bench.state.asked).toMatchObject({ about: 'unit', other: 'in' });
    expect(bench.tap({ do: 'answer-unit', yes: true }).made).toMatchObject([
      { unit: 'in', value: { ticks: ticksOf('0.630') } },
    ]);
  });

  test('a reading past the gross limit sounds refused and needs a second press of about the same', () => {
    const { bench, type, axis } = caliper();
    expect(type('0.8')).toMatchObject({ made: [], sound: 'refused' });
    expect(type('0.9')).toMatchObject({ made: [], sound: 'refused' });
    expect(type('0.905').made).toHaveLength(1);
    expect(axis()).toBe('width');
    type('4');
    bench.point('base', 1, 'length');
    bench.point('base', 1, 'width');
    expect(type('4')).toMatchObject({ made: [], sound: 'refused' });
  });

  test('a gross limit is inclusive with its margin', () => {
    const { type } = caliper();
    expect(type('0.752').made).toHaveLength(1);
    expect(type('3.753').made).toEqual([]);
  });

  test('when everything is read nothing is recorded', () => {
    const { bench, type } = caliper();
    bench.tap({ do: 'rest-ok' });
    expect(type('0.5')).toMatchObject({ made: [], sound: 'refused' });
  });
});
