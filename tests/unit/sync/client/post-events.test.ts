import { describe, expect, test } from 'vitest';
import { readReply } from '@/lib/sync/client/post-events';
import { waitAfter } from '@/lib/sync/client/waits';

const problem = (code: string) => JSON.stringify({ problem: { code, message: 'A sentence.' } });

describe('what counts as an answer', () => {
  test('a well-formed answer of our endpoint alone', () => {
    const answer = {
      protocol: 1,
      answers: [{ id: '0190b6e2-7f3a-4c1d-9a55-0242ac120002', outcome: 'kept' }],
    };
    expect(readReply(200, null, JSON.stringify(answer))).toEqual({ kind: 'answered', answer });
  });

  test.each([
    ['a page of a guest network', 200, '<html>Welcome</html>'],
    ['an answer of another protocol', 200, '{"protocol":2,"answers":[]}'],
    ['an answer with an unknown outcome', 200, '{"protocol":1,"answers":[{"id":"x","outcome":"lost"}]}'],
    ['nothing', 200, ''],
    ['a gateway’s error page', 502, '<h1>Bad Gateway</h1>'],
    ['a not found that is not ours', 404, '<h1>Not Found</h1>'],
    ['a dead database', 503, problem('unavailable')],
    ['a change at the same moment', 409, problem('conflict')],
    ['too many requests', 429, problem('rate_limited')],
  ])('%s is tried again later', (_, status, text) => {
    expect(readReply(status, null, text)).toMatchObject({ kind: 'later' });
  });

  test.each([
    [401, 'unauthenticated', 'sign-in'],
    [412, 'stale', 'reload'],
    [403, 'forbidden', 'refused'],
    [404, 'not_found', 'refused'],
  ])('%i %s asks the person: %s', (status, code, why) => {
    expect(readReply(status, null, problem(code))).toEqual({ kind: 'halt', why, message: 'A sentence.' });
  });

  test('a wait that the server names is taken in seconds; one that is no number is not', () => {
    expect(readReply(503, '5', problem('unavailable'))).toMatchObject({ retryAfterMs: 5000 });
    expect(readReply(503, 'soon', problem('unavailable'))).toMatchObject({ retryAfterMs: null });
  });
});

test('waits double from a second to a minute, each in its upper half', () => {
  expect(waitAfter(3, () => 0.5)).toBe(3000);
  expect([1, 2, 3, 6, 7, 50].map((failures) => waitAfter(failures, () => 0))).toEqual([
    500, 1000, 2000, 16_000, 30_000, 30_000,
  ]);
  expect(waitAfter(50, () => 0.999)).toBeLessThanOrEqual(60_000);
});
