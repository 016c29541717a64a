import { join } from 'node:path';
import { openCluster, openFleetingCluster } from './cluster.mjs';
import { ensureNodeModules, ensurePostgres } from './packages.mjs';
import { ensureDataFolder, portIsFree } from './places.mjs';
import { forgetRunning, noteRunning, runningNow } from './running.mjs';
import { SetupError, say } from './say.mjs';
import { localSecrets } from './secrets.mjs';
import { ensureDatabase, startServices } from './station.mjs';

/** Settings that hold wherever the database is: the address, and the secret of this checkout unless one is given. */
export function baseEnv(port) {
  return {
    ...process.env,
    APP_URL: process.env.APP_URL || `http://127.0.0.1:${port}`,
    APP_SECRET: process.env.APP_SECRET || localSecrets().appSecret,
  };
}

/** A cluster of this checkout's own and the stand-ins for the hosted services, with the settings to reach them. */
export async function openOwnStation(crew, { name, port, fleeting = false }) {
  await ensurePostgres();
  await ensureNodeModules();
  const cluster = fleeting ? await openFleetingCluster(name) : await openCluster({ name });
  crew.afterwards(() => (fleeting ? cluster.remove() : cluster.stop()));
  if (!fleeting) {
    say(
      `PostgreSQL ${cluster.wasRunning ? 'runs already' : 'started'} on 127.0.0.1:${cluster.port}, its data in ${cluster.folder}`,
    );
  }
  const folder = fleeting ? join(cluster.folder, 'services') : ensureDataFolder('services', name);
  const { settings, ready } = await startServices(crew, { folder, fleeting });
  const [databaseUrl] = await Promise.all([ensureDatabase(cluster), ready]);
  return {
    cluster,
    env: { ...baseEnv(port), ...settings, APP_URL: `http://127.0.0.1:${port}`, DATABASE_URL: databaseUrl },
  };
}

/** Notes that this command runs; when it does already, says where and gives back false. */
export async function claimStation(crew, { name, port, what }) {
  const now = runningNow(name);
  if (now) {
    say(`${what} runs already at ${now.url} (process ${now.pid}). Nothing was changed.`);
    return false;
  }
  if (!(await portIsFree(port))) {
    throw new SetupError(
      `Port ${port} is taken by another program. Choose another: PORT=${port + 1} npm start`,
    );
  }
  noteRunning(name, { url: `http://127.0.0.1:${port}` });
  crew.afterwards(() => forgetRunning(name));
  return true;
}

/** The port that the product is to be served on. */
export function wantedPort() {
  const port = Number(process.env.PORT || 3000);
  if (Number.isInteger(port) && port >= 1 && port <= 65_535) return port;
  throw new SetupError(`PORT must be a number from 1 to 65535, not "${process.env.PORT}".`);
}
