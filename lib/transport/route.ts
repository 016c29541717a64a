import { httpStatus, type Problem, type Result } from '@/lib/result';

const PRIVATE = { 'cache-control': 'private, no-store' };

/** A verb's answer as JSON over HTTP. */
export function answer<T>(result: Result<T>): Response {
  return result.ok ? Response.json(result.value, { headers: PRIVATE }) : answerProblem(result.problem);
}

export function answerProblem(problem: Problem): Response {
  const headers: Record<string, string> = { ...PRIVATE };
  if (problem.retryAfter) headers['retry-after'] = String(problem.retryAfter);
  return Response.json({ problem }, { status: httpStatus(problem.code), headers });
}
