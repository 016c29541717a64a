import { createHash } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
export const dataFolder = join(root, '.data');

/** Tells this checkout from others on the same machine. */
export const checkoutId = createHash('sha256').update(root).digest('hex').slice(0, 10);

export function ensureDataFolder(...parts) {
  const folder = join(dataFolder, ...parts);
  mkdirSync(folder, { recursive: true });
  return folder;
}

/** Where this checkout looks for a free port first: below the range that outgoing connections use. */
const firstPort = 20_000 + (Number.parseInt(checkoutId.slice(0, 6), 16) % 11_000);

export function portIsFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ host: '127.0.0.1', port, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

const taken = new Set();

/** A free loopback port; the same checkout gets the same ones again while nobody else has them. */
export async function freePort(from = firstPort) {
  for (let port = from; port < from + 1000; port += 1) {
    if (taken.has(port) || !(await portIsFree(port))) continue;
    taken.add(port);
    return port;
  }
  throw new Error(`No free port between ${from} and ${from + 1000}`);
}

/** A port for a short-lived run, spread so that runs side by side do not reach for the same one. */
export function freePortForRun() {
  return freePort(firstPort + 1000 + (process.pid % 40) * 20);
}
