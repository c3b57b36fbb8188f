import type { Request, Response } from 'express';
import { queryValue, type Authenticated, type SignedRequest } from './authentication.js';
import { S3Error } from './errors.js';
import type { QueryPair } from './signature.js';

/** A request in S3's terms: which bucket and key it is about, and its query as it was signed. */
export class S3Call {
  readonly method: string;
  readonly bucket: string;
  readonly key: string;
  readonly signed: SignedRequest;
  authenticated: Authenticated | undefined;

  constructor(
    readonly request: Request,
    readonly response: Response,
  ) {
    const [rawPath = '', rawQuery = ''] = splitOnce(request.originalUrl, '?');
    this.method = request.method;
    this.signed = {
      method: request.method,
      rawPath,
      query: parseQuery(rawQuery),
      headers: request.headersDistinct,
    };
    [this.bucket, this.key] = splitOnce(decode(rawPath).replace(/^\//, ''), '/');
  }

  query(name: string): string | undefined {
    return queryValue(this.signed.query, name);
  }

  get queryNames(): string[] {
    return this.signed.query.map(([name]) => name);
  }

  /** A header; a signed address may carry the `x-amz-*` ones in its query instead. */
  header(name: string): string | undefined {
    const own = this.signed.headers[name];
    if (own !== undefined) return own.join(',');
    return this.hoisted().find(([candidate]) => candidate === name)?.[1];
  }

  /** All headers whose name starts so, in the order they came. */
  headersStarting(prefix: string): QueryPair[] {
    const own = Object.entries(this.signed.headers).map(([name, values]) => [name, (values ?? []).join(',')] as const);
    return [...own, ...this.hoisted()].filter(([name]) => name.startsWith(prefix));
  }

  private hoisted(): QueryPair[] {
    if (this.authenticated?.presigned !== true) return [];
    return this.signed.query
      .map(([name, value]) => [name.toLowerCase(), value] as const)
      .filter(([name]) => name.startsWith('x-amz-'));
  }

  sendXml(body: string, status = 200): void {
    this.response.statusCode = status;
    this.response.setHeader('Content-Type', 'application/xml');
    this.response.end(body);
  }

  sendNothing(status: number): void {
    this.response.statusCode = status;
    this.response.end();
  }
}

function splitOnce(text: string, separator: string): [string, string] {
  const at = text.indexOf(separator);
  return at < 0 ? [text, ''] : [text.slice(0, at), text.slice(at + separator.length)];
}

function parseQuery(rawQuery: string): QueryPair[] {
  return rawQuery
    .split('&')
    .filter((pair) => pair !== '')
    .map((pair) => {
      const [name, value] = splitOnce(pair.replaceAll('+', ' '), '=');
      return [decode(name), decode(value)] as const;
    });
}

function decode(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    throw new S3Error('InvalidURI');
  }
}
