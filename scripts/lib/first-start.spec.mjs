import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createFirstStart } from './first-start.mjs';

let dataDir;
const table = () => join(dataDir, 'mariadb/people.ibd');
beforeEach(() => {
  dataDir = mkdtempSync(join(tmpdir(), 'kerfside-first-'));
});
afterEach(() => rmSync(dataDir, { recursive: true }));

function makeDatabase() {
  mkdirSync(join(dataDir, 'mariadb'));
  writeFileSync(table(), 'rows');
}

describe('the first start', () => {
  it('begins anew when it was interrupted, keeping the secrets', () => {
    writeFileSync(join(dataDir, 'secrets.json'), '{}');
    expect(createFirstStart(dataDir).begin()).toBe(false);
    makeDatabase();
    expect(createFirstStart(dataDir).begin()).toBe(true);
    expect(existsSync(table())).toBe(false);
    expect(existsSync(join(dataDir, 'secrets.json'))).toBe(true);
    expect(createFirstStart(dataDir).isUnderWay).toBe(true);
  });

  it('leaves a database alone once it is finished', () => {
    const first = createFirstStart(dataDir);
    first.begin();
    makeDatabase();
    first.finish();
    expect(createFirstStart(dataDir).begin()).toBe(false);
    expect(readFileSync(table(), 'utf8')).toBe('rows');
  });

  it('leaves a database alone that it has not made', () => {
    makeDatabase();
    expect(createFirstStart(dataDir).begin()).toBe(false);
    expect(createFirstStart(dataDir).isUnderWay).toBe(false);
    expect(createFirstStart(dataDir).begin()).toBe(false);
    expect(readFileSync(table(), 'utf8')).toBe('rows');
  });
});
