import { openCluster } from './setup/cluster.mjs';
import { runCommand } from './setup/command.mjs';
import { baseEnv, wantedPort } from './setup/own-station.mjs';
import { ensureNodeModules, ensurePostgres } from './setup/packages.mjs';
import { SetupError, say } from './setup/say.mjs';
import { ensureDatabase, prepareDatabase } from './setup/station.mjs';

/** `migrate` brings DATABASE_URL, or our own database, up to date; `seed` also loads the demo, into our own alone. */
await runCommand(async (crew) => {
  const [task] = process.argv.slice(2);
  if (task !== 'migrate' && task !== 'seed') throw new SetupError('Say "migrate" or "seed".');
  const given = process.env.DATABASE_URL;
  if (given && task === 'seed') {
    throw new SetupError(
      'DATABASE_URL is set, and the demo is loaded only into the database that npm start makes.',
    );
  }
  await ensureNodeModules();
  const env = { ...baseEnv(wantedPort()), DATABASE_URL: given || (await ownDatabase(crew)) };
  const ready = await prepareDatabase(env, { demo: task === 'seed' });
  if (ready) say(ready);
  say('The database is up to date.');
});

async function ownDatabase(crew) {
  await ensurePostgres();
  const cluster = await openCluster({ name: 'start' });
  if (!cluster.wasRunning) crew.afterwards(() => cluster.stop());
  return ensureDatabase(cluster);
}
