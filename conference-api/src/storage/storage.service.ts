import {
  DeleteObjectsCommand,
  GetObjectCommand,
  HeadBucketCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
} from '@aws-sdk/client-s3';
import { Injectable, Logger, type OnApplicationShutdown } from '@nestjs/common';
import type { Readable } from 'node:stream';
import { notFound, unavailable } from '../common/problems/problem.js';
import { Settings } from '../config/settings.js';

export interface StoredObject {
  body: Readable;
  contentType: string;
  bytes: number;
  etag: string;
}

/** The object store, by S3's protocol. Whatever goes wrong with it is one problem: 503. */
@Injectable()
export class StorageService implements OnApplicationShutdown {
  private readonly logger = new Logger(StorageService.name);
  private readonly client: S3Client;
  private readonly bucket: string;

  constructor(settings: Settings) {
    const { endpoint, region, accessKeyId, secretAccessKey, bucket } = settings.s3;
    this.bucket = bucket;
    this.client = new S3Client({
      endpoint,
      region,
      forcePathStyle: true,
      credentials: { accessKeyId, secretAccessKey },
      maxAttempts: 2,
      // without throwOnRequestTimeout the client would only warn, and wait on
      requestHandler: { connectionTimeout: 2_000, requestTimeout: 10_000, throwOnRequestTimeout: true, socketTimeout: 10_000 },
    });
  }

  async put(key: string, body: Buffer, contentType: string): Promise<void> {
    await this.ask(() => this.client.send(new PutObjectCommand({ Bucket: this.bucket, Key: key, Body: body, ContentType: contentType })));
  }

  /** Problem 404 where the object is not there. */
  async get(key: string): Promise<StoredObject> {
    const found = await this.ask(() => this.client.send(new GetObjectCommand({ Bucket: this.bucket, Key: key })).catch(unlessMissing));
    if (!found) throw notFound('picture');
    return {
      body: found.Body as Readable,
      contentType: found.ContentType ?? 'application/octet-stream',
      bytes: found.ContentLength ?? 0,
      etag: found.ETag ?? '',
    };
  }

  /** Deleting what is not there is no error. */
  async delete(keys: string[]): Promise<void> {
    for (let start = 0; start < keys.length; start += 1000) {
      const Objects = keys.slice(start, start + 1000).map((Key) => ({ Key }));
      const answer = await this.ask(() => this.client.send(new DeleteObjectsCommand({ Bucket: this.bucket, Delete: { Objects, Quiet: true } })));
      if (answer.Errors?.length) throw unavailable('object store');
    }
  }

  /** All keys that begin so, page by page. */
  async *list(prefix: string): AsyncGenerator<{ key: string; modified: Date }> {
    let token: string | undefined;
    do {
      const page = await this.ask(() =>
        this.client.send(new ListObjectsV2Command({ Bucket: this.bucket, Prefix: prefix, ContinuationToken: token })),
      );
      for (const entry of page.Contents ?? []) if (entry.Key) yield { key: entry.Key, modified: entry.LastModified ?? new Date(0) };
      token = page.NextContinuationToken;
    } while (token);
  }

  /** Throws where the bucket can not be reached. */
  async ping(): Promise<void> {
    await this.ask(() => this.client.send(new HeadBucketCommand({ Bucket: this.bucket })));
  }

  onApplicationShutdown() {
    this.client.destroy();
  }

  private async ask<T>(call: () => Promise<T>): Promise<T> {
    try {
      return await call();
    } catch (error) {
      // its name only: what the store says may hold keys and addresses
      this.logger.warn(`the object store failed: ${error instanceof Error ? error.name : typeof error}`);
      throw unavailable('object store');
    }
  }
}

const unlessMissing = (error: unknown): undefined => {
  if (error instanceof S3ServiceException && ['NoSuchKey', 'NotFound'].includes(error.name)) return undefined;
  throw error;
};
