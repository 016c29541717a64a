import { describe, expect, test } from 'vitest';
import { parseLength } from '@/lib/length';
import { pressKey } from '@/lib/round/keypad';
import { TestBench } from '../../support/bench';
import { ticksOf } from '../../support/rubrics';

const typed = (...keys: string[]) =>
  keys.reduce<string | null>((text, key) => pressKey(text ?? '!', key), '');

describe('the keypad', () => {
  test.each([
    [['3', 'and', '1', '7', '/32'], '3 17/32'],
    [['3', '1/2'], '3 1/2'],
    [['3', 'and', '1/2'], '3 1/2'],
    [['1', '7', '/32'], '17/32'],
    [['3/4'], '3/4'],
    [['.', '5'], '.5'],
    [['3', '5', '.', '0', '5'], '35.05'],
    [['3', 'and', '1', '7', 'rub', 'rub'], '3'],
  ])('%j is %s, and it is a length', (keys, text) => {
    expect(typed(...keys)).toBe(text);
    expect(parseLength(text, 'in').ok).toBe(true);
  });

  test.each([
    [['and']],
    [['/32']],
    [['3', '.', '5', '.']],
    [['3', '1/2', '5']],
    [['3', '.', '5', '1/2']],
    [['3', '1/2', 'and']],
    [['rub']],
    [['shift']],
  ])('%j ends on a key that does nothing', (keys) => {
    expect(typed(...keys.slice(0, -1), keys.at(-1) ?? '')).toBeNull();
  });

  test('keep records what was typed, with its unit; the entry is empty for the next size', () => {
    const bench = new TestBench();
    for (const key of ['1', '3', '.', '5']) bench.tap({ do: 'key', key });
    bench.tap({ do: 'key', key: 'unit' });
    expect(bench.tap({ do: 'keep' }).made).toMatchObject([
      { typed: '13.5', unit: 'mm', instrument: 'keyed', value: { ticks: ticksOf('13.5', 'mm') } },
    ]);
    expect(bench.state.keypad).toEqual({ text: '', unit: 'mm' });
  });

  test('nothing, zero and half a fraction are refused and stay as typed', () => {
    const bench = new TestBench();
    expect(bench.tap({ do: 'keep' }).sound).toBe('refused');
    bench.tap({ do: 'key', key: '0' });
    expect(bench.tap({ do: 'keep' }).made).toEqual([]);
    bench.tap({ do: 'key', key: 'and' });
    bench.tap({ do: 'key', key: '1' });
    expect(bench.tap({ do: 'keep' }).made).toEqual([]);
    expect(bench.state.keypad.text).toBe('0 1');
  });

  test('a gross number needs a second keep', () => {
    const bench = new TestBench();
    bench.tap({ do: 'key', key: '3' });
    expect(bench.tap({ do: 'keep' })).toMatchObject({ made: [], sound: 'refused' });
    expect(bench.tap({ do: 'keep' }).made).toHaveLength(1);
  });
});
