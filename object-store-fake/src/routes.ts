import type { Operation } from './context.js';
import { S3Error } from './errors.js';
import { createBucket, deleteObjects, headBucket, listBuckets } from './operations/buckets.js';
import { copyObject } from './operations/copy-object.js';
import { listObjects } from './operations/list-objects.js';
import {
  abortMultipartUpload,
  completeMultipartUpload,
  createMultipartUpload,
  listMultipartUploads,
  listParts,
  uploadPart,
} from './operations/multipart-uploads.js';
import { deleteObject, getObject, headObject, putObject } from './operations/objects.js';
import type { S3Call } from './s3-call.js';

interface Route {
  method: string;
  on: 'service' | 'bucket' | 'object';
  /** Query names that pick this operation, all of which must be there. */
  picks?: string[];
  /** A header that picks it. */
  header?: string;
  /** Further query names that it understands. */
  takes?: string[];
  operation: Operation;
}

const RESPONSE_HEADERS = ['type', 'disposition', 'encoding', 'language'].map((name) => `response-content-${name}`);
const OVERRIDES = [...RESPONSE_HEADERS, 'response-cache-control', 'response-expires'];

// The first that fits is taken, so the more exact ones stand first.
const ROUTES: readonly Route[] = [
  { method: 'GET', on: 'service', operation: listBuckets },
  { method: 'HEAD', on: 'bucket', operation: headBucket },
  { method: 'PUT', on: 'bucket', operation: createBucket },
  { method: 'POST', on: 'bucket', picks: ['delete'], operation: deleteObjects },
  { method: 'GET', on: 'bucket', picks: ['uploads'], takes: ['prefix'], operation: listMultipartUploads },
  {
    method: 'GET',
    on: 'bucket',
    picks: ['list-type'],
    takes: ['prefix', 'delimiter', 'max-keys', 'continuation-token', 'start-after', 'encoding-type'],
    operation: listObjects,
  },
  {
    method: 'GET',
    on: 'object',
    picks: ['uploadId'],
    takes: ['max-parts', 'part-number-marker'],
    operation: listParts,
  },
  { method: 'GET', on: 'object', takes: OVERRIDES, operation: getObject },
  { method: 'HEAD', on: 'object', takes: OVERRIDES, operation: headObject },
  { method: 'PUT', on: 'object', picks: ['uploadId', 'partNumber'], operation: uploadPart },
  { method: 'PUT', on: 'object', header: 'x-amz-copy-source', operation: copyObject },
  { method: 'PUT', on: 'object', operation: putObject },
  { method: 'POST', on: 'object', picks: ['uploads'], operation: createMultipartUpload },
  { method: 'POST', on: 'object', picks: ['uploadId'], operation: completeMultipartUpload },
  { method: 'DELETE', on: 'object', picks: ['uploadId'], operation: abortMultipartUpload },
  { method: 'DELETE', on: 'object', operation: deleteObject },
];

// What they ask for isn't done here, and doing less in silence would mislead.
const REFUSED_HEADERS = [
  'x-amz-server-side-encryption-customer-',
  'x-amz-object-lock-',
  'x-amz-tagging',
  'x-amz-website-redirect-location',
  'x-amz-write-offset-bytes',
];

/** Picks the operation for a request, or refuses what no operation here understands. */
export function operationFor(call: S3Call): Operation {
  let on: Route['on'] = 'service';
  if (call.bucket !== '') on = call.key === '' ? 'bucket' : 'object';
  const here = ROUTES.filter((route) => route.on === on && route.method === call.method);
  if (!ROUTES.some((route) => route.method === call.method)) throw new S3Error('MethodNotAllowed');
  const route = here.find((candidate) => fits(candidate, call));
  const refused = REFUSED_HEADERS.some((prefix) => call.headersStarting(prefix).length > 0);
  if (route === undefined || refused) throw new S3Error('NotImplemented');
  return route.operation;
}

function fits(route: Route, call: S3Call): boolean {
  const picks = route.picks ?? [];
  const known = new Set([...picks, ...(route.takes ?? []), 'x-id']);
  return (
    picks.every((name) => call.query(name) !== undefined) &&
    (route.header === undefined || call.header(route.header) !== undefined) &&
    call.queryNames.every((name) => known.has(name) || /^x-amz-/i.test(name))
  );
}
