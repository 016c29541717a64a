import { spawn } from 'node:child_process';
import { root } from './places.mjs';

const active = new Set();
process.once('exit', () => {
  for (const child of active) child.kill('SIGTERM');
});

/**
 * Runs a program to its end. `show` lets it write to the terminal; otherwise its output is kept and given back.
 * @returns {Promise<{ code: number, output: string }>}
 */
export function tryRun(command, args, { cwd = root, env = process.env, show = false } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd,
      env,
      stdio: ['ignore', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'],
    });
    active.add(child);
    let output = '';
    child.stdout?.on('data', (chunk) => {
      output += chunk;
    });
    child.stderr?.on('data', (chunk) => {
      output += chunk;
    });
    child.once('error', reject);
    child.once('close', (code, signal) => {
      active.delete(child);
      resolve({ code: code ?? (signal ? 1 : 0), output });
    });
  });
}

/** The same, for a program that must succeed: a failure is thrown with all that it wrote. */
export async function run(command, args, options) {
  const { code, output } = await tryRun(command, args, options);
  if (code !== 0) throw new Error(`${[command, ...args].join(' ')} ended with ${code}\n${output}`);
  return output;
}

/** Arguments and environment for node to run a TypeScript script of the project. */
export function typescriptCommand(script, args = []) {
  return ['--import', 'tsx', script, ...args];
}

export function typescriptEnv(env = process.env) {
  return { ...env, TSX_TSCONFIG_PATH: `${root}/scripts/tsconfig.json` };
}
