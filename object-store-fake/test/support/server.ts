import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { S3Client, type S3ClientConfig } from '@aws-sdk/client-s3';
import { startObjectStoreFake, type ObjectStoreFake, type ObjectStoreFakeOptions } from '../../src/object-store-fake.js';

export const BUCKET = 'test-bucket';
export const SECRET = 'test-secret';
export const REGION = 'eu-west-1';

export interface TestServer {
  readonly url: string;
  readonly dataDir: string;
  readonly s3: S3Client;
  /** A further client of the same server; one attempt only, so that a refusal is seen at once. */
  client(config?: S3ClientConfig): S3Client;
  behave(body: unknown): Promise<Response>;
  restart(): Promise<void>;
  stop(): Promise<void>;
}

/** A server on a free port with a folder of its own, and the AWS SDK's client for it. */
export async function startTestServer(options: Partial<ObjectStoreFakeOptions> = {}): Promise<TestServer> {
  const dataDir = await mkdtemp(join(tmpdir(), 'object-store-fake-'));
  const start = (): Promise<ObjectStoreFake> =>
    startObjectStoreFake({
      port: 0,
      dataDir,
      accessKeyId: 'test-key',
      secretAccessKey: SECRET,
      region: REGION,
      buckets: [BUCKET],
      ...options,
    });
  let running = await start();
  const clients: S3Client[] = [];
  const url = (): string => `http://127.0.0.1:${running.port}`;
  const client = (config: S3ClientConfig = {}): S3Client => {
    const made = new S3Client({
      endpoint: url(),
      region: REGION,
      credentials: { accessKeyId: 'test-key', secretAccessKey: SECRET },
      forcePathStyle: true,
      maxAttempts: 1,
      ...config,
    });
    clients.push(made);
    return made;
  };
  let s3 = client();
  return {
    get url() {
      return url();
    },
    get s3() {
      return s3;
    },
    dataDir,
    client,
    behave: (body) =>
      fetch(`${url()}/__behaviour`, {
        method: 'PUT',
        headers: { 'content-type': 'application/json' },
        body: JSON.stringify(body),
      }),
    restart: async () => {
      for (const made of clients) made.destroy();
      await running.close();
      running = await start();
      s3 = client();
    },
    stop: async () => {
      for (const made of clients) made.destroy();
      await running.close();
      await rm(dataDir, { recursive: true, force: true });
    },
  };
}

/** All files below a folder, as relative paths. */
export async function filesBelow(folder: string): Promise<string[]> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true });
  return entries.filter((entry) => entry.isFile()).map((entry) => join(entry.parentPath, entry.name));
}
