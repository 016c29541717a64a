import { runCommand } from './setup/command.mjs';
import { ensureChromium, ensureNodeModules, ensurePostgres } from './setup/packages.mjs';
import { SetupError, say } from './setup/say.mjs';
import { checks } from './testing/checks.mjs';
import { runJourneys, runVitest } from './testing/suites.mjs';

/** Runs every check and test, or one part: `node scripts/test.mjs [unit | integration | e2e] [arguments of its runner]`. */
await runCommand(async (crew) => {
  const [part, ...args] = process.argv.slice(2);
  const parts = {
    unit: { name: 'unit', run: () => runVitest('unit', args) },
    integration: { name: 'integration', run: () => runVitest('integration', args) },
    e2e: { name: 'end to end', run: () => runJourneys(crew, args) },
  };
  if (part && !(part in parts))
    throw new SetupError(`There is no part "${part}"; there are ${Object.keys(parts).join(', ')}.`);
  await ensureNodeModules();
  if (part !== 'unit') await ensurePostgres();
  if (!part || part === 'e2e') await ensureChromium();
  const total = await runAll(part ? [parts[part]] : [...checks, ...Object.values(parts)]);
  await crew.end();
  const skipped = total.skipped ? `, ${total.skipped} skipped` : '';
  say(`${total.passed} passed, ${total.failed} failed${skipped}`);
  return total.failed === 0 ? 0 : 1;
});

/** Runs one after the other; what passes is one line, what fails shows all that it wrote. */
async function runAll(suites) {
  const total = { passed: 0, failed: 0, skipped: 0 };
  for (const { name, run } of suites) {
    const began = Date.now();
    const result = await run().catch((error) => ({
      passed: 0,
      failed: 1,
      skipped: 0,
      output: error.message,
    }));
    for (const count of Object.keys(total)) total[count] += result[count];
    if (result.failed > 0) say(`\n${result.output.trimEnd()}\n`);
    const seconds = ((Date.now() - began) / 1000).toFixed(1);
    say(`${name.padEnd(16)} ${result.passed} passed, ${result.failed} failed in ${seconds} s`);
  }
  return total;
}
