/** What can go wrong that a person can be told about; everything else is a bug and is thrown. */
export const PROBLEM_CODES = [
  'unauthenticated',
  'forbidden',
  'not_found',
  'invalid',
  'conflict',
  'stale',
  'rate_limited',
  'unavailable',
] as const;

export type ProblemCode = (typeof PROBLEM_CODES)[number];

/** Messages by field path (`lines.2.width`); the key '' holds what belongs to no single field. */
export type FieldErrors = Record<string, string[]>;

export interface Problem {
  code: ProblemCode;
  message: string;
  fields?: FieldErrors;
  /** Seconds after which trying again can help. */
  retryAfter?: number;
}

export type Result<T> = { ok: true; value: T } | { ok: false; problem: Problem };

export function problem(
  code: ProblemCode,
  message: string,
  more: Omit<Problem, 'code' | 'message'> = {},
): {
  ok: false;
  problem: Problem;
} {
  return { ok: false, problem: { code, message, ...more } };
}

/** Refused input with its messages; the first one is also the message of the whole. */
export function invalid(fields: FieldErrors): { ok: false; problem: Problem } {
  const first = Object.values(fields)[0]?.[0] ?? 'Something typed here cannot be used.';
  return problem('invalid', first, { fields });
}

const HTTP_STATUS: Record<ProblemCode, number> = {
  unauthenticated: 401,
  forbidden: 403,
  not_found: 404,
  invalid: 422,
  conflict: 409,
  stale: 412,
  rate_limited: 429,
  unavailable: 503,
};

export function httpStatus(code: ProblemCode): number {
  return HTTP_STATUS[code];
}
