import { tryRun } from '../setup/run.mjs';

const bin = (name) => `node_modules/.bin/${name}`;

/** What holds without running the product; each counts as one test. */
const CHECKS = [
  { name: 'lint and format', steps: [[bin('biome'), ['check', '--error-on-warnings', '.']]] },
  {
    name: 'types',
    steps: [
      [bin('next'), ['typegen']],
      [bin('tsc'), ['--noEmit']],
    ],
  },
  { name: 'dead code', steps: [[bin('knip'), ['--no-progress']]] },
];

async function runSteps(steps) {
  for (const [command, args] of steps) {
    const { code, output } = await tryRun(command, args, {
      env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1' },
    });
    if (code !== 0) return { passed: 0, failed: 1, skipped: 0, output };
  }
  return { passed: 1, failed: 0, skipped: 0, output: '' };
}

export const checks = CHECKS.map(({ name, steps }) => ({ name, run: () => runSteps(steps) }));
