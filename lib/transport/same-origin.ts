import 'server-only';
import { env } from '@/lib/env';
import { type Problem, problem, type Result } from '@/lib/result';

/** More than the largest honest batch; what is longer is refused before it is read. */
const LONGEST_BODY = 2_000_000;

export const FOREIGN: Problem = {
  code: 'forbidden',
  message: 'This request did not come from a page of this product. Nothing was changed.',
};

/** The JSON body of a request that a page of this origin sent; a form or a foreign page cannot make one. */
export async function readSameOriginJson(request: Request): Promise<Result<unknown>> {
  if (!isSameOrigin(request.headers)) return { ok: false, problem: FOREIGN };
  if (!request.headers.get('content-type')?.toLowerCase().startsWith('application/json')) {
    return { ok: false, problem: FOREIGN };
  }
  if (Number(request.headers.get('content-length') ?? 0) > LONGEST_BODY) {
    return problem('invalid', 'This is too long to be read at once.');
  }
  const text = await request.text();
  if (text.length > LONGEST_BODY) return problem('invalid', 'This is too long to be read at once.');
  try {
    return { ok: true, value: JSON.parse(text) };
  } catch {
    return problem('invalid', 'This is not JSON.');
  }
}

/** Whether the browser says that a page of another site sent this; a typed address and a program say nothing. */
export function isForeign(headers: Headers): boolean {
  return ['cross-site', 'same-site'].includes(headers.get('sec-fetch-site') ?? '');
}

function isSameOrigin(headers: Headers): boolean {
  const site = headers.get('sec-fetch-site');
  if (site !== null) return site === 'same-origin';
  const origin = headers.get('origin');
  return origin !== null && (origin === env().APP_URL || sameHost(origin, headers.get('host')));
}

function sameHost(origin: string, host: string | null): boolean {
  return URL.canParse(origin) && new URL(origin).host === host;
}
