import { createServer } from 'node:net';
import { Problem } from './problem.mjs';

/** Null when the port can be had, otherwise the system's code (EADDRINUSE, EACCES, EADDRNOTAVAIL). */
export function portTrouble(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', (error) => resolve(error.code));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(null)));
  });
}

/** A port that is free now; the system picks it. */
export function freePort(host = '127.0.0.1') {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, host, () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}

/** Several different free ports: all are held until the last one is found. */
export async function freePorts(count, host = '127.0.0.1') {
  const servers = [];
  for (let i = 0; i < count; i += 1) {
    servers.push(
      await new Promise((resolve, reject) => {
        const server = createServer();
        server.once('error', reject);
        server.listen(0, host, () => resolve(server));
      }),
    );
  }
  const ports = servers.map((server) => server.address().port);
  await Promise.all(servers.map((server) => new Promise((done) => server.close(done))));
  return ports;
}

/** Throws a Problem that names the setting to change unless every one of `wanted` [{setting, port, host}] is free. */
export async function checkPortsFree(wanted) {
  const seen = new Map();
  for (const { setting, port, host } of wanted) {
    const other = seen.get(port);
    if (other) throw new Problem(`${other} and ${setting} are both ${port}: set one of them to another port.`);
    seen.set(port, setting);
    const code = await portTrouble(port, host);
    if (code) throw new Problem(portMessage(code, { setting, port, host }));
  }
}

function portMessage(code, { setting, port, host }) {
  if (code === 'EADDRINUSE') return `Port ${port} is taken: set ${setting} to another one.`;
  if (code === 'EACCES') return `Port ${port} is not allowed for this account: set ${setting} to one from 1024.`;
  if (code === 'EADDRNOTAVAIL' || code === 'ENOTFOUND') {
    return `${host} is not an address of this machine: set KERFSIDE_HOST to one that is.`;
  }
  return `Port ${port} can't be opened (${code}): set ${setting} to another one.`;
}
