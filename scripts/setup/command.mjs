import { Crew } from './crew.mjs';
import { reportFailure } from './say.mjs';

/** Runs a command of the project; whatever it started ends with it, also when it fails or is interrupted. */
export async function runCommand(work) {
  const crew = new Crew();
  crew.endOnSignals();
  try {
    const code = await work(crew);
    if (code === 'goes on') return;
    await crew.end();
    process.exit(code ?? 0);
  } catch (error) {
    if (crew.isEnding) return;
    reportFailure(error);
    await crew.end();
    process.exit(1);
  }
}
