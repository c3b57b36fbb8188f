import { request as send, type IncomingHttpHeaders } from 'node:http';
import type { S3Client } from '@aws-sdk/client-s3';

/** A request of the SDK after it was signed, just before it goes out. */
export interface OutgoingRequest {
  method: string;
  path: string;
  query: Record<string, string | string[] | null>;
  headers: Record<string, string>;
  body?: unknown;
}

/** Lets a test change a request after the SDK has signed it. */
export function afterSigning(client: S3Client, change: (request: OutgoingRequest) => void): S3Client {
  client.middlewareStack.add(
    (next) => (args) => {
      change(args.request as OutgoingRequest);
      return next(args);
    },
    { step: 'finalizeRequest', priority: 'low', name: 'changeAfterSigning' },
  );
  return client;
}

/** Lets a test change a request before the SDK signs it. */
export function beforeSigning(client: S3Client, change: (request: OutgoingRequest) => void): S3Client {
  client.middlewareStack.add(
    (next) => (args) => {
      change(args.request as OutgoingRequest);
      return next(args);
    },
    { step: 'build', priority: 'low', name: 'changeBeforeSigning' },
  );
  return client;
}

export interface Refusal {
  code: string;
  status: number | undefined;
}

/** The code and status of the error that a call must end with. */
export async function refusal(call: Promise<unknown>): Promise<Refusal> {
  const outcome = await call.then(
    () => undefined,
    (error: { name: string; Code?: string; $metadata?: { httpStatusCode?: number } }) => ({
      code: error.Code ?? error.name,
      status: error.$metadata?.httpStatusCode,
    }),
  );
  if (outcome === undefined) throw new Error('the call was not refused');
  return outcome;
}

export interface PlainAnswer {
  status: number;
  headers: IncomingHttpHeaders;
  text: string;
}

/** A request that is sent as it stands: `fetch` would tidy up the path. */
export function plain(
  base: string,
  path: string,
  { method = 'GET', headers = {}, body = '' }: { method?: string; headers?: Record<string, string>; body?: string } = {},
): Promise<PlainAnswer> {
  const { hostname, port } = new URL(base);
  return new Promise((resolve, reject) => {
    const outgoing = send({ hostname, port, path, method, headers, agent: false }, (answer) => {
      const pieces: Buffer[] = [];
      answer.on('data', (piece: Buffer) => pieces.push(piece));
      answer.on('error', reject);
      answer.on('end', () =>
        resolve({
          status: answer.statusCode ?? 0,
          headers: answer.headers,
          text: Buffer.concat(pieces).toString('utf8'),
        }),
      );
    });
    outgoing.on('error', reject);
    outgoing.end(body);
  });
}

/** What stands in an element of an XML answer. */
export function xmlText(xml: string, name: string): string | undefined {
  return new RegExp(`<${name}>([^<]*)</${name}>`).exec(xml)?.[1];
}
