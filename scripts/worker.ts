import { setTimeout as wait } from 'node:timers/promises';
import { Logger, type Runner, run } from 'graphile-worker';
import { Pool } from 'pg';
import { parseEnv } from '@/lib/env';
import { log } from '@/lib/log';
import { MAIL_TASK } from '@/lib/mail/queue-mail';
import { makeMailTask } from '@/lib/mail/send-mail';

const LONGEST_WAIT_MS = 15_000;

const env = parseEnv(process.env);
const mailTask = makeMailTask(env);
const taskList = { [MAIL_TASK]: mailTask };

/** The queue's own words go to the log; routine ones only when it is asked for them. */
const logger = new Logger((scope) => (level, message) => {
  const known = level === 'warning' ? 'warn' : level === 'info' ? 'debug' : level;
  log[known]({ ...scope }, message);
});

let ending = false;
let runner: Runner | undefined;

async function startRunner(): Promise<Runner> {
  const pool = new Pool({ connectionString: env.DATABASE_URL, options: '-c role=trymark_worker', max: 4 });
  pool.on('error', (error) =>
    log.warn({ code: 'code' in error ? error.code : undefined }, 'The database went away.'),
  );
  const started = await run({
    pgPool: pool,
    taskList,
    logger,
    concurrency: 2,
    noHandleSignals: true,
    pollInterval: 2000,
  });
  started.events.once('stop', () => void pool.end());
  return started;
}

/** Runs jobs until the process is ended; a database that is away is waited for, however long. */
async function work(): Promise<void> {
  for (let pause = 500; !ending; pause = Math.min(pause * 2, LONGEST_WAIT_MS)) {
    try {
      runner = await startRunner();
      process.send?.('ready');
      pause = 500;
      await runner.promise;
    } catch (error) {
      log.warn(
        { reason: error instanceof Error ? error.message : String(error) },
        'The job queue cannot be read; trying again.',
      );
    }
    if (!ending) await wait(pause);
  }
}

process.once('SIGTERM', () => {
  ending = true;
  void Promise.resolve(runner?.stop())
    .catch(() => {})
    .then(() => process.exit(0));
});

await work();
