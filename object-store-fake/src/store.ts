import { createHash } from 'node:crypto';
import { mkdir, open, readdir, rm, stat, type FileHandle } from 'node:fs/promises';
import { join } from 'node:path';
import type { Checksums } from './checksums.js';
import { S3Error } from './errors.js';
import { KeyedLock } from './keyed-lock.js';
import { readMeta, readMetaAt, writeWhole } from './object-file.js';

export interface ObjectMeta {
  key: string;
  size: number;
  /** Without quotation marks. */
  etag: string;
  lastModified: string;
  /** The headers to give back with the object: content-type, cache-control, x-amz-meta-* and the like. */
  headers: Record<string, string>;
  checksums: Checksums;
  checksumType?: 'FULL_OBJECT' | 'COMPOSITE';
}

export interface WriteConditions {
  ifNoneMatch?: string | undefined;
  ifMatch?: string | undefined;
}

export interface Bucket {
  name: string;
  created: Date;
}

interface LoadedBucket extends Bucket {
  objects: Map<string, ObjectMeta>;
  /** Kept between listings; undefined after a change. */
  sorted: string[] | undefined;
}

const MAX_KEY_BYTES = 1024;

/** Buckets and objects on disk, with an index of them in memory; one process at a time may own the folder. */
export class ObjectStore {
  private readonly buckets = new Map<string, LoadedBucket>();
  private readonly lock = new KeyedLock();

  private constructor(private readonly dataDir: string) {}

  get temporaryFolder(): string {
    return join(this.dataDir, 'tmp');
  }

  /** Opens the folder, made if need be, and clears what an earlier process left half-written. */
  static async open(dataDir: string): Promise<ObjectStore> {
    const store = new ObjectStore(dataDir);
    await rm(store.temporaryFolder, { recursive: true, force: true });
    await mkdir(store.temporaryFolder, { recursive: true });
    await mkdir(join(dataDir, 'buckets'), { recursive: true });
    for (const name of await readdir(join(dataDir, 'buckets'))) await store.load(name);
    return store;
  }

  private async load(name: string): Promise<void> {
    const folder = this.bucketFolder(name);
    const marker = await stat(join(folder, 'created')).catch(() => undefined);
    // Stopped in the middle of being created: as good as absent, and it may be created again.
    if (marker === undefined) return;
    const bucket: LoadedBucket = { name, created: marker.mtime, objects: new Map(), sorted: undefined };
    for (const entry of await readdir(join(folder, 'objects'), { recursive: true, withFileTypes: true })) {
      if (!entry.isFile()) continue;
      const meta = await readMetaAt<ObjectMeta>(join(entry.parentPath, entry.name));
      if (meta === undefined) console.error(`object-store-fake: ${entry.name} in ${name} is no object, left alone`);
      else bucket.objects.set(meta.key, meta);
    }
    this.buckets.set(name, bucket);
  }

  listBuckets(): Bucket[] {
    return [...this.buckets.values()].sort((left, right) => (left.name < right.name ? -1 : 1));
  }

  hasBucket(name: string): boolean {
    return this.buckets.has(name);
  }

  requireBucket(name: string): void {
    this.bucket(name);
  }

  async createBucket(name: string): Promise<void> {
    checkBucketName(name);
    await this.lock.run(name, async () => {
      if (this.buckets.has(name)) throw new S3Error('BucketAlreadyOwnedByYou', undefined, { BucketName: name });
      await mkdir(join(this.bucketFolder(name), 'objects'), { recursive: true });
      // The marker's time is the bucket's: a folder's own time moves with its content.
      await (await open(join(this.bucketFolder(name), 'created'), 'a')).close();
      this.buckets.set(name, { name, created: new Date(), objects: new Map(), sorted: undefined });
    });
  }

  find(bucket: string, key: string): ObjectMeta | undefined {
    return this.bucket(bucket).objects.get(key);
  }

  /** Opens an object for reading; it stays readable through the handle even when it is replaced or deleted. */
  async openObject(bucket: string, key: string): Promise<{ meta: ObjectMeta; file: FileHandle }> {
    if (this.find(bucket, key) === undefined) throw new S3Error('NoSuchKey', undefined, { Key: key });
    let file: FileHandle;
    try {
      file = await open(this.objectPath(bucket, key), 'r');
    } catch (error) {
      // Deleted since we looked.
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') throw new S3Error('NoSuchKey', undefined, { Key: key });
      throw error;
    }
    const meta = await readMeta<ObjectMeta>(file);
    if (meta !== undefined) return { meta, file };
    await file.close();
    throw new Error('an object file was changed from outside');
  }

  /** Writes an object whole or not at all; `fill` writes the data at the start of the file. */
  async write(
    bucket: string,
    key: string,
    conditions: WriteConditions,
    fill: (file: FileHandle) => Promise<ObjectMeta>,
  ): Promise<ObjectMeta> {
    checkKey(key);
    this.checkConditions(bucket, key, conditions);
    return writeWhole(this.temporaryFolder, this.objectPath(bucket, key), fill, (rename, meta) =>
      this.lock.run(`${bucket}/${key}`, async () => {
        // Once more, since another upload may have been faster.
        this.checkConditions(bucket, key, conditions);
        await rename();
        this.bucket(bucket).objects.set(key, meta);
        this.bucket(bucket).sorted = undefined;
      }),
    );
  }

  /** S3 says nothing about a key that isn't there, so neither does this. */
  async delete(bucket: string, key: string): Promise<void> {
    await this.lock.run(`${bucket}/${key}`, async () => {
      if (this.find(bucket, key) === undefined) return;
      await rm(this.objectPath(bucket, key), { force: true });
      this.bucket(bucket).objects.delete(key);
      this.bucket(bucket).sorted = undefined;
    });
  }

  /** All keys in the order of their UTF-8 bytes, which is the order S3 lists in. */
  sortedKeys(name: string): readonly string[] {
    const bucket = this.bucket(name);
    bucket.sorted ??= [...bucket.objects.keys()]
      .map((key) => ({ key, bytes: Buffer.from(key) }))
      .sort((left, right) => Buffer.compare(left.bytes, right.bytes))
      .map(({ key }) => key);
    return bucket.sorted;
  }

  bucketFolder(name: string): string {
    return join(this.dataDir, 'buckets', name);
  }

  private bucket(name: string): LoadedBucket {
    const bucket = this.buckets.get(name);
    if (bucket === undefined) throw new S3Error('NoSuchBucket', undefined, { BucketName: name });
    return bucket;
  }

  // A hash as the name: no key can point outside the folder or clash with another.
  private objectPath(bucket: string, key: string): string {
    const name = createHash('sha256').update(key).digest('hex');
    return join(this.bucketFolder(bucket), 'objects', name.slice(0, 2), name);
  }

  private checkConditions(bucket: string, key: string, { ifNoneMatch, ifMatch }: WriteConditions): void {
    const present = this.find(bucket, key);
    if (ifNoneMatch !== undefined && ifNoneMatch !== '*') {
      throw new S3Error('NotImplemented', 'A write takes only * in If-None-Match');
    }
    if (ifNoneMatch !== undefined && present !== undefined) {
      throw new S3Error('PreconditionFailed', undefined, { Condition: 'If-None-Match' });
    }
    if (ifMatch === undefined) return;
    if (present === undefined) throw new S3Error('NoSuchKey', undefined, { Key: key });
    if (ifMatch.replaceAll('"', '') !== present.etag) {
      throw new S3Error('PreconditionFailed', undefined, { Condition: 'If-Match' });
    }
  }
}

export function checkKey(key: string): void {
  const size = Buffer.byteLength(key);
  if (size <= MAX_KEY_BYTES) return;
  throw new S3Error('KeyTooLongError', undefined, { Size: String(size), MaxSizeAllowed: String(MAX_KEY_BYTES) });
}

function checkBucketName(name: string): void {
  const wellFormed = /^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(name) && !name.includes('..');
  if (!wellFormed || /^\d+\.\d+\.\d+\.\d+$/.test(name)) {
    throw new S3Error('InvalidBucketName', undefined, { BucketName: name });
  }
}
