import type { Operation } from '../context.js';
import { CHECKSUM_ALGORITHMS } from '../checksums.js';
import { S3Error } from '../errors.js';
import { receiveText } from '../body.js';
import { childText, childrenNamed, document, element, parseXml, type XmlElement } from '../xml.js';
import type { S3Call } from '../s3-call.js';

const MAX_XML_BYTES = 2 * 1024 * 1024;
const MAX_DELETED_KEYS = 1000;

export const listBuckets: Operation = async (call, { store, region }) => {
  const buckets = store
    .listBuckets()
    .map(({ name, created }) =>
      element('Bucket', [
        element('Name', name),
        element('CreationDate', created.toISOString()),
        element('BucketRegion', region),
      ]),
    );
  const owner = element('Owner', [element('ID', 'object-store-fake'), element('DisplayName', 'object-store-fake')]);
  call.sendXml(document('ListAllMyBucketsResult', [owner, element('Buckets', buckets)]));
};

export const headBucket: Operation = async (call, { store, region }) => {
  store.requireBucket(call.bucket);
  call.response.setHeader('x-amz-bucket-region', region);
  call.sendNothing(200);
};

export const createBucket: Operation = async (call, { store, region }) => {
  const text = await receiveText(call, MAX_XML_BYTES);
  const wanted = text.trim() === '' ? undefined : childText(parseXml(text), 'LocationConstraint');
  if (wanted !== undefined && wanted !== '' && wanted !== region) {
    throw new S3Error('IllegalLocationConstraintException');
  }
  await store.createBucket(call.bucket);
  call.response.setHeader('Location', `/${call.bucket}`);
  call.sendNothing(200);
};

export const deleteObjects: Operation = async (call, { store }) => {
  store.requireBucket(call.bucket);
  if (!hasIntegrityHeader(call)) {
    throw new S3Error('InvalidRequest', 'Missing required header for this request: Content-MD5');
  }
  const text = await receiveText(call, MAX_XML_BYTES);
  const root = parseXml(text);
  const keys = childrenNamed(root, 'Object').map(keyToDelete);
  if (root.name !== 'Delete' || keys.length === 0 || keys.length > MAX_DELETED_KEYS) throw new S3Error('MalformedXML');
  for (const key of keys) await store.delete(call.bucket, key);
  const quiet = childText(root, 'Quiet') === 'true';
  const deleted = quiet ? [] : keys.map((key) => element('Deleted', [element('Key', key)]));
  call.sendXml(document('DeleteResult', deleted));
};

function keyToDelete(object: XmlElement): string {
  const key = childText(object, 'Key');
  if (key === undefined || key === '') throw new S3Error('MalformedXML');
  if (object.children.some((child) => child.name !== 'Key')) {
    throw new S3Error('NotImplemented', 'A key to delete takes no version and no condition');
  }
  return key;
}

function hasIntegrityHeader(call: S3Call): boolean {
  const names = ['content-md5', 'x-amz-trailer', ...CHECKSUM_ALGORITHMS.map((name) => `x-amz-checksum-${name}`)];
  return names.some((name) => call.header(name) !== undefined);
}
