import { createServer, type Server } from 'node:http';
import type { AddressInfo, Server as NetServer } from 'node:net';
import { Behaviour } from './behaviour.js';
import { createHttpApp } from './http.js';
import { createSmtpServer } from './smtp.js';
import { MessageStore } from './store.js';

const LOOPBACK = '127.0.0.1';

export interface MailFakeOptions {
  /** 0 takes any free port. */
  smtpPort: number;
  /** 0 takes any free port. */
  httpPort: number;
  dataDir: string;
}

export interface MailFake {
  smtpPort: number;
  httpPort: number;
  close(): Promise<void>;
}

/** A port that something else listens on. */
export class PortTaken extends Error {
  constructor(
    readonly part: 'smtp' | 'http',
    readonly port: number,
  ) {
    super(`Port ${port} is taken`);
  }
}

/** Starts both sides on loopback, with the messages that `dataDir` holds already. */
export async function startMailFake({ smtpPort, httpPort, dataDir }: MailFakeOptions): Promise<MailFake> {
  const store = await MessageStore.open(dataDir);
  const behaviour = new Behaviour();
  const smtp = createSmtpServer(store, behaviour);
  const http = createServer(createHttpApp(store, behaviour));
  // A connection that breaks is the business of its sender.
  smtp.on('error', () => undefined);
  const closeSmtp = () => new Promise<void>((resolve) => smtp.close(resolve));

  const openSmtpPort = await listen(smtp.server, smtpPort, 'smtp');
  const openHttpPort = await listen(http, httpPort, 'http').catch(async (error: unknown) => {
    await closeSmtp();
    throw error;
  });
  const close = async () => {
    behaviour.close();
    await Promise.all([closeSmtp(), closeHttp(http)]);
    await store.close();
  };
  let closing: Promise<void> | null = null;
  return { smtpPort: openSmtpPort, httpPort: openHttpPort, close: () => (closing ??= close()) };
}

function listen(server: NetServer, port: number, part: 'smtp' | 'http'): Promise<number> {
  return new Promise((resolve, reject) => {
    const refuse = (error: NodeJS.ErrnoException) =>
      reject(error.code === 'EADDRINUSE' ? new PortTaken(part, port) : error);
    server.once('error', refuse);
    server.listen(port, LOOPBACK, () => {
      server.off('error', refuse);
      resolve((server.address() as AddressInfo).port);
    });
  });
}

function closeHttp(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => resolve());
    server.closeAllConnections();
  });
}
