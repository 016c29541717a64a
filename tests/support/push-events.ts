import { randomUUID } from 'node:crypto';
import type { Actor } from '@/lib/auth/actor';
import { keepEvents } from '@/lib/data/rounds/keep-events';
import type { Result } from '@/lib/result';
import { PROTOCOL_VERSION, type PushAnswer } from '@/lib/sync/protocol';

const DEVICE = randomUUID();

export function push(
  actor: Actor | null,
  sittingId: string,
  events: readonly object[],
  more: { deviceId?: string; protocol?: number } = {},
): Promise<Result<PushAnswer>> {
  const { deviceId = DEVICE, protocol = PROTOCOL_VERSION } = more;
  return keepEvents(actor, { sittingId, push: { protocol, deviceId, events } });
}

/** The outcomes of a push, in order; a refusal with its reason. */
export async function outcomes(pushed: Promise<Result<PushAnswer>>): Promise<string[]> {
  const result = await pushed;
  if (!result.ok) throw new Error(`${result.problem.code}: ${result.problem.message}`);
  return result.value.answers.map((answer) =>
    answer.outcome === 'refused' ? `refused: ${answer.reason}` : answer.outcome,
  );
}
