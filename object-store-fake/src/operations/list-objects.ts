import type { Operation } from '../context.js';
import { S3Error } from '../errors.js';
import { listPage } from '../listing.js';
import { quoted } from '../object-headers.js';
import type { S3Call } from '../s3-call.js';
import { uriEncode } from '../signature.js';
import type { ObjectMeta, ObjectStore } from '../store.js';
import { document, element, type Xml } from '../xml.js';

const MAX_PAGE = 1000;

export const listObjects: Operation = async (call, { store }) => {
  const keys = store.sortedKeys(call.bucket);
  const request = {
    prefix: call.query('prefix') ?? '',
    delimiter: call.query('delimiter') ?? '',
    startAfter: call.query('start-after') ?? '',
    token: call.query('continuation-token'),
    maxKeys: pageSize(call, 'max-keys'),
  };
  const encode = textEncoder(call);
  const page = listPage(keys, request);
  const optional = (name: string, value: string | undefined): Xml[] =>
    value === undefined || value === '' ? [] : [element(name, value)];
  call.sendXml(
    document('ListBucketResult', [
      element('Name', call.bucket),
      element('Prefix', encode(request.prefix)),
      ...optional('Delimiter', encode(request.delimiter)),
      ...optional('StartAfter', encode(request.startAfter)),
      ...optional('EncodingType', call.query('encoding-type')),
      ...optional('ContinuationToken', request.token),
      ...optional('NextContinuationToken', page.nextToken),
      element('KeyCount', page.keys.length + page.prefixes.length),
      element('MaxKeys', request.maxKeys),
      element('IsTruncated', page.nextToken !== undefined),
      ...contents(store, call.bucket, page.keys).map((meta) => objectElement(meta, encode)),
      ...page.prefixes.map((prefix) => element('CommonPrefixes', [element('Prefix', encode(prefix))])),
    ]),
  );
};

/** A whole number from 0 in the query; 1000 when absent, and at most 1000. */
export function pageSize(call: S3Call, name: string): number {
  const text = call.query(name) ?? String(MAX_PAGE);
  if (!/^\d{1,9}$/.test(text)) {
    throw new S3Error('InvalidArgument', `Provided ${name} not an integer or within integer range`, {
      ArgumentName: name,
      ArgumentValue: text,
    });
  }
  return Math.min(Number(text), MAX_PAGE);
}

function textEncoder(call: S3Call): (text: string) => string {
  const kind = call.query('encoding-type');
  if (kind === undefined || kind === '') return (text) => text;
  if (kind !== 'url') {
    throw new S3Error('InvalidArgument', 'Invalid Encoding Method specified in Request', {
      ArgumentName: 'encoding-type',
    });
  }
  // As forms do it: a blank becomes '+', while the slash stays.
  return (text) => uriEncode(text).replaceAll('%2F', '/').replaceAll('%20', '+');
}

function contents(store: ObjectStore, bucket: string, keys: readonly string[]): ObjectMeta[] {
  return keys.map((key) => store.find(bucket, key)).filter((meta) => meta !== undefined);
}

function objectElement(meta: ObjectMeta, encode: (text: string) => string): Xml {
  return element('Contents', [
    element('Key', encode(meta.key)),
    element('LastModified', meta.lastModified),
    element('ETag', quoted(meta.etag)),
    ...Object.keys(meta.checksums).map((algorithm) => element('ChecksumAlgorithm', algorithm.toUpperCase())),
    element('Size', meta.size),
    element('StorageClass', 'STANDARD'),
  ]);
}
