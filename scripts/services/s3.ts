import { createHash } from 'node:crypto';
import { mkdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { join } from 'node:path';
import { z } from 'zod';
import { type Listening, listen, readBody } from './http';
import { type Keys, verifySignature } from './s3-signature';

export interface S3Options extends Keys {
  port: number;
  folder: string;
  bucket: string;
}

const kept = z.object({ contentType: z.string(), etag: z.string(), modified: z.string() });

/** A stand-in for S3 on loopback: one bucket on disk, path-style addresses, and every request's signature verified. */
export async function startS3(options: S3Options): Promise<Listening> {
  await mkdir(options.folder, { recursive: true });
  const server = createServer((request, response) => {
    serve(request, response, options).catch((error: unknown) => {
      refuse(response, 500, 'InternalError', error instanceof Error ? error.message : String(error));
    });
  });
  return listen(server, options.port);
}

async function serve(request: IncomingMessage, response: ServerResponse, options: S3Options): Promise<void> {
  allowBrowsers(response);
  const { method = 'GET', url = '/' } = request;
  if (method === 'OPTIONS') return void response.writeHead(204).end();
  const body = await readBody(request);
  const headers = Object.fromEntries(
    Object.entries(request.headers).map(([name, value]) => [
      name,
      Array.isArray(value) ? value.join(',') : value,
    ]),
  );
  const verdict = verifySignature({ method, url, headers, body }, options);
  if (!verdict.ok)
    return refuse(response, verdict.code === 'NotImplemented' ? 501 : 403, verdict.code, verdict.message);
  const { pathname, searchParams } = new URL(url, 'http://host');
  const [, bucket = '', ...parts] = pathname.split('/').map(decodeURIComponent);
  const key = parts.join('/');
  if (bucket !== options.bucket)
    return refuse(response, 404, 'NoSuchBucket', `There is no bucket "${bucket}".`);
  if (!key) return refuse(response, 501, 'NotImplemented', 'Only single objects are kept here.');
  const file = join(options.folder, createHash('sha256').update(key).digest('hex'));
  switch (method) {
    case 'PUT':
      return put(response, file, body, headers['content-type'] ?? 'application/octet-stream');
    case 'GET':
    case 'HEAD':
      return get(response, file, method === 'HEAD', searchParams);
    case 'DELETE':
      await Promise.all([rm(file, { force: true }), rm(`${file}.json`, { force: true })]);
      return void response.writeHead(204).end();
    default:
      return refuse(response, 405, 'MethodNotAllowed', `${method} is not answered here.`);
  }
}

async function put(response: ServerResponse, file: string, body: Buffer, contentType: string): Promise<void> {
  const etag = `"${createHash('md5').update(body).digest('hex')}"`;
  const about = { contentType, etag, modified: new Date().toUTCString() };
  await writeFile(`${file}.json`, JSON.stringify(about));
  await writeFile(`${file}.part`, body);
  await rename(`${file}.part`, file);
  response.writeHead(200, { etag }).end();
}

async function get(
  response: ServerResponse,
  file: string,
  head: boolean,
  query: URLSearchParams,
): Promise<void> {
  const [body, about] = await Promise.all([readFile(file), readFile(`${file}.json`, 'utf8')]).catch(() => []);
  if (!body || !about) return refuse(response, 404, 'NoSuchKey', 'There is no such object.');
  const { contentType, etag, modified } = kept.parse(JSON.parse(about));
  const disposition = query.get('response-content-disposition');
  response.writeHead(200, {
    'content-type': query.get('response-content-type') ?? contentType,
    'content-length': body.length,
    'last-modified': modified,
    etag,
    ...(disposition ? { 'content-disposition': disposition } : {}),
  });
  response.end(head ? undefined : body);
}

function allowBrowsers(response: ServerResponse): void {
  response.setHeader('access-control-allow-origin', '*');
  response.setHeader('access-control-allow-methods', 'GET, HEAD, PUT');
  response.setHeader('access-control-allow-headers', '*');
}

function refuse(response: ServerResponse, status: number, code: string, message: string): void {
  const xml = `<?xml version="1.0" encoding="UTF-8"?>\n<Error><Code>${code}</Code><Message>${message.replaceAll(/[<&]/g, ' ')}</Message></Error>`;
  response.writeHead(status, { 'content-type': 'application/xml' }).end(xml);
}
