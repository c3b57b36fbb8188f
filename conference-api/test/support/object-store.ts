import { type ObjectStoreFake, startObjectStoreFake } from '@kerfside/object-store-fake';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export interface ObjectStore {
  /** What a test application has to be started with to use it. */
  environment: Record<string, string>;
  behave: (mode: 'ok' | 'fail' | 'delay', delayMs?: number) => Promise<void>;
  stop: () => Promise<void>;
  /** Again on the same port, with what it had. */
  start: () => Promise<void>;
  remove: () => Promise<void>;
}

/** An object store of the test's own, so that it can fail without another test's noticing. */
export async function startObjectStore(limits: { maxObjectBytes?: number } = {}): Promise<ObjectStore> {
  const dataDir = await mkdtemp(join(tmpdir(), 'kerfside-store-'));
  const options = { dataDir, accessKeyId: 'kerfside', secretAccessKey: 'a-secret-of-this-test', region: 'eu-west-1', buckets: ['kerfside'], ...limits };
  let fake: ObjectStoreFake | null = await startObjectStoreFake({ ...options, port: 0 });
  const { port } = fake;
  const stop = async () => {
    await fake?.close();
    fake = null;
  };
  return {
    environment: {
      KERFSIDE_S3_ENDPOINT: `http://127.0.0.1:${port}`,
      KERFSIDE_S3_REGION: options.region,
      KERFSIDE_S3_BUCKET: 'kerfside',
      KERFSIDE_S3_ACCESS_KEY_ID: options.accessKeyId,
      KERFSIDE_S3_SECRET_ACCESS_KEY: options.secretAccessKey,
    },
    behave: async (mode, delayMs) => {
      const response = await fetch(`http://127.0.0.1:${port}/__behaviour`, { method: 'PUT', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ mode, delayMs }) });
      if (!response.ok) throw new Error(`behaviour answered ${response.status}`);
    },
    stop,
    start: async () => {
      fake ??= await startObjectStoreFake({ ...options, port });
    },
    remove: async () => {
      await stop();
      await rm(dataDir, { recursive: true, force: true });
    },
  };
}
