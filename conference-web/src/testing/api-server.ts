import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';

declare global {
  var openPageAt: (url: string) => void;
}

export interface ReceivedRequest {
  method: string;
  path: string;
  authorization: string | null;
  lastEventId: string | null;
  body: string;
}

export type Answer = (request: ReceivedRequest, response: ServerResponse) => void;

async function readBody(request: IncomingMessage): Promise<string> {
  let body = '';
  for await (const chunk of request) body += String(chunk);
  return body;
}

/** A real server for the page under test to talk to; the page is moved to its origin. */
export async function startApiServer(answer: Answer) {
  const received: ReceivedRequest[] = [];
  const server = createServer((request, response) => {
    void readBody(request).then((body) => {
      const entry = {
        method: request.method ?? '',
        path: request.url ?? '',
        authorization: request.headers.authorization ?? null,
        lastEventId: (request.headers['last-event-id'] as string | undefined) ?? null,
        body,
      };
      received.push(entry);
      answer(entry, response);
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  openPageAt(`${origin}/`);
  const close = () =>
    new Promise<void>((resolve) => {
      server.close(() => resolve());
      server.closeAllConnections();
    });
  return { origin, received, close };
}

export function sendJson(response: ServerResponse, status: number, body: unknown, headers: Record<string, string> = {}): void {
  const type = status >= 400 ? 'application/problem+json' : 'application/json';
  response.writeHead(status, { 'content-type': type, ...headers }).end(JSON.stringify(body));
}

export const problem = (status: number, code: string, detail: string, more: object = {}) => ({
  type: `urn:kerfside:problem:${code}`,
  title: 'Refused',
  status,
  detail,
  ...more,
});
