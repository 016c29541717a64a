import { setTimeout as wait } from 'node:timers/promises';
import { markInUse } from './build.mjs';
import { freePort, freePortForRun } from './places.mjs';
import { tryRun, typescriptCommand, typescriptEnv } from './run.mjs';
import { SetupError } from './say.mjs';
import { localSecrets } from './secrets.mjs';

const NEXT = 'node_modules/next/dist/bin/next';
const ANSWER_WITHIN_MS = 60_000;

/** Makes the database `trymark` of a cluster if it is not there. */
export async function ensureDatabase(cluster, name = 'trymark') {
  const { default: postgres } = await import('postgres');
  const server = postgres(cluster.url('postgres'), { max: 1, onnotice: () => {} });
  try {
    const found = await server`select 1 from pg_database where datname = ${name}`;
    if (found.length === 0) await server`create database ${server(name)}`;
  } finally {
    await server.end();
  }
  return cluster.url(name);
}

/** Starts the stand-ins for the hosted services; gives back the settings by which the product reaches them. */
export async function startServices(crew, { folder, fleeting = false }) {
  const secrets = localSecrets();
  const next = fleeting ? freePortForRun : freePort;
  const [smtp, mailbox, s3] = [await next(), await next(), await next()];
  const settings = {
    SMTP_URL: `smtp://127.0.0.1:${smtp}`,
    MAIL_FROM: 'Trymark <trymark@school.test>',
    MAILBOX_URL: `http://127.0.0.1:${mailbox}`,
    S3_ENDPOINT: `http://127.0.0.1:${s3}`,
    S3_REGION: 'us-east-1',
    S3_BUCKET: 'trymark',
    S3_ACCESS_KEY_ID: secrets.s3AccessKeyId,
    S3_SECRET_ACCESS_KEY: secrets.s3SecretAccessKey,
  };
  const member = crew.start('services', typescriptCommand('scripts/services/run.ts'), {
    env: typescriptEnv({
      ...process.env,
      ...settings,
      SERVICES_FOLDER: folder,
      SERVICES_SMTP_PORT: String(smtp),
      SERVICES_MAILBOX_PORT: String(mailbox),
      SERVICES_S3_PORT: String(s3),
    }),
  });
  return { settings, ready: crew.ready(member) };
}

/** Brings the database up to date; gives back the demo's accounts, or the link that makes the first school, as text. */
export async function prepareDatabase(env, { demo }) {
  const { code, output } = await tryRun(process.execPath, typescriptCommand('scripts/prepare.ts'), {
    env: typescriptEnv({ ...env, TRYMARK_DEMO: demo ? 'yes' : 'no' }),
    showErrors: true,
  });
  if (code !== 0) throw new SetupError('The database could not be made ready; the reason stands above.');
  return output.trimEnd();
}

/** Starts the server and the worker, and waits until the product answers. */
export async function serve(crew, { env, port, build, show = true }) {
  const serverEnv = { ...env, PORT: String(port), NEXT_TELEMETRY_DISABLED: '1' };
  const mode = build
    ? { command: 'start', NODE_ENV: 'production', NEXT_DIST_DIR: build }
    : { command: 'dev', NODE_ENV: 'development' };
  const { command, ...modeEnv } = mode;
  if (build) markInUse(build);
  const worker = crew.start('worker', typescriptCommand('scripts/worker.ts'), {
    env: typescriptEnv(serverEnv),
    show,
  });
  const server = crew.start('server', [NEXT, command, '-H', '127.0.0.1', '-p', String(port)], {
    env: { ...serverEnv, ...modeEnv },
    show,
  });
  await Promise.all([crew.ready(worker), answers(`http://127.0.0.1:${port}/api/health`, server)]);
}

async function answers(url, server) {
  const until = Date.now() + ANSWER_WITHIN_MS;
  while (Date.now() < until) {
    if (server.ended) throw new SetupError(`The server ended before it answered.\n${server.output}`);
    const response = await fetch(url, { signal: AbortSignal.timeout(10_000) }).catch(() => undefined);
    if (response?.ok) return;
    await wait(100);
  }
  throw new SetupError(
    `The server did not answer at ${url} within ${ANSWER_WITHIN_MS / 1000} s.\n${server.output}`,
  );
}
