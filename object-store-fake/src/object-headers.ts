import { validateHeaderValue } from 'node:http';
import { S3Error } from './errors.js';
import type { S3Call } from './s3-call.js';
import type { ObjectMeta } from './store.js';

const KEPT = ['content-type', 'cache-control', 'content-disposition', 'content-encoding', 'content-language', 'expires'];
const METADATA = 'x-amz-meta-';
const MAX_METADATA_BYTES = 2048;

/** The headers of an upload that are given back with the object. */
export function headersToKeep(call: S3Call): Record<string, string> {
  const kept: Record<string, string> = {};
  for (const name of KEPT) {
    const value = call.header(name);
    if (value !== undefined) kept[name] = sendable(name, value);
  }
  // 'aws-chunked' is how the body travelled, not what the object is.
  const encodings = (kept['content-encoding'] ?? '').split(',').map((encoding) => encoding.trim());
  const own = encodings.filter((encoding) => encoding !== '' && encoding !== 'aws-chunked').join(',');
  delete kept['content-encoding'];
  if (own !== '') kept['content-encoding'] = own;
  let metadataBytes = 0;
  for (const [name, value] of call.headersStarting(METADATA)) {
    kept[name] = sendable(name, value);
    metadataBytes += Buffer.byteLength(name.slice(METADATA.length)) + Buffer.byteLength(value);
  }
  if (metadataBytes > MAX_METADATA_BYTES) {
    throw new S3Error('MetadataTooLarge', undefined, {
      Size: String(metadataBytes),
      MaxSizeAllowed: String(MAX_METADATA_BYTES),
    });
  }
  return kept;
}

export function quoted(etag: string): string {
  return `"${etag}"`;
}

/** The headers of an answer about an object; the query may put others in place of some (`response-content-type`, …). */
export function sendObjectHeaders(call: S3Call, meta: ObjectMeta): void {
  const { response } = call;
  response.setHeader('ETag', quoted(meta.etag));
  response.setHeader('Last-Modified', new Date(meta.lastModified).toUTCString());
  response.setHeader('Accept-Ranges', 'bytes');
  response.setHeader('Content-Type', 'binary/octet-stream');
  for (const [name, value] of Object.entries(meta.headers)) response.setHeader(name, value);
  for (const name of KEPT) {
    const override = call.query(`response-${name}`);
    if (override !== undefined) response.setHeader(name, sendable(name, override));
  }
}

// What comes in a query may hold characters that can't stand in a header; that is the caller's mistake.
function sendable(name: string, value: string): string {
  try {
    validateHeaderValue(name, value);
    return value;
  } catch {
    throw new S3Error('InvalidArgument', `Header value cannot be represented: ${name}`);
  }
}

export function sendChecksumHeaders(call: S3Call, meta: Pick<ObjectMeta, 'checksums' | 'checksumType'>): void {
  const checksums = Object.entries(meta.checksums);
  for (const [algorithm, value] of checksums) call.response.setHeader(`x-amz-checksum-${algorithm}`, value);
  if (checksums.length > 0) call.response.setHeader('x-amz-checksum-type', meta.checksumType ?? 'FULL_OBJECT');
}
