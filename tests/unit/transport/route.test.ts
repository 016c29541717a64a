import { expect, test } from 'vitest';
import { answer, route } from '@/lib/transport/route';

const REQUEST = new Request('https://trymark.example.org/api');

test.each(['ECONNREFUSED', 'CONNECT_TIMEOUT', '57P01', '57014', 'ENOTFOUND', 'EAI_AGAIN', 'EHOSTUNREACH'])(
  'a database that is away (%s) is answered as something to try again',
  async (code) => {
    const handle = route(() => Promise.reject(Object.assign(new Error('away'), { code })));
    const response = await handle(REQUEST, {});
    expect([response.status, response.headers.get('retry-after')]).toEqual([503, '5']);
    expect(response.headers.get('cache-control')).toBe('private, no-store');
    expect(await response.json()).toMatchObject({ problem: { code: 'unavailable' } });
  },
);

test.each(['cross-site', 'same-site'])('a request that a %s page sent is refused unread', async (site) => {
  const handle = route(() => Promise.reject(new Error('reached')));
  const request = new Request(REQUEST.url, { headers: { 'sec-fetch-site': site } });
  expect((await handle(request, {})).status).toBe(403);
});

test('any other error is a bug and passes on as it is', async () => {
  const bug = new TypeError('no such thing');
  await expect(route(() => Promise.reject(bug))(REQUEST, {})).rejects.toBe(bug);
});

test('what a handler answers is what goes out', async () => {
  const response = await route(async () => answer({ ok: true, value: { a: 1 } }))(REQUEST, {});
  expect([response.status, await response.json()]).toEqual([200, { a: 1 }]);
});
