import 'server-only';
import { createHash } from 'node:crypto';
import { Pool } from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { env } from '@/lib/env';
import { log } from '@/lib/log';
import { MAX_FAILURES, waitAfter } from './sign-in-delays';

/** Far above what a classroom behind one address gets wrong in a period. */
const ADDRESS_FAILURES = 300;
const ADDRESS_WINDOW_S = 900;
const RESET_MAILS_AN_HOUR = 5;

const TABLE = 'rate_limits';

function makeLimits() {
  const pool = new Pool({
    connectionString: env().DATABASE_URL,
    max: 4,
    connectionTimeoutMillis: 5_000,
    options: '-c role=trymark_auth -c statement_timeout=15000',
    application_name: 'trymark_limits',
  });
  pool.on('error', (error) => log.warn({ err: error }, 'a connection of the sign-in counters was lost'));
  const limiter = (keyPrefix: string, points: number, duration: number) =>
    new RateLimiterPostgres({
      storeClient: pool,
      storeType: 'pool',
      tableName: TABLE,
      tableCreated: true,
      keyPrefix,
      points,
      duration,
    });
  return {
    failures: limiter('failures', MAX_FAILURES, 0),
    waits: limiter('wait', 1, 1),
    addresses: limiter('address', ADDRESS_FAILURES, ADDRESS_WINDOW_S),
    resets: limiter('reset', RESET_MAILS_AN_HOUR, 3_600),
    pool,
  };
}

const held = globalThis as typeof globalThis & { trymarkLimits?: ReturnType<typeof makeLimits> };

function limits() {
  held.trymarkLimits ??= makeLimits();
  return held.trymarkLimits;
}

/** Ends the counters' connections, as before a process ends. */
export async function closeLimits(): Promise<void> {
  await held.trymarkLimits?.pool.end();
  held.trymarkLimits = undefined;
}

/** An account as it is named at sign-in, known or not; counters keep only its hash. */
export function accountKey(name: { email: string } | { schoolCode: string; localId: string }): string {
  const text = 'email' in name ? `staff\n${name.email.toLowerCase()}` : `${name.schoolCode}\n${name.localId}`;
  return createHash('sha256').update(text, 'utf8').digest('base64url');
}

export type TryAnswer =
  | { allowed: true; nextWaitSeconds: number }
  | { allowed: false; waitSeconds: number | null };

/**
 * Counts a try as failed before it is checked, so that tries at the same moment cannot outrun the delays.
 * `waitSeconds` null: the account has failed too often and opens again only by a reset.
 */
export async function beginTry(account: string, address: string): Promise<TryAnswer> {
  const { failures, waits, addresses } = limits();
  const [waiting, crowd] = await Promise.all([waits.get(account), addresses.get(address)]);
  if (crowd && crowd.consumedPoints >= ADDRESS_FAILURES) return refused(crowd);
  if (waiting && waiting.consumedPoints > 0) return refused(waiting);
  const { consumedPoints: count } = await failures.penalty(account);
  if (count > MAX_FAILURES) return { allowed: false, waitSeconds: null };
  const wait = waitAfter(count);
  if (wait > 0) {
    try {
      await waits.consume(account, 1, { customDuration: wait });
    } catch (busy) {
      if (!(busy instanceof RateLimiterRes)) throw busy;
      await failures.reward(account);
      return refused(busy);
    }
  }
  return { allowed: true, nextWaitSeconds: wait };
}

export async function tryFailed(address: string): Promise<void> {
  await limits().addresses.penalty(address);
}

/** Forgets an account's failures, as after it was proved or reset. */
export async function forgetFailures(account: string): Promise<void> {
  await Promise.all([limits().failures.delete(account), limits().waits.delete(account)]);
}

/** Keys of the counters that `forgetFailures` clears, for clearing them inside another transaction. */
export function counterKeys(account: string): string[] {
  return [limits().failures.getKey(account), limits().waits.getKey(account)];
}

/** Whether another reset mail may go to this account within the hour. */
export async function mayMailReset(account: string): Promise<boolean> {
  try {
    await limits().resets.consume(account);
    return true;
  } catch (full) {
    if (full instanceof RateLimiterRes) return false;
    throw full;
  }
}

function refused(counter: RateLimiterRes): TryAnswer {
  return { allowed: false, waitSeconds: Math.max(1, Math.ceil(counter.msBeforeNext / 1000)) };
}
