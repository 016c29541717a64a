import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './setup/command.mjs';
import { ensureNodeModules } from './setup/packages.mjs';
import { root } from './setup/places.mjs';
import { tryRun, typescriptCommand, typescriptEnv } from './setup/run.mjs';
import { say } from './setup/say.mjs';

/** Runs every measurement of scripts/bench, or those whose names are given. */
await runCommand(async () => {
  await ensureNodeModules();
  const wanted = process.argv.slice(2);
  const names = readdirSync(join(root, 'scripts/bench'))
    .filter((name) => name.endsWith('.ts'))
    .map((name) => name.slice(0, -3));
  let failed = 0;
  for (const name of names.filter((each) => wanted.length === 0 || wanted.includes(each))) {
    say(`${name}`);
    const { code } = await tryRun(process.execPath, typescriptCommand(`scripts/bench/${name}.ts`), {
      env: typescriptEnv({ ...process.env, NODE_ENV: 'production' }),
      show: true,
    });
    if (code !== 0) failed += 1;
  }
  return failed === 0 ? 0 : 1;
});
