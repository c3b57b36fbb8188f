import { S3Error } from './errors.js';
import type { ObjectMeta } from './store.js';

export interface ReadConditions {
  ifMatch: string | undefined;
  ifNoneMatch: string | undefined;
  ifModifiedSince: string | undefined;
  ifUnmodifiedSince: string | undefined;
}

/** Says whether to send the object or 'not modified', or refuses; the order is that of RFC 9110, 13.2.2. */
export function evaluateConditions(conditions: ReadConditions, meta: ObjectMeta): 'send' | 'not-modified' {
  const { ifMatch, ifNoneMatch, ifModifiedSince, ifUnmodifiedSince } = conditions;
  const changed = wholeSeconds(meta.lastModified);
  if (ifMatch !== undefined) {
    if (!names(ifMatch, meta.etag)) throw new S3Error('PreconditionFailed', undefined, { Condition: 'If-Match' });
  } else if (ifUnmodifiedSince !== undefined && changed > Date.parse(ifUnmodifiedSince)) {
    throw new S3Error('PreconditionFailed', undefined, { Condition: 'If-Unmodified-Since' });
  }
  if (ifNoneMatch !== undefined) return names(ifNoneMatch, meta.etag) ? 'not-modified' : 'send';
  return ifModifiedSince !== undefined && changed <= Date.parse(ifModifiedSince) ? 'not-modified' : 'send';
}

function names(list: string, etag: string): boolean {
  const tags = list.split(',').map((tag) => tag.trim().replace(/^W\//, '').replaceAll('"', ''));
  return tags.includes('*') || tags.includes(etag);
}

// HTTP dates have no fractions of a second.
function wholeSeconds(time: string): number {
  return Math.floor(Date.parse(time) / 1000) * 1000;
}

export interface ByteRange {
  start: number;
  end: number;
}

/** The bytes a Range header asks for; undefined means all, also where the header makes no sense or names several. */
export function parseRange(header: string | undefined, size: number): ByteRange | undefined {
  const match = /^bytes=(\d*)-(\d*)$/.exec(header?.trim() ?? '');
  const [, first = '', last = ''] = match ?? [];
  if (first === '' && last === '') return undefined;
  if (first !== '' && last !== '' && Number(first) > Number(last)) return undefined;
  const start = first === '' ? Math.max(0, size - Number(last)) : Number(first);
  const end = first === '' || last === '' ? size - 1 : Math.min(Number(last), size - 1);
  if (start > end || (first === '' && Number(last) === 0)) {
    throw new S3Error('InvalidRange', undefined, {
      RangeRequested: header ?? '',
      ActualObjectSize: String(size),
    });
  }
  return { start, end };
}
