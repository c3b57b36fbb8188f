import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createConnection } from 'mysql2/promise';
import { startMariaDB } from './mariadb.mjs';
import { freePort } from './ports.mjs';

jest.setTimeout(60_000);

async function query(url, sql) {
  const connection = await createConnection(url);
  try {
    return (await connection.query(sql))[0];
  } finally {
    await connection.end();
  }
}

describe('a private MariaDB', () => {
  let folder;
  let server;
  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), 'kerfside-mariadb-'));
    server = await startMariaDB({
      dataDir: join(folder, 'data'),
      port: await freePort(),
      password: 'a-password',
      databases: ['kerfside_test_one', 'kerfside_test_%'],
      durable: false,
    });
  });
  afterAll(async () => {
    await server?.stop();
    rmSync(folder, { recursive: true, force: true });
  });

  it('stands on UTC, utf8mb4 and loopback alone', async () => {
    const [row] = await query(
      server.url,
      'SELECT @@global.time_zone AS zone, @@character_set_server AS charset, @@collation_server AS collation, @@bind_address AS address',
    );
    expect(row).toEqual({ zone: '+00:00', charset: 'utf8mb4', collation: 'utf8mb4_unicode_ci', address: '127.0.0.1' });
  });

  it('lets its user make databases of the given pattern, and no others', async () => {
    await query(server.url, 'CREATE DATABASE kerfside_test_two');
    await expect(query(server.urlOf('kerfside_test_two'), 'CREATE TABLE t (id INT)')).resolves.toBeDefined();
    await expect(query(server.url, 'CREATE DATABASE elsewhere')).rejects.toThrow(/Access denied/);
    await expect(query(server.url, 'CREATE DATABASE kerfsideXtestXtwo')).rejects.toThrow(/Access denied/);
  });

  it('refuses a wrong password', async () => {
    await expect(query(server.url.replace('a-password', 'another'), 'SELECT 1')).rejects.toThrow(/Access denied/);
  });

  it('keeps its data when stopped and started again', async () => {
    await query(server.url, 'CREATE TABLE kept (word VARCHAR(20))');
    await query(server.url, "INSERT INTO kept VALUES ('curette')");
    await server.stop();
    expect(server.pid).toBeNull();
    await expect(query(server.url, 'SELECT 1')).rejects.toThrow(/ECONNREFUSED/);
    await server.start();
    expect(await query(server.url, 'SELECT word FROM kept')).toEqual([{ word: 'curette' }]);
  });

  it('comes back after it was killed, and tells of its end', async () => {
    const pid = server.pid;
    const ended = new Promise((resolve) => server.onUnexpectedExit(resolve));
    process.kill(pid, 'SIGKILL');
    expect(await ended).toEqual({ code: null, signal: 'SIGKILL' });
    await server.start();
    expect(server.pid).not.toBe(pid);
    expect(await query(server.url, 'SELECT word FROM kept')).toEqual([{ word: 'curette' }]);
  });

  it('leaves the file with the password only while it starts', () => {
    expect(existsSync(join(folder, 'data.init.sql'))).toBe(false);
  });

  it('takes no name that could carry SQL', async () => {
    const options = { dataDir: join(folder, 'other'), port: 1, password: "x' OR '1" };
    await expect(startMariaDB(options)).rejects.toThrow(/letters/);
  });
});
