import 'server-only';
import type { Database } from '@/db/client';
import { type Person, provePassword } from '@/lib/auth/credentials';
import { sayWait } from '@/lib/auth/sign-in-delays';
import { beginTry, forgetFailures, tryFailed } from '@/lib/auth/sign-in-limits';
import { refuse, refuseFields } from './entry';

interface Claim {
  /** The counter of the account that is named, known or not. */
  account: string;
  address: string;
  /** The person so named, if there is one. */
  person: Person | null;
  /** The ways of writing the password that are accepted. */
  passwords: readonly string[];
  /** What to say when name and password do not belong together. */
  wrong: string;
  /** What to do when the account is closed after too many failures. */
  closed: string;
  /** The field that the message of a wrong password belongs to; none for the form as a whole. */
  field?: string;
}

/** Ends with a message unless the password belongs to the person; counts the failure and says how long to wait. */
export async function provePerson(db: Database, claim: Claim): Promise<void> {
  const started = await beginTry(claim.account, claim.address);
  if (!started.allowed) {
    const { waitSeconds } = started;
    if (waitSeconds === null) refuse('rate_limited', claim.closed);
    refuse('rate_limited', `Too many tries. Wait ${sayWait(waitSeconds)}, then try again.`, {
      retryAfter: waitSeconds,
    });
  }
  if (await provePassword(db, claim.person, claim.passwords)) return forgetFailures(claim.account);
  await tryFailed(claim.address);
  const { nextWaitSeconds } = started;
  const then = nextWaitSeconds > 0 ? ` You can try again in ${sayWait(nextWaitSeconds)}.` : '';
  refuseFields({ [claim.field ?? '']: [`${claim.wrong}${then}`] });
}
