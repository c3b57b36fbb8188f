import { createConnection, type Socket } from 'node:net';
import { type FieldError, invalidInput, Problem } from './problem.js';

export interface Delivery {
  host: string;
  port: number;
  from: string;
  to: string[];
  raw: string;
}

const ANSWER_WITHIN_MS = 30_000;
const ADDRESS = /^[^\s<>]+@[^\s<>]+$/;
const LOOPBACK = /^(localhost|127\.\d{1,3}\.\d{1,3}\.\d{1,3}|\[::1\])$/;

/** Reads the body of `POST /api/deliver`; only loopback servers are allowed. */
export function readDelivery(body: unknown): Delivery {
  const input = (typeof body === 'object' && body !== null ? body : {}) as Record<string, unknown>;
  const errors: FieldError[] = [];
  const url = typeof input.smtpUrl === 'string' && URL.canParse(input.smtpUrl) ? new URL(input.smtpUrl) : null;
  if (url?.protocol !== 'smtp:' || !url.port) {
    errors.push({ field: 'smtpUrl', code: 'not-allowed', message: 'must be like smtp://127.0.0.1:2525' });
  } else if (!LOOPBACK.test(url.hostname)) {
    errors.push({ field: 'smtpUrl', code: 'not-loopback', message: 'must name a loopback host' });
  }
  const from = input.from;
  if (typeof from !== 'string' || (from !== '' && !ADDRESS.test(from))) {
    errors.push({ field: 'from', code: 'not-an-address', message: 'must be an address, or empty' });
  }
  const to = Array.isArray(input.to) ? input.to : [input.to];
  if (to.length === 0 || !to.every((address) => typeof address === 'string' && ADDRESS.test(address))) {
    errors.push({ field: 'to', code: 'not-an-address', message: 'must be an address or a list of addresses' });
  }
  if (typeof input.raw !== 'string' || input.raw === '') {
    errors.push({ field: 'raw', code: 'missing', message: 'must be the message as text' });
  }
  if (errors.length > 0 || !url) {
    throw invalidInput(errors);
  }
  const host = url.hostname.replace(/^\[|\]$/g, '');
  return { host, port: Number(url.port), from: from as string, to: to as string[], raw: input.raw as string };
}

/** Plays one message by SMTP (RFC 5321) and returns the server's last reply. */
export async function deliver(delivery: Delivery): Promise<string> {
  const socket = createConnection({ host: delivery.host, port: delivery.port });
  socket.setTimeout(ANSWER_WITHIN_MS, () => socket.destroy(new Error('no answer in time')));
  try {
    return await converse(socket, delivery);
  } catch (error) {
    throw error instanceof Problem ? error : notTaken((error as Error).message);
  } finally {
    socket.destroy();
  }
}

async function converse(socket: Socket, { from, to, raw }: Delivery): Promise<string> {
  const replies = readReplies(socket);
  const say = async (line: string | null, expected: string): Promise<string> => {
    if (line !== null) {
      socket.write(`${line}\r\n`);
    }
    const { value: reply, done } = await replies.next();
    if (done) {
      throw notTaken('the connection was closed');
    }
    if (!reply.startsWith(expected)) {
      throw notTaken(reply);
    }
    return reply;
  };
  await say(null, '2');
  await say('EHLO mail-fake', '2');
  await say(`MAIL FROM:<${from}>`, '2');
  for (const address of to) {
    await say(`RCPT TO:<${address}>`, '2');
  }
  await say('DATA', '3');
  const reply = await say(`${stuffDots(raw)}\r\n.`, '2');
  await say('QUIT', '2').catch(() => undefined);
  return reply;
}

/** Line ends as CR LF, and a dot before each leading dot (RFC 5321 4.5.2). */
function stuffDots(raw: string): string {
  return raw
    .replace(/\r?\n$/, '')
    .replace(/\r?\n/g, '\r\n')
    .replace(/^\./gm, '..');
}

async function* readReplies(socket: Socket): AsyncGenerator<string, undefined> {
  let reply: string[] = [];
  for await (const line of linesOf(socket)) {
    reply.push(line);
    // A dash after the code says that more lines follow.
    if (/^\d{3}( |$)/.test(line)) {
      yield reply.join(' ');
      reply = [];
    }
  }
  return undefined;
}

async function* linesOf(socket: Socket): AsyncGenerator<string> {
  let rest = '';
  for await (const chunk of socket.setEncoding('utf8')) {
    const lines = (rest + String(chunk)).split('\r\n');
    rest = lines.pop() ?? '';
    yield* lines;
  }
}

function notTaken(reply: string): Problem {
  return new Problem(502, 'not-delivered', `The server answered: ${reply}`);
}
