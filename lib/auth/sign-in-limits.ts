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

/** pg gives no code to a connection that broke or never came; the product tells a database that is away by its code. */
async function reaching<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof Error && !('code' in error) && /connect|terminat/i.test(error.message)) {
      throw Object.assign(error, { code: 'CONNECTION_LOST' });
    }
    throw error;
  }
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
export function beginTry(account: string, address: string): Promise<TryAnswer> {
  return reaching(() => countTry(account, address));
}

async function countTry(account: string, address: string): Promise<TryAnswer> {
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
  await reaching(() => limits().addresses.penalty(address));
}

/** Forgets an account's failures, as after it was proved or reset. */
export async function forgetFailures(account: string): Promise<void> {
  const { failures, waits } = limits();
  await reaching(() => Promise.all([failures.delete(account), waits.delete(account)]));
}

/** The counter of one's own account page, where the present password is asked for again. */
export function ownKey(personId: string): string {
  return createHash('sha256').update(`own\n${personId}`, 'utf8').digest('base64url');
}

/** Keys of the counters that `forgetFailures` clears, for clearing them inside another transaction. */
export function counterKeys(account: string): string[] {
  return [limits().failures.getKey(account), limits().waits.getKey(account)];
}

interface ResetAnswer {
  account: boolean;
  address: number | null;
}

/**
 * Counts a request for a reset. `account`: whether a mail may still go there this hour; `address`: seconds to wait
 * when too many came from one address, null otherwise.
 */
export function mayAskReset(account: string, address: string): Promise<ResetAnswer> {
  return reaching(() => countReset(account, address));
}

async function countReset(account: string, address: string): Promise<ResetAnswer> {
  const { addresses, resets } = limits();
  const crowd = await addresses.penalty(address);
  if (crowd.consumedPoints > ADDRESS_FAILURES) return { account: false, address: waitSeconds(crowd) };
  const { consumedPoints } = await resets.penalty(account);
  return { account: consumedPoints <= RESET_MAILS_AN_HOUR, address: null };
}

function refused(counter: RateLimiterRes): TryAnswer {
  return { allowed: false, waitSeconds: waitSeconds(counter) };
}

function waitSeconds(counter: RateLimiterRes): number {
  return Math.max(1, Math.ceil(counter.msBeforeNext / 1000));
}
