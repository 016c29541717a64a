import { databaseProblem } from '@/lib/data/verb';
import { httpStatus, type Problem, type Result } from '@/lib/result';
import { FOREIGN, isForeign } from './same-origin';

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

/**
 * A route handler for this product's own pages: another site can neither read here nor set off an export by a link.
 * It answers as JSON also when the database is away before a verb is reached.
 */
export function route<Context>(
  handle: (request: Request, context: Context) => Promise<Response>,
): (request: Request, context: Context) => Promise<Response> {
  return async (request, context) => {
    if (isForeign(request.headers)) return answerProblem(FOREIGN);
    try {
      return await handle(request, context);
    } catch (error) {
      return answerProblem(databaseProblem(error).problem);
    }
  };
}
