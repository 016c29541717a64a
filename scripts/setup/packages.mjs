import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './places.mjs';
import { tryRun } from './run.mjs';
import { SetupError, say } from './say.mjs';

const isRoot = process.getuid?.() === 0;

/** The folder with PostgreSQL's server programs, the newest first; undefined when none is installed. */
export function postgresPrograms(version) {
  const debian = '/usr/lib/postgresql';
  const versions = existsSync(debian) ? readdirSync(debian).sort((a, b) => Number(b) - Number(a)) : [];
  const folders = [
    ...versions.map((name) => join(debian, name, 'bin')),
    ...(process.env.PATH ?? '').split(':').filter(Boolean),
  ];
  const complete = folders.filter((folder) =>
    ['postgres', 'initdb', 'pg_ctl'].every((name) => existsSync(join(folder, name))),
  );
  return version ? complete.find((folder) => folder === join(debian, version, 'bin')) : complete[0];
}

export const chromiumPath = '/usr/bin/chromium';

async function asRoot(command, args) {
  const options = { env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } };
  if (isRoot) return tryRun(command, args, options);
  return tryRun('sudo', ['DEBIAN_FRONTEND=noninteractive', command, ...args], options);
}

function refuseUnlessInstallable(name) {
  if (existsSync('/usr/bin/apt-get') && (isRoot || existsSync('/usr/bin/sudo'))) return;
  throw new SetupError(
    `Debian's package "${name}" is missing and cannot be installed from here. Install it as root: apt-get install ${name}`,
  );
}

async function installDebian(name) {
  refuseUnlessInstallable(name);
  say(`Installing Debian's package "${name}" (once) ...`);
  const update = await asRoot('apt-get', ['update', '-q']);
  const install = await asRoot('apt-get', ['install', '-y', '-q', '--no-install-recommends', name]);
  if (install.code !== 0) {
    throw new SetupError(`apt-get could not install "${name}":\n${update.output}${install.output}`);
  }
}

/** PostgreSQL's programs; Debian's own cluster on port 5432 is not made, for nothing here uses it. */
export async function ensurePostgres() {
  if (postgresPrograms()) return;
  refuseUnlessInstallable('postgresql');
  const folder = '/etc/postgresql-common/createcluster.d';
  const file = `${folder}/trymark.conf`;
  await asRoot('sh', ['-c', `mkdir -p ${folder} && echo create_main_cluster = false > ${file}`]);
  try {
    await installDebian('postgresql');
  } finally {
    await asRoot('rm', ['-f', file]);
  }
}

export async function ensureChromium() {
  if (!existsSync(chromiumPath)) await installDebian('chromium');
}

/** node_modules as the lock file has it; installed again only when a version differs. */
export async function ensureNodeModules() {
  if (installedAsLocked()) return;
  say('Installing the npm packages of the lock file ...');
  const { code, output } = await tryRun('npm', ['ci', '--include=dev', '--no-audit', '--no-fund']);
  if (code !== 0) throw new SetupError(`npm ci failed:\n${output}`);
}

function installedAsLocked() {
  const record = join(root, 'node_modules/.package-lock.json');
  if (!existsSync(record)) return false;
  const installed = JSON.parse(readFileSync(record, 'utf8')).packages;
  const locked = JSON.parse(readFileSync(join(root, 'package-lock.json'), 'utf8')).packages;
  return Object.entries(locked).every(
    ([path, { version, optional }]) =>
      path === '' || installed[path]?.version === version || (optional && !installed[path]),
  );
}
