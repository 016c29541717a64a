import { expect, it } from 'vitest';
import { MAX_FAILURES, sayWait, waitAfter } from '@/lib/auth/sign-in-delays';

it('lets three slips pass, then waits twice as long each time, up to a quarter of an hour', () => {
  expect([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 100].map(waitAfter)).toEqual([
    0, 0, 0, 5, 10, 20, 40, 80, 160, 320, 640, 900, 900,
  ]);
});

it('closes an account after 100 failures in a row, as SP 800-63B allows at most', () => {
  expect(MAX_FAILURES).toBe(100);
});

it.each([
  [1, '1 second'],
  [59, '59 seconds'],
  [60, '1 minute'],
  [61, '2 minutes'],
  [900, '15 minutes'],
])('says %d s as %s', (seconds, words) => {
  expect(sayWait(seconds)).toBe(words);
});
