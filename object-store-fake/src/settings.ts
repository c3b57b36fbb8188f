import { resolve } from 'node:path';
import type { ObjectStoreFakeOptions } from './object-store-fake.js';

/** Reads the settings; throws an error that names a bad one without its value. */
export function readSettings(env: NodeJS.ProcessEnv): ObjectStoreFakeOptions {
  const text = (name: string, byDefault: string): string => env[name] || byDefault;
  const port = text('KERFSIDE_OBJECT_STORE_PORT', '4390');
  if (!/^\d{1,5}$/.test(port) || Number(port) > 65535) {
    throw new Error('KERFSIDE_OBJECT_STORE_PORT must be a port number from 0 to 65535');
  }
  return {
    port: Number(port),
    dataDir: resolve(text('KERFSIDE_OBJECT_STORE_DATA', '.data/objects')),
    accessKeyId: text('KERFSIDE_S3_ACCESS_KEY_ID', 'kerfside'),
    secretAccessKey: text('KERFSIDE_S3_SECRET_ACCESS_KEY', 'kerfside-local-secret'),
    region: text('KERFSIDE_S3_REGION', 'eu-west-1'),
    buckets: [text('KERFSIDE_S3_BUCKET', 'kerfside')],
  };
}
