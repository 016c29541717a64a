import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Runner } from 'graphile-worker';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { z } from 'zod';
import type { MailOrder } from '@/lib/mail/message';
import { MAIL_TASK, queueMail } from '@/lib/mail/queue-mail';
import { startJobs } from '@/scripts/job-runner';
import { startMailbox } from '@/scripts/services/mailbox';
import { databaseAs, databaseUrl, ownerSql } from '@/tests/support/database';

const LINK = 'http://127.0.0.1:3000/reset/J0in7ers-Mallet_and_Ch1sel-secret-of-43-chars';
const received = z.array(
  z.object({ to: z.array(z.string()), subject: z.string(), text: z.string(), html: z.string() }),
);

let mailbox: Awaited<ReturnType<typeof startMailbox>>;
let folder: string;
let runner: Runner | undefined;

function order(to: string): MailOrder {
  return {
    to,
    template: 'password-reset',
    data: { givenName: 'Rut', schoolName: 'Cedar Fork <High>', link: LINK, minutes: 60 },
  };
}

async function mails() {
  const response = await fetch(`http://127.0.0.1:${mailbox.page.port}/messages`);
  return received.parse(await response.json());
}

async function startWorker(smtpPort: number): Promise<void> {
  runner = await startJobs({
    DATABASE_URL: databaseUrl(),
    SMTP_URL: `smtp://127.0.0.1:${smtpPort}`,
    MAIL_FROM: 'Trymark <trymark@school.test>',
  });
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'trymark-mail-'));
  mailbox = await startMailbox({ smtpPort: 0, pagePort: 0, folder });
});

afterAll(async () => {
  await runner?.stop();
  await Promise.all([mailbox.smtp.close(), mailbox.page.close()]);
  await rm(folder, { recursive: true });
});

test('a mail queued in a transaction that is rolled back is never sent', async () => {
  const app = databaseAs('trymark_app');
  await expect(
    app.transaction(async (tx) => {
      await queueMail(tx, order('lost@school.test'));
      throw new Error('the cause of the mail failed');
    }),
  ).rejects.toThrow('the cause of the mail failed');
  const [row] = await ownerSql()`select count(*)::int as jobs from graphile_worker.jobs`;
  expect(row?.jobs).toBe(0);
});

test.each(['trymark_app', 'trymark_auth'] as const)('%s queues a mail in its transaction', async (role) => {
  await databaseAs(role).transaction((tx) => queueMail(tx, order(`${role.replace('_', '.')}@school.test`)));
  const [row] =
    await ownerSql()`select task_identifier, max_attempts from graphile_worker.jobs order by id desc limit 1`;
  expect(row).toEqual({ task_identifier: MAIL_TASK, max_attempts: 12 });
});

test('the product cannot read the queue, where links wait', async () => {
  const app = databaseAs('trymark_app');
  await expect(app.execute('select * from graphile_worker.jobs')).rejects.toThrow();
});

test('a queued mail arrives as HTML and as text with its link, and leaves the queue', async () => {
  await startWorker(mailbox.smtp.port);
  await vi.waitFor(async () => expect(await mails()).toHaveLength(2), { timeout: 10_000 });
  const mail = (await mails()).find(({ to }) => to.includes('trymark.app@school.test'));
  expect(mail?.subject).toBe('Choose a new password');
  expect(mail?.text).toContain(LINK);
  expect(mail?.text).toContain('Cedar Fork <High>');
  expect(mail?.html).toContain(`href="${LINK}"`);
  expect(mail?.html).toContain('Cedar Fork &lt;High&gt;');
  await vi.waitFor(async () => {
    const [row] = await ownerSql()`select count(*)::int as jobs from graphile_worker.jobs`;
    expect(row?.jobs).toBe(0);
  });
});

test('a mail that the provider does not take stays queued, to be tried again', async () => {
  await runner?.stop();
  const closed = await startMailbox({ smtpPort: 0, pagePort: 0, folder });
  await Promise.all([closed.smtp.close(), closed.page.close()]);
  await databaseAs('trymark_app').transaction((tx) => queueMail(tx, order('later@school.test')));
  await startWorker(closed.smtp.port);
  await vi.waitFor(
    async () => {
      const [job] =
        await ownerSql()`select attempts, last_error, run_at > now() as later from graphile_worker.jobs`;
      expect(job).toMatchObject({ attempts: 1, later: true });
      expect(job?.last_error).toContain('ECONNREFUSED');
    },
    { timeout: 10_000 },
  );
});
