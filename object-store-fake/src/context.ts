import type { MultipartUploads } from './multipart.js';
import type { S3Call } from './s3-call.js';
import type { ObjectStore } from './store.js';

/** What the operations work with. */
export interface Context {
  store: ObjectStore;
  uploads: MultipartUploads;
  region: string;
  maxObjectBytes: number;
}

export type Operation = (call: S3Call, context: Context) => Promise<void>;
