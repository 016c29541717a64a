import { and, asc, eq, gt, ne, sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { inHand, people } from '@/db/schema';

/** A device that has not been heard of for this long has put the pieces down. */
const IN_HAND_FOR = sql`interval '2 minutes'`;

export function selectInHand(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  exceptDevice: string | null,
) {
  return tx
    .select({
      attemptId: inHand.attemptId,
      deviceId: inHand.deviceId,
      since: inHand.since,
      givenName: people.givenName,
      familyName: people.familyName,
    })
    .from(inHand)
    .innerJoin(people, and(eq(people.schoolId, inHand.schoolId), eq(people.id, inHand.personId)))
    .where(
      and(
        eq(inHand.schoolId, schoolId),
        eq(inHand.sittingId, sittingId),
        exceptDevice === null ? undefined : ne(inHand.deviceId, exceptDevice),
        gt(inHand.seenAt, sql`now() - ${IN_HAND_FOR}`),
      ),
    )
    .orderBy(asc(inHand.since), asc(inHand.deviceId));
}

export async function upsertInHand(tx: Transaction, row: typeof inHand.$inferInsert): Promise<void> {
  await tx
    .insert(inHand)
    .values(row)
    .onConflictDoUpdate({
      target: [inHand.schoolId, inHand.sittingId, inHand.deviceId],
      set: {
        personId: sql`excluded.person_id`,
        attemptId: sql`excluded.attempt_id`,
        since: sql`case when ${inHand.attemptId} = excluded.attempt_id then ${inHand.since} else now() end`,
        seenAt: sql`now()`,
      },
    });
}

export async function deleteInHand(
  tx: Transaction,
  schoolId: string,
  sittingId: string,
  deviceId: string,
): Promise<void> {
  await tx
    .delete(inHand)
    .where(
      and(eq(inHand.schoolId, schoolId), eq(inHand.sittingId, sittingId), eq(inHand.deviceId, deviceId)),
    );
}
