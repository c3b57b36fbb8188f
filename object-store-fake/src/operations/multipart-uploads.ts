import { checksumHeaders, receiveIntoFile, receiveText } from '../body.js';
import { CHECKSUM_ALGORITHMS, isChecksumAlgorithm, type ChecksumAlgorithm, type Checksums } from '../checksums.js';
import type { Operation } from '../context.js';
import { S3Error } from '../errors.js';
import type { NamedPart, Part, Upload } from '../multipart.js';
import { headersToKeep, quoted, sendChecksumHeaders } from '../object-headers.js';
import type { S3Call } from '../s3-call.js';
import { childText, childrenNamed, document, element, parseXml, type Xml } from '../xml.js';
import { pageSize } from './list-objects.js';
import { writeConditions } from './objects.js';

const MAX_PARTS = 10_000;
const MAX_XML_BYTES = 4 * 1024 * 1024;

export const createMultipartUpload: Operation = async (call, { uploads }) => {
  const checksum = wantedChecksum(call);
  const upload = await uploads.create(call.bucket, { key: call.key, headers: headersToKeep(call), ...checksum });
  if (upload.checksumAlgorithm !== undefined) {
    call.response.setHeader('x-amz-checksum-algorithm', upload.checksumAlgorithm.toUpperCase());
    call.response.setHeader('x-amz-checksum-type', upload.checksumType ?? 'COMPOSITE');
  }
  call.sendXml(document('InitiateMultipartUploadResult', identity(call, upload.id)));
};

function wantedChecksum(call: S3Call): Pick<Upload, 'checksumAlgorithm' | 'checksumType'> {
  const checksumAlgorithm = call.header('x-amz-checksum-algorithm')?.toLowerCase();
  if (checksumAlgorithm === undefined) return {};
  if (!isChecksumAlgorithm(checksumAlgorithm)) {
    throw new S3Error('InvalidRequest', 'Checksum algorithm provided is unsupported.');
  }
  const byDefault = checksumAlgorithm === 'crc64nvme' ? 'FULL_OBJECT' : 'COMPOSITE';
  const checksumType = call.header('x-amz-checksum-type') ?? byDefault;
  if (checksumType !== 'FULL_OBJECT' && checksumType !== 'COMPOSITE') {
    throw new S3Error('InvalidRequest', 'Value for x-amz-checksum-type header is invalid.');
  }
  return { checksumAlgorithm, checksumType };
}

export const uploadPart: Operation = async (call, { uploads, maxObjectBytes }) => {
  if (call.header('x-amz-copy-source') !== undefined) throw new S3Error('NotImplemented');
  const number = partNumber(call.query('partNumber'));
  const upload = await uploads.find(call.bucket, call.key, uploadId(call));
  const part = await uploads.writePart(call.bucket, upload, number, async (file) => {
    const { size, md5, checksums } = await receiveIntoFile(call, file, maxObjectBytes);
    return { number, size, etag: md5, lastModified: new Date().toISOString(), checksums };
  });
  call.response.setHeader('ETag', quoted(part.etag));
  sendChecksumHeaders(call, part);
  call.response.removeHeader('x-amz-checksum-type');
  call.sendNothing(200);
};

export const listParts: Operation = async (call, { uploads }) => {
  const upload = await uploads.find(call.bucket, call.key, uploadId(call));
  const marker = Number(call.query('part-number-marker') ?? 0);
  const size = pageSize(call, 'max-parts');
  const rest = (await uploads.parts(call.bucket, upload.id)).filter((part) => part.number > marker);
  const page = rest.slice(0, size);
  call.sendXml(
    document('ListPartsResult', [
      ...identity(call, upload.id),
      element('StorageClass', 'STANDARD'),
      element('PartNumberMarker', marker),
      element('NextPartNumberMarker', page.at(-1)?.number ?? 0),
      element('MaxParts', size),
      element('IsTruncated', rest.length > page.length),
      ...page.map(partElement),
    ]),
  );
};

function partElement(part: Part): Xml {
  return element('Part', [
    element('PartNumber', part.number),
    element('LastModified', part.lastModified),
    element('ETag', quoted(part.etag)),
    element('Size', part.size),
    ...checksumElements(part.checksums),
  ]);
}

export const listMultipartUploads: Operation = async (call, { uploads }) => {
  const under = call.query('prefix') ?? '';
  const found = (await uploads.list(call.bucket)).filter((upload) => upload.key.startsWith(under));
  call.sendXml(
    document('ListMultipartUploadsResult', [
      element('Bucket', call.bucket),
      element('Prefix', under),
      element('IsTruncated', false),
      ...found.map((upload) =>
        element('Upload', [
          element('Key', upload.key),
          element('UploadId', upload.id),
          element('Initiated', upload.initiated),
          element('StorageClass', 'STANDARD'),
        ]),
      ),
    ]),
  );
};

export const abortMultipartUpload: Operation = async (call, { uploads }) => {
  await uploads.abort(call.bucket, call.key, uploadId(call));
  call.sendNothing(204);
};

export const completeMultipartUpload: Operation = async (call, { uploads }) => {
  const id = uploadId(call);
  await uploads.find(call.bucket, call.key, id);
  // Checksums in the headers are those of the finished object here, not of the body.
  const parts = namedParts(await receiveText(call, MAX_XML_BYTES, {}));
  const meta = await uploads.complete(call.bucket, call.key, id, {
    parts,
    checksums: checksumHeaders(call),
    conditions: writeConditions(call),
  });
  call.sendXml(
    document('CompleteMultipartUploadResult', [
      element('Location', `http://${call.header('host')}${call.signed.rawPath}`),
      element('Bucket', call.bucket),
      element('Key', call.key),
      element('ETag', quoted(meta.etag)),
      ...checksumElements(meta.checksums),
      ...(meta.checksumType === undefined ? [] : [element('ChecksumType', meta.checksumType)]),
    ]),
  );
};

function namedParts(text: string): NamedPart[] {
  const root = parseXml(text);
  const parts = childrenNamed(root, 'Part');
  if (root.name !== 'CompleteMultipartUpload' || parts.length === 0 || parts.length > MAX_PARTS) {
    throw new S3Error('MalformedXML');
  }
  return parts.map((part) => {
    const etag = childText(part, 'ETag');
    if (etag === undefined) throw new S3Error('MalformedXML');
    const checksums: Checksums = {};
    for (const algorithm of CHECKSUM_ALGORITHMS) {
      const value = childText(part, elementName(algorithm));
      if (value !== undefined) checksums[algorithm] = value;
    }
    return { number: partNumber(childText(part, 'PartNumber')), etag: etag.replaceAll('"', ''), checksums };
  });
}

function partNumber(text: string | undefined): number {
  const number = /^\d{1,5}$/.test(text ?? '') ? Number(text) : 0;
  if (number >= 1 && number <= MAX_PARTS) return number;
  throw new S3Error('InvalidArgument', `Part number must be an integer between 1 and ${MAX_PARTS}, inclusive`, {
    ArgumentName: 'partNumber',
  });
}

function uploadId(call: S3Call): string {
  return call.query('uploadId') ?? '';
}

function identity(call: S3Call, id: string): Xml[] {
  return [element('Bucket', call.bucket), element('Key', call.key), element('UploadId', id)];
}

function elementName(algorithm: ChecksumAlgorithm): string {
  return `Checksum${algorithm.toUpperCase()}`;
}

function checksumElements(checksums: Checksums): Xml[] {
  return CHECKSUM_ALGORITHMS.flatMap((algorithm) => {
    const value = checksums[algorithm];
    return value === undefined ? [] : [element(elementName(algorithm), value)];
  });
}
