import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readSecrets } from './secrets.mjs';
import { localAddress, readSettings } from './settings.mjs';

let root;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'kerfside-settings-'));
  writeFileSync(
    join(root, '.env.example'),
    [
      '# comment',
      'KERFSIDE_HOST=127.0.0.1',
      'KERFSIDE_PORT=4300',
      'KERFSIDE_DB_PORT=4306',
      'KERFSIDE_OBJECT_STORE_PORT=4390',
      'KERFSIDE_SMTP_PORT=4325',
      'KERFSIDE_MAIL_PORT=4326',
      'KERFSIDE_DATA=.data',
      'KERFSIDE_PUBLIC_URL=http://127.0.0.1:4300',
      'KERFSIDE_DB_URL=',
    ].join('\n'),
  );
});
afterEach(() => rmSync(root, { recursive: true }));

describe('settings', () => {
  it('lets .env change a default and the environment win over both', () => {
    writeFileSync(join(root, '.env'), 'KERFSIDE_PORT=5000\nKERFSIDE_DB_PORT="5001"\n');
    const settings = readSettings(root, { KERFSIDE_PORT: '6000', KERFSIDE_DB_URL: '' });
    expect(settings).toMatchObject({ KERFSIDE_PORT: '6000', KERFSIDE_DB_PORT: '5001', KERFSIDE_SMTP_PORT: '4325', KERFSIDE_DB_URL: '' });
  });

  it('puts the data folder into the checkout, whatever folder it is run from', () => {
    expect(readSettings(root, {}).KERFSIDE_DATA).toBe(join(root, '.data'));
    expect(readSettings(root, { KERFSIDE_DATA: '/srv/kerfside' }).KERFSIDE_DATA).toBe('/srv/kerfside');
  });

  it('lets the public address follow host and port unless it is given', () => {
    expect(readSettings(root, { KERFSIDE_PORT: '6000' }).KERFSIDE_PUBLIC_URL).toBe('http://127.0.0.1:6000');
    const given = { KERFSIDE_PORT: '6000', KERFSIDE_PUBLIC_URL: 'https://board.example' };
    expect(readSettings(root, given).KERFSIDE_PUBLIC_URL).toBe('https://board.example');
    expect(localAddress({ KERFSIDE_HOST: '0.0.0.0', KERFSIDE_PORT: '80' })).toBe('http://127.0.0.1:80');
    expect(localAddress({ KERFSIDE_HOST: '::1', KERFSIDE_PORT: '80' })).toBe('http://[::1]:80');
  });

  it.each(['0', '65536', '43oo', '-1', '1.5'])('refuses %s as a port and names the setting', (value) => {
    expect(() => readSettings(root, { KERFSIDE_MAIL_PORT: value })).toThrow(/KERFSIDE_MAIL_PORT/);
  });
});

describe('secrets', () => {
  it('makes them once, long, different, for their owner alone', () => {
    const first = readSecrets(join(root, 'data'));
    expect(readSecrets(join(root, 'data'))).toEqual(first);
    expect(readSecrets(join(root, 'other')).tokenSecret).not.toBe(first.tokenSecret);
    expect(new Set(Object.values(first)).size).toBe(3);
    for (const secret of Object.values(first)) expect(secret.length).toBeGreaterThanOrEqual(32);
    expect(statSync(join(root, 'data/secrets.json')).mode & 0o777).toBe(0o600);
  });

  it('does not replace a file that it cannot read', () => {
    readSecrets(root);
    writeFileSync(join(root, 'secrets.json'), '{"tokenSecret": "half');
    expect(() => readSecrets(root)).toThrow(/secrets.json/);
    expect(readFileSync(join(root, 'secrets.json'), 'utf8')).toBe('{"tokenSecret": "half');
  });
});
