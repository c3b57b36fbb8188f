import { S3Error } from './errors.js';

export interface ListRequest {
  prefix: string;
  delimiter: string;
  startAfter: string;
  token: string | undefined;
  maxKeys: number;
}

export interface ListPage {
  keys: string[];
  prefixes: string[];
  /** Undefined on the last page. */
  nextToken: string | undefined;
}

/** One page of a listing: keys, or in place of those with the delimiter after the prefix their common start. */
export function listPage(sortedKeys: readonly string[], request: ListRequest): ListPage {
  const page: ListPage = { keys: [], prefixes: [], nextToken: undefined };
  if (request.maxKeys === 0) return page;
  const isPast = skipper(request);
  let last = '';
  for (const key of sortedKeys) {
    if (!key.startsWith(request.prefix) || isPast(key)) continue;
    const group = groupOf(key, request);
    if (group !== undefined && group === page.prefixes.at(-1)) continue;
    if (page.keys.length + page.prefixes.length === request.maxKeys) {
      page.nextToken = last;
      return page;
    }
    if (group === undefined) page.keys.push(key);
    else page.prefixes.push(group);
    last = group === undefined ? encodeToken('k', key) : encodeToken('p', group);
  }
  return page;
}

function groupOf(key: string, { prefix, delimiter }: ListRequest): string | undefined {
  if (delimiter === '') return undefined;
  const at = key.indexOf(delimiter, prefix.length);
  return at < 0 ? undefined : key.slice(0, at + delimiter.length);
}

function skipper(request: ListRequest): (key: string) => boolean {
  const { kind, value } =
    request.token === undefined ? { kind: 'k', value: request.startAfter } : decodeToken(request.token);
  if (value === '') return () => false;
  const bytes = Buffer.from(value);
  return (key) =>
    (kind === 'p' && key.startsWith(value)) || Buffer.compare(Buffer.from(key), bytes) <= 0;
}

function encodeToken(kind: 'k' | 'p', value: string): string {
  return Buffer.from(kind + value).toString('base64url');
}

function decodeToken(token: string): { kind: string; value: string } {
  const text = Buffer.from(token, 'base64url').toString();
  if (!/^[kp]./s.test(text) || Buffer.from(text).toString('base64url') !== token) {
    throw new S3Error('InvalidArgument', 'The continuation token provided is incorrect', {
      ArgumentName: 'continuation-token',
    });
  }
  return { kind: text.slice(0, 1), value: text.slice(1) };
}
