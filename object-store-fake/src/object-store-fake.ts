import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createApp } from './app.js';
import { Behaviour } from './behaviour.js';
import type { Context } from './context.js';
import { MultipartUploads } from './multipart.js';
import { ObjectStore } from './store.js';

export interface ObjectStoreFakeOptions {
  /** 0 takes any free port. */
  port: number;
  dataDir: string;
  accessKeyId: string;
  secretAccessKey: string;
  region: string;
  /** Created at the start where they are missing. */
  buckets: string[];
  /** The most bytes in one upload or one part; S3's own 5 GiB unless given. */
  maxObjectBytes?: number;
  /** The fewest bytes in a part that isn't the last; S3's own 5 MiB unless given. */
  minPartBytes?: number;
}

export interface ObjectStoreFake {
  port: number;
  /** Lets requests under way finish for a moment, then ends them. */
  close(): Promise<void>;
}

const HOST = '127.0.0.1';
const GRACE_MS = 2000;
// Longer than the AWS SDK keeps a connection, so that it doesn't meet one that is just being closed.
const KEEP_ALIVE_MS = 65_000;
const GIB = 1024 ** 3;
const MIB = 1024 ** 2;

/** Starts the server on the loopback address and answers once it takes requests. */
export async function startObjectStoreFake(options: ObjectStoreFakeOptions): Promise<ObjectStoreFake> {
  const server = createServer();
  server.keepAliveTimeout = KEEP_ALIVE_MS;
  // The port first: where another process has it, that one's folder must not be touched.
  await listen(server, options.port);
  const behaviour = new Behaviour();
  const opened = openContext(options).then((context) => createApp(context, options, behaviour));
  server.on('request', (request, response) => {
    opened.then(
      (app) => app(request, response),
      () => response.destroy(),
    );
  });
  try {
    await opened;
  } catch (error) {
    await stop(server);
    throw error;
  }
  return {
    port: (server.address() as AddressInfo).port,
    close: () => {
      behaviour.close();
      return stop(server);
    },
  };
}

async function openContext(options: ObjectStoreFakeOptions): Promise<Context> {
  const store = await ObjectStore.open(options.dataDir);
  for (const bucket of options.buckets) {
    if (!store.hasBucket(bucket)) await store.createBucket(bucket);
  }
  return {
    store,
    uploads: new MultipartUploads(store, options.minPartBytes ?? 5 * MIB),
    region: options.region,
    maxObjectBytes: options.maxObjectBytes ?? 5 * GIB,
  };
}

function listen(server: Server, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, HOST, () => {
      server.off('error', reject);
      resolve();
    });
  });
}

function stop(server: Server): Promise<void> {
  return new Promise((resolve, reject) => {
    const force = setTimeout(() => server.closeAllConnections(), GRACE_MS);
    server.close((error) => {
      clearTimeout(force);
      if (error === undefined) resolve();
      else reject(error);
    });
  });
}
