import { pipeline } from 'node:stream/promises';
import { evaluateConditions } from '../conditions.js';
import type { Operation } from '../context.js';
import { S3Error } from '../errors.js';
import { headersToKeep, quoted } from '../object-headers.js';
import type { S3Call } from '../s3-call.js';
import type { ObjectMeta } from '../store.js';
import { document, element } from '../xml.js';
import { writeConditions } from './objects.js';

export const copyObject: Operation = async (call, { store }) => {
  const source = copySource(call);
  const replaces = replacesHeaders(call);
  if (!replaces && source.bucket === call.bucket && source.key === call.key) {
    throw new S3Error('InvalidRequest', 'A copy onto itself must change the metadata');
  }
  store.requireBucket(call.bucket);
  const { meta, file: from } = await store.openObject(source.bucket, source.key);
  try {
    checkSourceConditions(call, meta);
    const headers = replaces ? headersToKeep(call) : meta.headers;
    const copy = await store.write(call.bucket, call.key, writeConditions(call), async (file) => {
      if (meta.size > 0) {
        const data = from.createReadStream({ start: 0, end: meta.size - 1, autoClose: false });
        await pipeline(data, async (pieces: AsyncIterable<Buffer>) => {
          let position = 0;
          for await (const piece of pieces) {
            await file.write(piece, 0, piece.length, position);
            position += piece.length;
          }
        });
      }
      return { ...meta, key: call.key, lastModified: new Date().toISOString(), headers };
    });
    call.sendXml(
      document('CopyObjectResult', [
        element('LastModified', copy.lastModified),
        element('ETag', quoted(copy.etag)),
      ]),
    );
  } finally {
    await from.close();
  }
};

function copySource(call: S3Call): { bucket: string; key: string } {
  const [path = '', version] = (call.header('x-amz-copy-source') ?? '').split('?');
  if (version !== undefined) throw new S3Error('NotImplemented', 'Versions are not implemented');
  let decoded: string;
  try {
    decoded = decodeURIComponent(path).replace(/^\//, '');
  } catch {
    decoded = '';
  }
  const at = decoded.indexOf('/');
  if (at < 1 || at === decoded.length - 1) {
    throw new S3Error('InvalidArgument', 'Copy Source must mention the source bucket and key: sourcebucket/sourcekey');
  }
  return { bucket: decoded.slice(0, at), key: decoded.slice(at + 1) };
}

function replacesHeaders(call: S3Call): boolean {
  const directive = call.header('x-amz-metadata-directive') ?? 'COPY';
  if (directive !== 'COPY' && directive !== 'REPLACE') throw new S3Error('InvalidArgument', 'Unknown metadata directive.');
  return directive === 'REPLACE';
}

function checkSourceConditions(call: S3Call, meta: ObjectMeta): void {
  const verdict = evaluateConditions(
    {
      ifMatch: call.header('x-amz-copy-source-if-match'),
      ifNoneMatch: call.header('x-amz-copy-source-if-none-match'),
      ifModifiedSince: call.header('x-amz-copy-source-if-modified-since'),
      ifUnmodifiedSince: call.header('x-amz-copy-source-if-unmodified-since'),
    },
    meta,
  );
  if (verdict === 'not-modified') throw new S3Error('PreconditionFailed');
}
