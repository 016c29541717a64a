import 'server-only';
import { databaseProblem } from '@/lib/data/verb';
import { log } from '@/lib/log';
import type { Problem } from '@/lib/result';
import { answerProblem } from './route';

const LINES = {
  'content-type': 'application/x-ndjson; charset=utf-8',
  // Not to be transformed: whoever compresses or gathers the answer would show all progress at its end.
  'cache-control': 'private, no-store, no-transform',
  'x-accel-buffering': 'no',
  'x-content-type-options': 'nosniff',
};

const BROKE_OFF = 'This broke off: something is wrong on our side. Nothing was changed; try again.';

type ProblemLine = { kind: 'problem'; message: string };

/**
 * Answers with lines of JSON as the work writes them. A problem before the first line is an ordinary refusal with its
 * status; a later one is the last line. The work is called off when the client goes away.
 */
export async function answerLines<Line>(
  client: AbortSignal,
  work: (write: (line: Line) => void, signal: AbortSignal) => Promise<Problem | null>,
): Promise<Response> {
  const pipe = openPipe<Line | ProblemLine>(client);
  const ended = work(pipe.write, pipe.signal);
  const refusal = await Promise.race([pipe.begun, ended]);
  if (refusal) return answerProblem(refusal);
  void ended.catch(problemOf).then((problem) => {
    if (problem) pipe.write({ kind: 'problem', message: problem.message });
    pipe.close();
  });
  return new Response(pipe.stream, { headers: LINES });
}

function openPipe<Line>(client: AbortSignal) {
  const stopping = new AbortController();
  const signal = AbortSignal.any([client, stopping.signal]);
  const bytes = new TextEncoder();
  let out: ReadableStreamDefaultController<Uint8Array> | undefined;
  let begin = () => {};
  const begun = new Promise<null>((resolve) => {
    begin = () => resolve(null);
  });
  const stream = new ReadableStream<Uint8Array>({
    start: (controller) => {
      out = controller;
    },
    cancel: () => stopping.abort(),
  });
  return {
    ...{ stream, signal, begun },
    write: (line: Line) => {
      if (!signal.aborted) out?.enqueue(bytes.encode(`${JSON.stringify(line)}\n`));
      begin();
    },
    close: () => {
      if (!stopping.signal.aborted) out?.close();
    },
  };
}

function problemOf(error: unknown): { message: string } | null {
  if (error instanceof Error && error.name === 'AbortError') return null;
  try {
    return databaseProblem(error).problem;
  } catch (bug) {
    log.error({ err: bug }, 'an answer in lines broke off');
    return { message: BROKE_OFF };
  }
}
