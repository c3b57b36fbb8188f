import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { withDrawnImages } from './drawn-images.mjs';
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

describe('drawn pictures', () => {
  const draw = (folder, text) => async () => {
    mkdirSync(join(folder, 'demo-images'), { recursive: true });
    if (!existsSync(join(folder, 'demo-images/a.png'))) writeFileSync(join(folder, 'demo-images/a.png'), text);
  };
  const seen = (folder) => readFileSync(join(folder, 'demo-images/a.png'), 'utf8');

  it('are drawn again only when the drawing program changes, or when drawing was cut short', async () => {
    const root = join(dataDir, 'checkout');
    mkdirSync(join(root, 'scripts/phantom'), { recursive: true });
    writeFileSync(join(root, 'scripts/phantom/main.mjs'), 'first');
    const folders = ['one', 'two', 'three', 'four'].map((name) => join(dataDir, name));
    const failing = async () => {
      await draw(folders[0], 'half')();
      throw new Error('cut short');
    };
    await expect(withDrawnImages(root, folders[0], failing)).rejects.toThrow('cut short');
    await withDrawnImages(root, folders[1], draw(folders[1], 'whole'));
    await withDrawnImages(root, folders[2], draw(folders[2], 'not needed'));
    writeFileSync(join(root, 'scripts/phantom/main.mjs'), 'second');
    await withDrawnImages(root, folders[3], draw(folders[3], 'other'));
    expect(folders.slice(1).map(seen)).toEqual(['whole', 'whole', 'other']);
  });
});
