import { Logger, type Runner, run } from 'graphile-worker';
import { Pool } from 'pg';
import { log } from '@/lib/log';
import { MAIL_TASK } from '@/lib/mail/queue-mail';
import { type MailSettings, makeMailTask } from '@/lib/mail/send-mail';

export interface JobSettings extends MailSettings {
  DATABASE_URL: string;
}

/** The queue's own words go to the log; routine ones only when it is asked for them. */
const logger = new Logger((scope) => (level, message) => {
  const known = level === 'warning' ? 'warn' : level === 'info' ? 'debug' : level;
  log[known]({ ...scope }, message);
});

/** Starts running queued jobs in the worker's own role; `promise` settles when the database has gone away. */
export async function startJobs(settings: JobSettings): Promise<Runner> {
  const pgPool = new Pool({
    connectionString: settings.DATABASE_URL,
    options: '-c role=trymark_worker',
    max: 4,
  });
  const lost = (error: Error) => log.warn({ reason: error.message }, 'The database went away.');
  pgPool.on('error', lost);
  pgPool.on('connect', (client) => client.on('error', lost));
  const runner = await run({
    pgPool,
    taskList: { [MAIL_TASK]: makeMailTask(settings) },
    parsedCronItems: [],
    logger,
    concurrency: 2,
    noHandleSignals: true,
    pollInterval: 2000,
  });
  runner.events.once('stop', () => void pgPool.end());
  return runner;
}
