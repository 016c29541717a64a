import 'server-only';
import type { Transaction } from '@/db/client';
import { selectInHand } from '@/db/queries/in-hand';
import { countBenchEvents } from '@/db/queries/rounds';
import type { InHandView } from '@/lib/contracts/rounds';

/** Who has whose pieces in hand on other devices, and how many events the bench has in all. */
export async function inHandView(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  exceptDevice: string | null,
): Promise<InHandView> {
  const rows = await selectInHand(tx, schoolId, sittingId, exceptDevice);
  return {
    others: rows.map(({ attemptId, deviceId, since, givenName, familyName }) => ({
      attemptId,
      deviceId,
      since: since.toISOString(),
      name: shortName(givenName, familyName),
    })),
    benchEvents: await countBenchEvents(tx, schoolId, sittingId),
  };
}

/** "D. Okonjo": enough to know a colleague by. */
function shortName(givenName: string, familyName: string): string {
  const initial = [...givenName.trim()][0];
  return initial && familyName ? `${initial}. ${familyName}` : `${givenName} ${familyName}`.trim();
}
