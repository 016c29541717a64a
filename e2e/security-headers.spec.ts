import { expect, test } from './fixtures/test';

function policyOf(headers: Record<string, string>): Map<string, string[]> {
  const rules = (headers['content-security-policy'] ?? '').split('; ').map((rule) => rule.split(' '));
  return new Map(rules.map(([name = '', ...sources]) => [name, sources]));
}

test('every page runs only scripts that carry the nonce of its own answer', async ({ page }) => {
  const [first, second] = [await page.goto('/sign-in'), await page.goto('/sign-in')];
  const sources = [first, second].map(
    (response) => policyOf(response?.headers() ?? {}).get('script-src') ?? [],
  );
  const nonces = sources.map((list) => list.find((source) => source.startsWith("'nonce-")));
  expect(nonces[0]).toBeTruthy();
  expect(nonces[0]).not.toBe(nonces[1]);
  for (const list of sources) {
    expect(list).toContain("'strict-dynamic'");
    expect(list).not.toContain("'unsafe-inline'");
    expect(list).not.toContain("'unsafe-eval'");
  }
});

test('a script that is put into a page without the nonce does not run', async ({ page }) => {
  await page.goto('/sign-in');
  const ran = await page.evaluate(() => {
    const host = document.createElement('div');
    host.innerHTML = '<img src="/icon.svg" onload="window.name = \'ran\'">';
    document.body.append(host);
    return new Promise<boolean>((resolve) => {
      host.firstElementChild?.addEventListener('load', () => resolve(window.name === 'ran'));
    });
  });
  expect(ran).toBe(false);
});
test.use({ expectedErrors: /inline event handler/ });

test('pages are kept by no cache, framed by nobody, and name no server', async ({ request }) => {
  const headers = (await request.get('/sign-in')).headers();
  expect(headers['cache-control']).toContain('no-store');
  expect(headers['cache-control']).toContain('private');
  expect(headers['x-content-type-options']).toBe('nosniff');
  expect(headers['referrer-policy']).toBe('same-origin');
  expect(headers['cross-origin-opener-policy']).toBe('same-origin');
  expect(headers['permissions-policy']).toContain('camera=()');
  expect(headers['x-powered-by']).toBeUndefined();
  const policy = policyOf(headers);
  expect(policy.get('frame-ancestors')).toEqual(["'none'"]);
  expect(policy.get('object-src')).toEqual(["'none'"]);
  expect(policy.get('base-uri')).toEqual(["'none'"]);
  expect(policy.get('form-action')).toEqual(["'self'"]);
});

test('the state of the database is told to whoever balances the load, and kept by no cache', async ({
  request,
}) => {
  const response = await request.get('/api/health');
  expect(response.status()).toBe(200);
  expect(await response.json()).toEqual({ database: 'up' });
  expect(response.headers()['cache-control']).toContain('no-store');
});
