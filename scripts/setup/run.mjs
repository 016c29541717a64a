import { spawn } from 'node:child_process';
import { root } from './places.mjs';

const active = new Set();
process.once('exit', () => {
  for (const child of active) child.kill('SIGTERM');
});

/**
 * Runs a program to its end and gives back what it wrote; `show` lets it write to the terminal instead,
 * `showErrors` only what it writes as errors.
 * @param {string} command
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, show?: boolean, showErrors?: boolean }} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function tryRun(
  command,
  args,
  { cwd = root, env = process.env, show = false, showErrors = show } = {},
) {
  return new Promise((resolve, reject) => {
    const stdio = ['ignore', show ? 'inherit' : 'pipe', showErrors ? 'inherit' : 'pipe'];
    const child = spawn(command, args, { cwd, env, stdio });
    active.add(child);
    let output = '';
    const keep = (chunk) => {
      output += chunk;
    };
    child.stdout?.on('data', keep);
    child.stderr?.on('data', keep);
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
