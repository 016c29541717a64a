import { type NextRequest, NextResponse } from 'next/server';

const development = process.env.NODE_ENV === 'development';

/** Gives every page a content security policy with a nonce of its own; Next reads it there and puts it on its scripts. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64');
  const policy = contentSecurityPolicy(nonce);
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  if (process.env.APP_URL?.startsWith('https:')) {
    response.headers.set('strict-transport-security', 'max-age=31536000; includeSubDomains');
  }
  return response;
}

function contentSecurityPolicy(nonce: string): string {
  const store = process.env.S3_ENDPOINT ? ` ${new URL(process.env.S3_ENDPOINT).origin}` : '';
  const rules = [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ''}`,
    "style-src 'self' 'unsafe-inline'",
    `img-src 'self' data: blob:${store}`,
    "font-src 'self'",
    `connect-src 'self'${store}`,
    "worker-src 'self'",
    "manifest-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ];
  return rules.join('; ');
}

export const config = {
  matcher: ['/((?!_next/static|_next/image|fonts/).*)'],
};
