import { ensureBuild } from './setup/build.mjs';
import { runCommand } from './setup/command.mjs';
import { baseEnv, claimStation, openOwnStation, wantedPort } from './setup/own-station.mjs';
import { ensureNodeModules } from './setup/packages.mjs';
import { say } from './setup/say.mjs';
import { prepareDatabase, serve } from './setup/station.mjs';

/** Sets up what is missing and serves the product: on a database of our own with the demo, or on DATABASE_URL. */
await runCommand(async (crew) => {
  const port = wantedPort();
  const own = !process.env.DATABASE_URL;
  const name = own ? 'start' : `start-${port}`;
  if (!(await claimStation(crew, { name, port, what: 'Trymark' }))) return 0;
  const env = own ? (await openOwnStation(crew, { name, port })).env : await givenStation(port);
  const ready = await prepareDatabase(env, { demo: own });
  const build = await ensureBuild();
  await serve(crew, { env, port, build });
  say('');
  if (ready) say(`${ready}\n`);
  say(
    `Trymark is ready:         ${env.APP_URL}${env.APP_URL.endsWith(`:${port}`) ? '' : ` (here: http://127.0.0.1:${port})`}`,
  );
  if (own) say(`Mail that it sends:       ${env.MAILBOX_URL}`);
  say('Ctrl-C ends it.');
  return 'goes on';
});

async function givenStation(port) {
  await ensureNodeModules();
  const env = baseEnv(port);
  say('DATABASE_URL is set: that database is used, no demo is loaded and no stand-in services are started.');
  if (!env.SMTP_URL) say('SMTP_URL is not set: email waits in the queue and is not sent.');
  if (!env.S3_BUCKET) say('S3_BUCKET is not set: files that go out are not kept.');
  if (!process.env.APP_SECRET)
    say('APP_SECRET is not set: one of this machine is used. Several instances need the same one.');
  return env;
}
