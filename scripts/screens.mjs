import { ensureBuild } from './setup/build.mjs';
import { chromiumLaunch } from './setup/chromium.mjs';
import { runCommand } from './setup/command.mjs';
import { openOwnStation } from './setup/own-station.mjs';
import { ensureChromium, ensureNodeModules } from './setup/packages.mjs';
import { ensureDataFolder, freePortForRun } from './setup/places.mjs';
import { tryRun, typescriptCommand, typescriptEnv } from './setup/run.mjs';
import { prepareDatabase, serve } from './setup/station.mjs';

/** Pictures of every screen of every role on the demo, served by a production build of its own. */
await runCommand(async (crew) => {
  await ensureNodeModules();
  await ensureChromium();
  const build = await ensureBuild();
  const port = await freePortForRun();
  const { env } = await openOwnStation(crew, { name: 'screens', port, fleeting: true });
  await prepareDatabase(env, { demo: true });
  await serve(crew, { env, port, build, show: false });
  const { code } = await tryRun(
    process.execPath,
    typescriptCommand('scripts/screens/take.ts', process.argv.slice(2)),
    {
      env: typescriptEnv({
        ...env,
        SCREENS_FOLDER: ensureDataFolder('screens'),
        SCREENS_LAUNCH: JSON.stringify(chromiumLaunch),
      }),
      show: true,
    },
  );
  return code;
});
