import 'server-only';
import { sql } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import type { MailOrder } from './message';

export const MAIL_TASK = 'send-mail';

/** Queues a mail inside the caller's transaction: it is sent if, and only if, that transaction is kept. */
export async function queueMail(tx: Pick<Transaction, 'execute'>, order: MailOrder): Promise<void> {
  await tx.execute(sql`select app_queue_job(${MAIL_TASK}, ${JSON.stringify(order)}::json)`);
}
