import { randomUUID } from 'node:crypto';
import { mkdir, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { join } from 'node:path';
import { type AddressObject, simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { z } from 'zod';
import { type Listening, listen } from './http';
import { listPage, mailPage } from './mailbox-page';

const keptMail = z.object({
  id: z.string(),
  at: z.string(),
  from: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  text: z.string(),
  html: z.string(),
});

export type KeptMail = z.output<typeof keptMail>;

export interface MailboxOptions {
  smtpPort: number;
  pagePort: number;
  folder: string;
}

/** A stand-in for a mail provider: takes any mail by SMTP on loopback and shows it on a page, newest first. */
export async function startMailbox(options: MailboxOptions): Promise<{ smtp: Listening; page: Listening }> {
  await mkdir(options.folder, { recursive: true, mode: 0o700 });
  const mails = await readKept(options.folder);
  const keep = async (mail: KeptMail) => {
    mails.unshift(mail);
    await writeFile(join(options.folder, `${mail.id}.json`), JSON.stringify(mail), { mode: 0o600 });
  };
  const server = createServer((request, response) => {
    answer(request, response, mails, options.folder).catch(() => response.writeHead(500).end());
  });
  return { smtp: await listenSmtp(options.smtpPort, keep), page: await listen(server, options.pagePort) };
}

async function readKept(folder: string): Promise<KeptMail[]> {
  const names = (await readdir(folder)).filter((name) => name.endsWith('.json'));
  const mails = await Promise.all(
    names.map(async (name) => keptMail.parse(JSON.parse(await readFile(join(folder, name), 'utf8')))),
  );
  return mails.sort((a, b) => b.at.localeCompare(a.at));
}

async function listenSmtp(port: number, keep: (mail: KeptMail) => Promise<void>): Promise<Listening> {
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData: (stream, _session, done) => {
      simpleParser(stream)
        .then((parsed) =>
          keep({
            id: randomUUID(),
            at: new Date().toISOString(),
            from: parsed.from?.text ?? '',
            to: addresses(parsed.to),
            subject: parsed.subject ?? '(no subject)',
            text: parsed.text ?? '',
            html: parsed.html || '',
          }),
        )
        .then(() => done(), done);
    },
  });
  await new Promise<void>((resolve, reject) => {
    smtp.once('error', reject);
    smtp.listen(port, '127.0.0.1', resolve);
  });
  const address = smtp.server.address();
  return {
    port: typeof address === 'object' && address ? address.port : port,
    close: () => new Promise((resolve) => smtp.close(() => resolve())),
  };
}

function addresses(to: AddressObject | AddressObject[] | undefined): string[] {
  const all = to === undefined ? [] : Array.isArray(to) ? to : [to];
  return all.flatMap(({ value }) => value.flatMap(({ address }) => (address ? [address] : [])));
}

async function answer(
  request: IncomingMessage,
  response: ServerResponse,
  mails: KeptMail[],
  folder: string,
): Promise<void> {
  const { pathname } = new URL(request.url ?? '/', 'http://host');
  if (request.method === 'DELETE' || (request.method === 'POST' && pathname === '/delete')) {
    const gone = mails.splice(0);
    await Promise.all(gone.map(({ id }) => rm(join(folder, `${id}.json`), { force: true })));
    return void response.writeHead(request.method === 'POST' ? 303 : 204, { location: '/' }).end();
  }
  if (pathname === '/messages') {
    return void response.writeHead(200, { 'content-type': 'application/json' }).end(JSON.stringify(mails));
  }
  const mail = mails.find(({ id }) => pathname === `/mail/${id}`);
  if (!mail && pathname !== '/') return void response.writeHead(404).end('No such mail');
  response.writeHead(200, {
    'content-type': 'text/html; charset=utf-8',
    'content-security-policy':
      "default-src 'none'; style-src 'unsafe-inline'; img-src data:; form-action 'self'",
    'referrer-policy': 'no-referrer',
  });
  response.end(mail ? mailPage(mail) : listPage(mails));
}
