import { beforeAll, expect, test } from 'vitest';
import { readSameOriginJson } from '@/lib/transport/same-origin';

beforeAll(() => {
  process.env.DATABASE_URL = 'postgres://nobody@127.0.0.1:1/none';
  process.env.APP_URL = 'https://trymark.example.org';
  process.env.APP_SECRET = 'a secret that only the tests know, long enough';
});

function read(headers: Record<string, string>, body = '{"a":1}') {
  return readSameOriginJson(
    new Request('https://trymark.example.org/api', {
      method: 'POST',
      headers: { 'content-type': 'application/json', ...headers },
      body,
    }),
  );
}

test.each([
  ['the browser says it is of this origin', { 'sec-fetch-site': 'same-origin' }],
  ['an older browser names this origin', { origin: 'https://trymark.example.org' }],
])('is read when %s', async (_, headers) => {
  expect(await read(headers)).toEqual({ ok: true, value: { a: 1 } });
});

test.each([
  ['another site', { 'sec-fetch-site': 'cross-site', origin: 'https://elsewhere.example' }],
  ['a sister site', { 'sec-fetch-site': 'same-site', origin: 'https://trymark.example.org' }],
  ['another origin', { origin: 'https://elsewhere.example' }],
  ['no origin at all', {}],
  ['a page without an origin', { origin: 'null' }],
  ['a form', { 'sec-fetch-site': 'same-origin', 'content-type': 'text/plain' }],
])('is refused when it comes from %s', async (_, headers) => {
  expect(await read(headers)).toMatchObject({ ok: false, problem: { code: 'forbidden' } });
});

test('what is no JSON, or longer than any batch, is refused with a sentence', async () => {
  const own = { 'sec-fetch-site': 'same-origin' };
  expect(await read(own, '{"a":')).toMatchObject({ ok: false, problem: { code: 'invalid' } });
  expect(await read(own, `"${'x'.repeat(2_000_001)}"`)).toMatchObject({
    ok: false,
    problem: { code: 'invalid' },
  });
});
