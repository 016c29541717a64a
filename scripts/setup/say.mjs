/** Tells the person at the terminal what happens, one plain line at a time. */
export function say(line = '') {
  process.stdout.write(`${line}\n`);
}

/** Ends a command with what went wrong and what to do; no stack, because nothing in the program is at fault. */
export class SetupError extends Error {}

export function reportFailure(error) {
  const known = error instanceof SetupError;
  process.stderr.write(`\n${known ? error.message : (error.stack ?? error)}\n`);
}
