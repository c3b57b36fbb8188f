import { createServer } from 'node:net';
import { checkPortsFree, freePort, freePorts, portTrouble } from './ports.mjs';

function listen(port, host) {
  const server = createServer();
  return new Promise((resolve) => server.listen(port, host, () => resolve(server)));
}
const close = (server) => new Promise((resolve) => server.close(resolve));

describe('ports', () => {
  it('names the setting of a port that another program listens on', async () => {
    const other = await listen(0, '127.0.0.1');
    const { port } = other.address();
    await expect(checkPortsFree([{ setting: 'KERFSIDE_PORT', port }])).rejects.toThrow(
      `Port ${port} is taken: set KERFSIDE_PORT to another one.`,
    );
    await close(other);
    await expect(checkPortsFree([{ setting: 'KERFSIDE_PORT', port }])).resolves.toBeUndefined();
  });

  it('sees a program that listens on all addresses', async () => {
    const other = await listen(0, '0.0.0.0');
    expect(await portTrouble(other.address().port, '127.0.0.1')).toBe('EADDRINUSE');
    await close(other);
  });

  it('refuses one port for two settings', async () => {
    const port = await freePort();
    const wanted = [
      { setting: 'KERFSIDE_PORT', port },
      { setting: 'KERFSIDE_DB_PORT', port },
    ];
    await expect(checkPortsFree(wanted)).rejects.toThrow(/KERFSIDE_PORT and KERFSIDE_DB_PORT/);
  });

  it('says that the host is not of this machine', async () => {
    // 192.0.2.0/24 belongs to documentation alone (RFC 5737).
    const wanted = [{ setting: 'KERFSIDE_PORT', port: await freePort(), host: '192.0.2.1' }];
    await expect(checkPortsFree(wanted)).rejects.toThrow(/set KERFSIDE_HOST/);
  });

  it('gives different free ports', async () => {
    const ports = await freePorts(20);
    expect(new Set(ports).size).toBe(20);
    for (const port of ports) expect(await portTrouble(port)).toBeNull();
  });
});
