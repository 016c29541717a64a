import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureDataFolder } from './places.mjs';

/** When a process began, in clock ticks since the machine started: with the id it names one process for good. */
function beganAt(pid) {
  const stat = `/proc/${pid}/stat`;
  return existsSync(stat) ? readFileSync(stat, 'utf8').split(') ').pop().split(' ')[19] : undefined;
}

const fileOf = (name) => join(ensureDataFolder('running'), `${name}.json`);

/** What runs under this name in this checkout now; undefined when nothing does. */
export function runningNow(name) {
  const file = fileOf(name);
  if (!existsSync(file)) return undefined;
  const noted = JSON.parse(readFileSync(file, 'utf8'));
  return beganAt(noted.pid) === noted.beganAt ? noted : undefined;
}

export function noteRunning(name, facts) {
  writeFileSync(fileOf(name), JSON.stringify({ pid: process.pid, beganAt: beganAt(process.pid), ...facts }));
}

export function forgetRunning(name) {
  rmSync(fileOf(name), { force: true });
}
