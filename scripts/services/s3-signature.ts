import { createHash, createHmac, timingSafeEqual } from 'node:crypto';

export interface Keys {
  accessKeyId: string;
  secretAccessKey: string;
}

export interface SignedRequest {
  method: string;
  /** Path and query as they came over the wire. */
  url: string;
  headers: Record<string, string | undefined>;
  body: Buffer;
}

interface Claim {
  credential: string;
  signedHeaders: string[];
  signature: string;
  /** `YYYYMMDDTHHMMSSZ` */
  date: string;
  expiresSeconds: number | null;
  payload: string;
}

type Verdict = { ok: true } | { ok: false; code: string; message: string };

const ALGORITHM = 'AWS4-HMAC-SHA256';
const CLOCK_SKEW_SECONDS = 15 * 60;

const sha256 = (data: string | Buffer) => createHash('sha256').update(data).digest('hex');
const hmac = (key: string | Buffer, data: string) => createHmac('sha256', key).update(data).digest();
const refuse = (code: string, message: string): Verdict => ({ ok: false, code, message });

/** Checks a request's Signature Version 4, in its Authorization header or in its query, as the service itself does. */
export function verifySignature(request: SignedRequest, keys: Keys, now = new Date()): Verdict {
  const url = new URL(request.url, 'http://host');
  const claim = url.searchParams.has('X-Amz-Signature') ? claimInQuery(url) : claimInHeader(request);
  if (!claim) return refuse('AccessDenied', 'The request is not signed.');
  const [accessKeyId, day = '', region = '', service = '', end] = claim.credential.split('/');
  if (accessKeyId !== keys.accessKeyId) return refuse('InvalidAccessKeyId', 'This access key is not known.');
  if (service !== 's3' || end !== 'aws4_request' || !claim.date.startsWith(day)) {
    return refuse('AuthorizationHeaderMalformed', 'The credential scope is wrong.');
  }
  const timely = checkTime(claim, now);
  if (!timely.ok) return timely;
  const covered = checkCovered(request, claim);
  if (!covered.ok) return covered;
  const scope = `${day}/${region}/s3/aws4_request`;
  const toSign = [ALGORITHM, claim.date, scope, sha256(canonicalRequest(request, url, claim))].join('\n');
  const key = [region, 's3', 'aws4_request'].reduce(
    (k, part) => hmac(k, part),
    hmac(`AWS4${keys.secretAccessKey}`, day),
  );
  return sameHex(hmac(key, toSign).toString('hex'), claim.signature)
    ? { ok: true }
    : refuse('SignatureDoesNotMatch', 'The signature does not belong to this request.');
}

function claimInHeader({ headers }: SignedRequest): Claim | null {
  const match = /^AWS4-HMAC-SHA256 Credential=([^,]+), ?SignedHeaders=([^,]+), ?Signature=([0-9a-f]+)$/.exec(
    headers.authorization ?? '',
  );
  const [, credential, signedHeaders, signature] = match ?? [];
  if (!credential || !signedHeaders || !signature) return null;
  return {
    credential,
    signedHeaders: signedHeaders.split(';'),
    signature,
    date: headers['x-amz-date'] ?? '',
    expiresSeconds: null,
    payload: headers['x-amz-content-sha256'] ?? '',
  };
}

function claimInQuery(url: URL): Claim | null {
  const of = (name: string) => url.searchParams.get(`X-Amz-${name}`) ?? '';
  if (of('Algorithm') !== ALGORITHM) return null;
  return {
    credential: of('Credential'),
    signedHeaders: of('SignedHeaders').split(';'),
    signature: of('Signature'),
    date: of('Date'),
    expiresSeconds: Number(of('Expires')),
    payload: 'UNSIGNED-PAYLOAD',
  };
}

function checkTime({ date, expiresSeconds }: Claim, now: Date): Verdict {
  const [, y, mo, d, h, mi, s] = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(date) ?? [];
  const age = (now.getTime() - Date.parse(`${y}-${mo}-${d}T${h}:${mi}:${s}Z`)) / 1000;
  const oldest = expiresSeconds ?? CLOCK_SKEW_SECONDS;
  if (!(age >= -CLOCK_SKEW_SECONDS))
    return refuse('RequestTimeTooSkewed', 'The date of the request is wrong.');
  if (expiresSeconds !== null && !(expiresSeconds >= 1 && expiresSeconds <= 604_800)) {
    return refuse('AuthorizationQueryParametersError', 'The time to live is not between 1 s and 7 days.');
  }
  return age <= oldest ? { ok: true } : refuse('AccessDenied', 'The request has expired.');
}

/** What the signature must cover: host, every x-amz- header, the type of a body, and the body unless it says not. */
function checkCovered({ headers, body }: SignedRequest, { signedHeaders, payload }: Claim): Verdict {
  const owed = Object.keys(headers).filter((name) => name.startsWith('x-amz-') || name === 'content-type');
  const missing = ['host', ...owed].find(
    (name) => headers[name] !== undefined && !signedHeaders.includes(name),
  );
  if (missing) return refuse('AccessDenied', `The header "${missing}" is not signed.`);
  if (payload === 'UNSIGNED-PAYLOAD') return { ok: true };
  if (!/^[0-9a-f]{64}$/.test(payload))
    return refuse('NotImplemented', `The payload "${payload}" is not understood.`);
  return payload === sha256(body)
    ? { ok: true }
    : refuse('XAmzContentSHA256Mismatch', 'The body is not the one that was signed.');
}

function canonicalRequest(
  { method, headers }: SignedRequest,
  url: URL,
  { signedHeaders, payload }: Claim,
): string {
  const query = [...url.searchParams]
    .filter(([name]) => name !== 'X-Amz-Signature')
    .map(([name, value]) => [encode(name), encode(value)] as const)
    .sort(([a, x], [b, y]) => compare(a, b) || compare(x, y))
    .map(([name, value]) => `${name}=${value}`)
    .join('&');
  const lines = signedHeaders.map(
    (name) => `${name}:${(headers[name] ?? '').trim().replaceAll(/ +/g, ' ')}\n`,
  );
  const path = url.pathname
    .split('/')
    .map((part) => encode(decodeURIComponent(part)))
    .join('/');
  return [method, path, query, lines.join(''), signedHeaders.join(';'), payload].join('\n');
}

const compare = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);

/** Percent-encoding of RFC 3986: only unreserved characters stay as they are. */
function encode(text: string): string {
  return encodeURIComponent(text).replaceAll(
    /[!'()*]/g,
    (char) => `%${char.charCodeAt(0).toString(16).toUpperCase()}`,
  );
}

function sameHex(a: string, b: string): boolean {
  return a.length === b.length && timingSafeEqual(Buffer.from(a), Buffer.from(b));
}
