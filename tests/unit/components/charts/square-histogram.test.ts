import { describe, expect, it } from 'vitest';
import { countByWhole } from '@/components/charts/square-histogram';
import { parseTheme } from '@/components/shell/theme';

describe('a histogram of squares', () => {
  it('counts each score at its nearest whole, and what lies outside at the nearer end', () => {
    expect([...countByWhole([86, 86.4, 85.6, 12, 120], 70, 102)]).toEqual([
      [86, 3],
      [70, 1],
      [102, 1],
    ]);
  });
});

describe('the theme of a device', () => {
  it('is what its cookie says, and as the device for anything unknown', () => {
    expect(parseTheme('dark')).toBe('dark');
    expect(parseTheme('light')).toBe('light');
    expect(parseTheme('neon')).toBe('auto');
    expect(parseTheme(undefined)).toBe('auto');
  });
});
