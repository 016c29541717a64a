import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { ensureBuild } from '../setup/build.mjs';
import { openOwnStation } from '../setup/own-station.mjs';
import { ensureDataFolder, freePortForRun } from '../setup/places.mjs';
import { tryRun } from '../setup/run.mjs';
import { say } from '../setup/say.mjs';
import { prepareDatabase, serve } from '../setup/station.mjs';

const reportFile = (name) => join(ensureDataFolder('reports'), `${name}-${process.pid}.json`);

/** Counts of a runner's report; a suite that ran nothing, or broke off without a report, has failed once. */
function counted(file, code, output, read) {
  const report = existsSync(file)
    ? read(JSON.parse(readFileSync(file, 'utf8')))
    : { passed: 0, failed: 0, skipped: 0 };
  rmSync(file, { force: true });
  const ranNone = report.passed + report.failed === 0;
  const brokeOff = code !== 0 && report.failed === 0;
  if (!ranNone && !brokeOff) return { ...report, output };
  return { ...report, failed: report.failed + 1, output: ranNone ? `${output}\nNo test ran.` : output };
}

/** A vitest project; the cluster of the integration tests is made by their own set-up. */
export async function runVitest(project, args = []) {
  const file = reportFile(project);
  const { code, output } = await tryRun('node_modules/.bin/vitest', [
    ...['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${file}`],
    ...args,
  ]);
  return counted(file, code, output, ({ numPassedTests, numFailedTests, numPendingTests, numTodoTests }) => ({
    passed: numPassedTests,
    failed: numFailedTests,
    skipped: numPendingTests + numTodoTests,
  }));
}

/** Journeys in Chromium against the production build, on a database, services and ports of this run alone. */
export async function runJourneys(crew, args = []) {
  const build = await ensureBuild();
  const port = await freePortForRun();
  const { env } = await openOwnStation(crew, { name: 'e2e', port, fleeting: true });
  await prepareDatabase(env, { demo: false });
  await serve(crew, { env, port, build, show: false });
  const file = reportFile('e2e');
  const { code, output } = await tryRun(
    'node_modules/.bin/playwright',
    ['test', '--reporter=line,json', ...args],
    {
      env: {
        ...process.env,
        E2E_BASE_URL: env.APP_URL,
        E2E_MAILBOX_URL: env.MAILBOX_URL,
        DATABASE_URL: env.DATABASE_URL,
        APP_URL: env.APP_URL,
        APP_SECRET: env.APP_SECRET,
        PLAYWRIGHT_JSON_OUTPUT_NAME: file,
      },
    },
  );
  return counted(file, code, output, ({ stats }) => {
    if (stats.flaky > 0) say(`${stats.flaky} of the journeys passed only at the second try:\n${output}`);
    return { passed: stats.expected + stats.flaky, failed: stats.unexpected, skipped: stats.skipped };
  });
}
