import { createHash } from 'node:crypto';
import {
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  utimesSync,
  writeFileSync,
} from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { dataFolder, ensureDataFolder, root } from './places.mjs';
import { tryRun } from './run.mjs';
import { SetupError, say } from './say.mjs';

/** All that a build is made from; tests and scripts are not. */
const SOURCES = [
  ...['app', 'components', 'db', 'lib', 'public', 'proxy.ts', 'instrumentation.ts', 'next.config.mjs'],
  ...['package.json', 'package-lock.json', 'tsconfig.json', 'tailwind.config.ts', 'postcss.config.mjs'],
];
const KEPT_BUILDS = 3;

function filesUnder(path) {
  if (!existsSync(join(root, path))) return [];
  if (statSync(join(root, path)).isFile()) return [path];
  return readdirSync(join(root, path))
    .sort()
    .flatMap((name) => filesUnder(join(path, name)));
}

function sourcesId() {
  const hash = createHash('sha256');
  for (const path of SOURCES.flatMap(filesUnder)) {
    hash
      .update(`${path}\0`)
      .update(readFileSync(join(root, path)))
      .update('\0');
  }
  return hash.digest('hex').slice(0, 16);
}

/** Waits while another command makes the same build; true when this one has the right to make it. */
async function claim(lock) {
  for (;;) {
    try {
      writeFileSync(lock, String(process.pid), { flag: 'wx' });
      return;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
    }
    const holder = existsSync(lock) ? readFileSync(lock, 'utf8') : '';
    if (holder && !existsSync(`/proc/${holder}`)) rmSync(lock, { force: true });
    else await wait(250);
  }
}

/**
 * The production build of the sources as they are, made only if there is none; commands side by side share it.
 * Gives back its folder as next.config.mjs wants it, relative to the project.
 */
export async function ensureBuild() {
  const id = sourcesId();
  const folder = join('.data', 'builds', id);
  const finished = join(root, folder, 'finished');
  ensureDataFolder('builds');
  const lock = join(dataFolder, 'builds', `${id}.lock`);
  await claim(lock);
  try {
    if (existsSync(finished)) {
      const now = new Date();
      utimesSync(finished, now, now);
      return folder;
    }
    await build(id, folder);
    writeFileSync(finished, '');
  } finally {
    rmSync(lock, { force: true });
  }
  clearOldBuilds();
  return folder;
}

async function build(id, folder) {
  say('Building the product for production ...');
  rmSync(join(root, folder), { recursive: true, force: true });
  mkdirSync(join(root, folder), { recursive: true });
  // A configuration that extends another one is left alone by Next, so the project's own stays as it is.
  const settings = join('.data', 'builds', `${id}.tsconfig.json`);
  const exclude = ['node_modules', '.data', 'tests', 'e2e', 'scripts'].map((name) => `../../${name}`);
  writeFileSync(join(root, settings), JSON.stringify({ extends: '../../tsconfig.json', exclude }));
  const generated = join(root, 'next-env.d.ts');
  const before = existsSync(generated) ? readFileSync(generated) : undefined;
  const { code, output } = await tryRun(process.execPath, ['node_modules/next/dist/bin/next', 'build'], {
    env: buildEnv(folder, settings),
  });
  if (before) writeFileSync(generated, before);
  else rmSync(generated, { force: true });
  rmSync(join(root, settings), { force: true });
  if (code === 0) return;
  rmSync(join(root, folder), { recursive: true, force: true });
  throw new SetupError(`The build failed:\n${output}`);
}

/** A build reads no settings, so that the same sources give the same build whoever makes it. */
function buildEnv(folder, settings) {
  const { PATH, HOME, LANG, CI } = process.env;
  return {
    ...{ PATH, HOME, LANG, CI },
    NODE_ENV: 'production',
    NEXT_TELEMETRY_DISABLED: '1',
    NEXT_DIST_DIR: folder,
    NEXT_TSCONFIG: settings,
  };
}

function clearOldBuilds() {
  const parent = join(dataFolder, 'builds');
  const builds = readdirSync(parent)
    .map((name) => join(parent, name))
    .filter((path) => statSync(path).isDirectory() && existsSync(join(path, 'finished')))
    .sort((a, b) => statSync(join(b, 'finished')).mtimeMs - statSync(join(a, 'finished')).mtimeMs);
  for (const path of builds.slice(KEPT_BUILDS))
    if (!inUse(path)) rmSync(path, { recursive: true, force: true });
}

/** A server marks the build it runs with its process id. */
function inUse(path) {
  return readdirSync(path).some(
    (name) => name.startsWith('used-by-') && existsSync(`/proc/${name.slice(8)}`),
  );
}

export function markInUse(folder) {
  writeFileSync(join(root, folder, `used-by-${process.pid}`), '');
}
