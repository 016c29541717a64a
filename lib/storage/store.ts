import 'server-only';
import {
  DeleteObjectCommand,
  GetObjectCommand,
  NoSuchKey,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import type { Env } from '@/lib/env';

export type StoreSettings = Pick<
  Env,
  'S3_ENDPOINT' | 'S3_REGION' | 'S3_BUCKET' | 'S3_ACCESS_KEY_ID' | 'S3_SECRET_ACCESS_KEY'
>;

export interface StoredObject {
  bytes: Uint8Array;
  contentType: string;
}

export interface Store {
  putObject(key: string, bytes: Uint8Array | string, contentType: string): Promise<void>;
  /** The object; null when there is none under this key. */
  getObject(key: string): Promise<StoredObject | null>;
  /** Removes the object; to remove what is not there is no failure. */
  deleteObject(key: string): Promise<void>;
  /** An address that lets whoever has it download the object under this name, for so many seconds. */
  presignGet(key: string, options: { fileName: string; expiresSeconds: number }): Promise<string>;
}

/** A bucket of any service that speaks S3; null when the settings name none. */
export function openStore(settings: StoreSettings): Store | null {
  const { S3_ENDPOINT, S3_REGION, S3_BUCKET: Bucket } = settings;
  const { S3_ACCESS_KEY_ID: accessKeyId, S3_SECRET_ACCESS_KEY: secretAccessKey } = settings;
  if (!Bucket || !accessKeyId || !secretAccessKey) return null;
  const client = new S3Client({
    region: S3_REGION,
    credentials: { accessKeyId, secretAccessKey },
    ...(S3_ENDPOINT ? { endpoint: S3_ENDPOINT, forcePathStyle: true } : {}),
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 3,
  });
  return {
    async putObject(Key, Body, ContentType) {
      await client.send(new PutObjectCommand({ Bucket, Key, Body, ContentType }));
    },
    getObject: (key) => getObject(client, Bucket, key),
    async deleteObject(Key) {
      await client.send(new DeleteObjectCommand({ Bucket, Key }));
    },
    presignGet(Key, { fileName, expiresSeconds }) {
      const ResponseContentDisposition = `attachment; filename*=UTF-8''${encodeURIComponent(fileName)}`;
      const command = new GetObjectCommand({ Bucket, Key, ResponseContentDisposition });
      return getSignedUrl(client, command, { expiresIn: expiresSeconds });
    },
  };
}

async function getObject(client: S3Client, Bucket: string, Key: string): Promise<StoredObject | null> {
  try {
    const { Body, ContentType } = await client.send(new GetObjectCommand({ Bucket, Key }));
    if (!Body) return null;
    return {
      bytes: await Body.transformToByteArray(),
      contentType: ContentType ?? 'application/octet-stream',
    };
  } catch (error) {
    if (error instanceof NoSuchKey) return null;
    throw error;
  }
}
