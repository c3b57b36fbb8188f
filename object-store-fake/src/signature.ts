import { createHash, createHmac } from 'node:crypto';

/** Where and when a signing key is valid; Signature Version 4 calls it the credential scope. */
export interface SigningScope {
  date: string;
  region: string;
  service: string;
}

export type QueryPair = readonly [name: string, value: string];

export interface CanonicalParts {
  method: string;
  /** The path as it stood in the request line, still encoded. */
  rawPath: string;
  query: readonly QueryPair[];
  headers: Readonly<Record<string, readonly string[] | undefined>>;
  signedHeaders: readonly string[];
  payloadHash: string;
}

export function sha256Hex(data: string | Buffer): string {
  return createHash('sha256').update(data).digest('hex');
}

export function hmac(key: string | Buffer, text: string): Buffer {
  return createHmac('sha256', key).update(text).digest();
}

export function scopeText(scope: SigningScope): string {
  return `${scope.date}/${scope.region}/${scope.service}/aws4_request`;
}

export function signingKey(secretAccessKey: string, scope: SigningScope): Buffer {
  const day = hmac(`AWS4${secretAccessKey}`, scope.date);
  return hmac(hmac(hmac(day, scope.region), scope.service), 'aws4_request');
}

/** Percent-encodes all but RFC 3986's unreserved characters. */
export function uriEncode(text: string): string {
  return encodeURIComponent(text).replace(
    /[!'()*]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  );
}

// S3 encodes the path once, and neither resolves '..' nor joins slashes: both may be part of a key.
function canonicalPath(rawPath: string): string {
  return decodeURIComponent(rawPath).split('/').map(uriEncode).join('/');
}

function canonicalQuery(query: readonly QueryPair[]): string {
  return query
    .map(([name, value]) => `${uriEncode(name)}=${uriEncode(value)}`)
    .sort((left, right) => compareEncoded(left, right))
    .join('&');
}

// By name first, then by value: '=' sorts after '%' and digits, so whole pairs can't be compared.
function compareEncoded(left: string, right: string): number {
  const [leftName = '', leftValue = ''] = left.split('=');
  const [rightName = '', rightValue = ''] = right.split('=');
  if (leftName !== rightName) return leftName < rightName ? -1 : 1;
  if (leftValue === rightValue) return 0;
  return leftValue < rightValue ? -1 : 1;
}

function canonicalHeader(name: string, values: readonly string[]): string {
  return `${name}:${values.map((value) => value.trim().replace(/ +/g, ' ')).join(',')}\n`;
}

export function canonicalRequest(parts: CanonicalParts): string {
  return [
    parts.method,
    canonicalPath(parts.rawPath),
    canonicalQuery(parts.query),
    parts.signedHeaders.map((name) => canonicalHeader(name, parts.headers[name] ?? [])).join(''),
    parts.signedHeaders.join(';'),
    parts.payloadHash,
  ].join('\n');
}

export function stringToSign(timestamp: string, scope: SigningScope, canonical: string): string {
  return ['AWS4-HMAC-SHA256', timestamp, scopeText(scope), sha256Hex(canonical)].join('\n');
}
