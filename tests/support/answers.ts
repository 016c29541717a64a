import type { Result } from '@/lib/result';

/** What a verb gave; a test that expects it to work fails with the verb's own words. */
export function value<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.problem.code}: ${result.problem.message}`);
  return result.value;
}

export function code(result: Result<unknown>): string {
  return result.ok ? 'ok' : result.problem.code;
}

/** The fields that a verb pointed at. */
export function fieldsOf(result: Result<unknown>): string[] {
  return result.ok ? [] : Object.keys(result.problem.fields ?? {});
}
