import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureDataFolder } from './places.mjs';

const names = ['appSecret', 's3AccessKeyId', 's3SecretAccessKey'];

/** Secrets of this checkout, made at first use and readable by their owner alone. */
export function localSecrets() {
  const file = join(ensureDataFolder(), 'secrets.json');
  const kept = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : {};
  const missing = names.filter((name) => typeof kept[name] !== 'string');
  if (missing.length === 0) return kept;
  for (const name of missing) kept[name] = randomBytes(32).toString('hex');
  writeFileSync(file, `${JSON.stringify(kept, null, 2)}\n`, { mode: 0o600 });
  chmodSync(file, 0o600);
  return kept;
}
