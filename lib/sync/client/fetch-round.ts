import type { z } from 'zod';
import {
  type InHandView,
  inHandViewSchema,
  type RoundBundle,
  roundBundleSchema,
} from '@/lib/contracts/rounds';

export type Fetched<T> = { ok: true; value: T } | { ok: false; why: 'sign-in' | 'not-found' | 'offline' };

/** Without a round on the device there is nothing to show meanwhile; with one, a hanging network is not waited for. */
const ROUND_TIMEOUT_MS = 20_000;
const REFRESH_TIMEOUT_MS = 4_000;
const IN_HAND_TIMEOUT_MS = 5_000;

export function fetchRound(sittingId: string, stored: boolean): Promise<Fetched<RoundBundle>> {
  return fetchParsed(
    `/api/sittings/${sittingId}/round`,
    roundBundleSchema,
    stored ? REFRESH_TIMEOUT_MS : ROUND_TIMEOUT_MS,
  );
}

export function fetchInHand(sittingId: string, deviceId: string): Promise<Fetched<InHandView>> {
  return fetchParsed(
    `/api/sittings/${sittingId}/in-hand?device=${deviceId}`,
    inHandViewSchema,
    IN_HAND_TIMEOUT_MS,
  );
}

export function postInHand(
  sittingId: string,
  deviceId: string,
  attemptId: string | null,
): Promise<Fetched<InHandView>> {
  return fetchParsed(`/api/sittings/${sittingId}/in-hand`, inHandViewSchema, IN_HAND_TIMEOUT_MS, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ deviceId, attemptId }),
  });
}

/** An answer that is not ours, whatever its status, counts as no network. */
async function fetchParsed<Schema extends z.ZodType>(
  url: string,
  schema: Schema,
  timeoutMs: number,
  init: RequestInit = {},
): Promise<Fetched<z.output<Schema>>> {
  try {
    const response = await fetch(url, {
      ...init,
      credentials: 'same-origin',
      redirect: 'error',
      cache: 'no-store',
      signal: AbortSignal.timeout(timeoutMs),
    });
    const body: unknown = await response.json();
    if (response.ok) {
      const parsed = schema.safeParse(body);
      return parsed.success ? { ok: true, value: parsed.data } : { ok: false, why: 'offline' };
    }
    if (typeof body !== 'object' || body === null || !('problem' in body))
      return { ok: false, why: 'offline' };
    if (response.status === 401) return { ok: false, why: 'sign-in' };
    return { ok: false, why: response.status === 404 || response.status === 403 ? 'not-found' : 'offline' };
  } catch {
    return { ok: false, why: 'offline' };
  }
}
