import { setTimeout as wait } from 'node:timers/promises';
import type { Runner } from 'graphile-worker';
import { parseEnv } from '@/lib/env';
import { log } from '@/lib/log';
import { startJobs } from './job-runner';

const LONGEST_WAIT_MS = 15_000;

let ending = false;
let runner: Runner | undefined;

/** Runs jobs until the process is ended; a database that is away is waited for, however long. */
async function work(): Promise<void> {
  const env = parseEnv(process.env);
  for (let pause = 500; !ending; pause = Math.min(pause * 2, LONGEST_WAIT_MS)) {
    try {
      runner = await startJobs(env);
      process.send?.('ready');
      pause = 500;
      await runner.promise;
    } catch (error) {
      const reason = error instanceof Error ? error.message : String(error);
      log.warn({ reason }, 'The job queue cannot be read; trying again.');
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
