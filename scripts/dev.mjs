import { runCommand } from './setup/command.mjs';
import { claimStation, openOwnStation, wantedPort } from './setup/own-station.mjs';
import { say } from './setup/say.mjs';
import { prepareDatabase, serve } from './setup/station.mjs';

/** Serves the sources as they are while they are worked on, on a database of our own with the demo. */
await runCommand(async (crew) => {
  const port = wantedPort();
  if (!(await claimStation(crew, { name: 'dev', port, what: 'The development server' }))) return 0;
  const { env } = await openOwnStation(crew, { name: 'dev', port });
  const accounts = await prepareDatabase(env, { demo: true });
  await serve(crew, { env, port });
  say(`\n${accounts}\n`);
  say(`Trymark is ready for work on it:  ${env.APP_URL}`);
  say(`Mail that it sends:               ${env.MAILBOX_URL}`);
  return 'goes on';
});
