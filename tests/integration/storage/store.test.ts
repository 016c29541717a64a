import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PutObjectCommand, S3Client } from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openStore, type StoreSettings } from '@/lib/storage/store';
import type { Listening } from '@/scripts/services/http';
import { startS3 } from '@/scripts/services/s3';

const KEYS = { accessKeyId: 'tests', secretAccessKey: 'a secret of the tests' };
const KEY = 'exports/period 3, día (1).csv';
const CSV = 'local ID,score\r\n00417,98.5\r\n';

let s3: Listening;
let folder: string;

function settings(changed: Partial<StoreSettings> = {}): StoreSettings {
  return {
    S3_ENDPOINT: `http://127.0.0.1:${s3.port}`,
    S3_REGION: 'us-east-1',
    S3_BUCKET: 'trymark',
    S3_ACCESS_KEY_ID: KEYS.accessKeyId,
    S3_SECRET_ACCESS_KEY: KEYS.secretAccessKey,
    ...changed,
  };
}

function open(changed?: Partial<StoreSettings>) {
  const store = openStore(settings(changed));
  if (!store) throw new Error('the settings name a bucket');
  return store;
}

function presignPut(contentType: string): Promise<string> {
  const client = new S3Client({
    region: 'us-east-1',
    endpoint: settings().S3_ENDPOINT ?? '',
    forcePathStyle: true,
    credentials: KEYS,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
  const command = new PutObjectCommand({ Bucket: 'trymark', Key: 'photo.png', ContentType: contentType });
  return getSignedUrl(client, command, { expiresIn: 60, signableHeaders: new Set(['content-type']) });
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'trymark-objects-'));
  s3 = await startS3({ ...KEYS, port: 0, folder, bucket: 'trymark' });
});

afterAll(async () => {
  await s3.close();
  await rm(folder, { recursive: true });
});

describe('the store', () => {
  test('gives back what was put into it, byte for byte and with its type', async () => {
    const store = open();
    await store.putObject(KEY, CSV, 'text/csv; charset=utf-8');
    const kept = await store.getObject(KEY);
    expect(Buffer.from(kept?.bytes ?? []).toString('utf8')).toBe(CSV);
    expect(kept?.contentType).toBe('text/csv; charset=utf-8');
  });

  test('has nothing under a key that was never used, or was deleted', async () => {
    const store = open();
    expect(await store.getObject('nothing')).toBeNull();
    await store.putObject('gone', 'x', 'text/plain');
    await store.deleteObject('gone');
    await store.deleteObject('gone');
    expect(await store.getObject('gone')).toBeNull();
  });

  test('makes an address that downloads one object under a name of its own', async () => {
    const store = open();
    await store.putObject(KEY, CSV, 'text/csv; charset=utf-8');
    const url = await store.presignGet(KEY, { fileName: 'Period 3.csv', expiresSeconds: 60 });
    const response = await fetch(url);
    expect(response.status).toBe(200);
    expect(await response.text()).toBe(CSV);
    expect(response.headers.get('content-disposition')).toBe("attachment; filename*=UTF-8''Period%203.csv");
  });

  test('is not there when the settings name no bucket', () => {
    expect(openStore(settings({ S3_BUCKET: undefined }))).toBeNull();
  });
});

describe('the local service refuses', () => {
  test('a wrong secret', async () => {
    const put = open({ S3_SECRET_ACCESS_KEY: 'another secret' }).putObject('a', 'b', 'text/plain');
    await expect(put).rejects.toMatchObject({ name: 'SignatureDoesNotMatch' });
  });

  test('an unknown access key', async () => {
    const put = open({ S3_ACCESS_KEY_ID: 'somebody' }).putObject('a', 'b', 'text/plain');
    await expect(put).rejects.toMatchObject({ name: 'InvalidAccessKeyId' });
  });

  test('a request without a signature', async () => {
    expect((await fetch(`http://127.0.0.1:${s3.port}/trymark/a`)).status).toBe(403);
  });

  test('a signed address whose path was changed', async () => {
    const store = open();
    await store.putObject('a', 'mine', 'text/plain');
    await store.putObject('b', 'not mine', 'text/plain');
    const url = new URL(await store.presignGet('a', { fileName: 'a', expiresSeconds: 60 }));
    expect((await fetch(url)).status).toBe(200);
    url.pathname = '/trymark/b';
    const response = await fetch(url);
    expect(response.status).toBe(403);
    expect(await response.text()).toContain('SignatureDoesNotMatch');
  });

  test('a signed address after its time', async () => {
    const url = new URL(await open().presignGet('a', { fileName: 'a', expiresSeconds: 60 }));
    url.searchParams.set('X-Amz-Date', '20260101T000000Z');
    expect((await fetch(url)).status).toBe(403);
  });

  test('an upload of another type than was signed', async () => {
    const url = await presignPut('image/png');
    const put = (type: string) =>
      fetch(url, { method: 'PUT', body: 'bytes', headers: { 'content-type': type } });
    expect((await put('text/html')).status).toBe(403);
    expect((await put('image/png')).status).toBe(200);
  });

  test('a bucket that is not its own', async () => {
    const put = open({ S3_BUCKET: 'other' }).putObject('a', 'b', 'text/plain');
    await expect(put).rejects.toMatchObject({ name: 'NoSuchBucket' });
  });
});
