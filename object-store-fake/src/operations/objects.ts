import { pipeline } from 'node:stream/promises';
import { receiveIntoFile } from '../body.js';
import { evaluateConditions, parseRange, type ByteRange } from '../conditions.js';
import type { Operation } from '../context.js';
import { S3Error } from '../errors.js';
import { headersToKeep, quoted, sendChecksumHeaders, sendObjectHeaders } from '../object-headers.js';
import type { S3Call } from '../s3-call.js';
import type { ObjectMeta, WriteConditions } from '../store.js';

export const putObject: Operation = async (call, { store, maxObjectBytes }) => {
  const { bucket, key } = call;
  const headers = headersToKeep(call);
  const meta = await store.write(bucket, key, writeConditions(call), async (file) => {
    const { size, md5, checksums } = await receiveIntoFile(call, file, maxObjectBytes);
    return { key, size, etag: md5, lastModified: new Date().toISOString(), headers, checksums };
  });
  call.response.setHeader('ETag', quoted(meta.etag));
  sendChecksumHeaders(call, meta);
  call.sendNothing(200);
};

export function writeConditions(call: S3Call): WriteConditions {
  return { ifNoneMatch: call.header('if-none-match'), ifMatch: call.header('if-match') };
}

export const getObject: Operation = async (call, { store }) => {
  const { meta, file } = await store.openObject(call.bucket, call.key);
  try {
    const range = answerHead(call, meta);
    if (range === undefined) return;
    if (range.end < range.start) call.response.end();
    else await send(call, file.createReadStream({ ...range, autoClose: false }));
  } finally {
    await file.close();
  }
};

export const headObject: Operation = async (call, { store }) => {
  const meta = store.find(call.bucket, call.key);
  if (meta === undefined) throw new S3Error('NoSuchKey', undefined, { Key: call.key });
  answerHead(call, meta);
  call.response.end();
};

/** Sets status and headers; gives the bytes to send, or undefined when the answer has ended as 'not modified'. */
function answerHead(call: S3Call, meta: ObjectMeta): ByteRange | undefined {
  const { response } = call;
  const verdict = evaluateConditions(
    {
      ifMatch: call.header('if-match'),
      ifNoneMatch: call.header('if-none-match'),
      ifModifiedSince: call.header('if-modified-since'),
      ifUnmodifiedSince: call.header('if-unmodified-since'),
    },
    meta,
  );
  const range = verdict === 'send' ? parseRange(call.header('range'), meta.size) : undefined;
  sendObjectHeaders(call, meta);
  if (verdict === 'not-modified') {
    response.removeHeader('Content-Type');
    call.sendNothing(304);
    return undefined;
  }
  if (range === undefined) {
    // A checksum covers the whole, so it must not go with a piece.
    if (call.header('x-amz-checksum-mode')?.toUpperCase() === 'ENABLED') sendChecksumHeaders(call, meta);
    response.setHeader('Content-Length', meta.size);
    response.statusCode = 200;
    return { start: 0, end: meta.size - 1 };
  }
  response.setHeader('Content-Range', `bytes ${range.start}-${range.end}/${meta.size}`);
  response.setHeader('Content-Length', range.end - range.start + 1);
  response.statusCode = 206;
  return range;
}

async function send(call: S3Call, source: NodeJS.ReadableStream): Promise<void> {
  try {
    await pipeline(source, call.response);
  } catch (error) {
    // The client went away; there is nobody left to tell.
    if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  }
}

export const deleteObject: Operation = async (call, { store }) => {
  await store.delete(call.bucket, call.key);
  call.sendNothing(204);
};
