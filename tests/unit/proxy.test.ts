import { NextRequest } from 'next/server';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { proxy } from '@/proxy';

afterEach(() => vi.unstubAllEnvs());

const answer = () => proxy(new NextRequest('http://127.0.0.1:3000/sign-in')).headers;

function sources(headers: Headers, rule: string): string[] {
  const rules = (headers.get('content-security-policy') ?? '').split('; ').map((text) => text.split(' '));
  return rules.find(([name]) => name === rule)?.slice(1) ?? [];
}

describe('the headers of every answer', () => {
  test('hold the browser to https only where people come by https', () => {
    vi.stubEnv('APP_URL', 'http://127.0.0.1:3000');
    expect(answer().has('strict-transport-security')).toBe(false);
    vi.stubEnv('APP_URL', 'https://trymark.example.org');
    expect(answer().get('strict-transport-security')).toBe('max-age=31536000; includeSubDomains');
  });

  test('let pages reach the bucket that files are kept in, and nothing else outside', () => {
    vi.stubEnv('S3_ENDPOINT', '');
    expect(sources(answer(), 'connect-src')).toEqual(["'self'"]);
    vi.stubEnv('S3_ENDPOINT', 'https://s3.example.org/some/path');
    expect(sources(answer(), 'connect-src')).toEqual(["'self'", 'https://s3.example.org']);
    expect(sources(answer(), 'img-src')).toContain('https://s3.example.org');
    expect(sources(answer(), 'script-src')).not.toContain('https://s3.example.org');
  });

  test('allow eval in development alone', () => {
    expect(sources(answer(), 'script-src')).not.toContain("'unsafe-eval'");
  });

  test('carry a nonce that cannot be guessed from the last one', () => {
    const nonces = Array.from({ length: 50 }, () => sources(answer(), 'script-src')[1]);
    expect(new Set(nonces).size).toBe(50);
    expect(nonces[0]).toMatch(/^'nonce-[A-Za-z0-9+/]{22}=='$/);
  });
});
