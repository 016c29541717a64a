import { z } from 'zod';
import { type Push, type PushAnswer, pushAnswerSchema } from '../protocol';

/** What came back of a push, as far as the outbox acts on it. */
export type PostReply =
  | { kind: 'answered'; answer: PushAnswer }
  /** May succeed later unchanged: no network, a page of somebody else's, a server that is down. */
  | { kind: 'later'; message: string; retryAfterMs: number | null }
  /** A person has to do something first; everything stays where it is. */
  | { kind: 'halt'; why: 'sign-in' | 'reload' | 'refused'; message: string }
  /** The server could not read the batch as a whole. */
  | { kind: 'unreadable'; message: string };

export type PostEvents = (sittingId: string, push: Push) => Promise<PostReply>;

const TIMEOUT_MS = 20_000;

const problemSchema = z.object({ problem: z.object({ code: z.string(), message: z.string() }) });

/** Sends a batch. Only an answer that our endpoint alone could have written counts as one. */
export const postEvents: PostEvents = async (sittingId, push) => {
  try {
    const response = await fetch(`/api/sittings/${sittingId}/events`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(push),
      credentials: 'same-origin',
      redirect: 'error',
      cache: 'no-store',
      signal: AbortSignal.timeout(TIMEOUT_MS),
    });
    return readReply(response.status, response.headers.get('retry-after'), await response.text());
  } catch {
    return { kind: 'later', message: 'No network.', retryAfterMs: null };
  }
};

/** Sorts an answer by what it asks of the device. */
export function readReply(status: number, retryAfter: string | null, text: string): PostReply {
  const body = parseJson(text);
  if (status === 200) {
    const answer = pushAnswerSchema.safeParse(body);
    return answer.success
      ? { kind: 'answered', answer: answer.data }
      : { kind: 'later', message: 'Something else than the server answered.', retryAfterMs: null };
  }
  const problem = problemSchema.safeParse(body);
  if (!problem.success) {
    return { kind: 'later', message: 'The server does not answer.', retryAfterMs: secondsOf(retryAfter) };
  }
  const { message } = problem.data.problem;
  switch (problem.data.problem.code) {
    case 'unauthenticated':
      return { kind: 'halt', why: 'sign-in', message };
    case 'stale':
      return { kind: 'halt', why: 'reload', message };
    case 'forbidden':
    case 'not_found':
      return { kind: 'halt', why: 'refused', message };
    case 'invalid':
      return { kind: 'unreadable', message };
    default:
      return { kind: 'later', message, retryAfterMs: secondsOf(retryAfter) };
  }
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

function secondsOf(retryAfter: string | null): number | null {
  const seconds = Number(retryAfter);
  return retryAfter !== null && Number.isFinite(seconds) && seconds > 0 ? seconds * 1000 : null;
}
