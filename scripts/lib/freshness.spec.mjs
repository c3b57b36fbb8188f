import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { sourceHash } from './builds.mjs';
import { checkNodeVersion } from './install.mjs';
import { installedLockMatches } from './npm-packages.mjs';
import { onDemandSizes, scriptClosure, scriptSize } from './web-size.mjs';

let root;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'kerfside-freshness-'));
});
afterEach(() => rmSync(root, { recursive: true }));

function put(path, text) {
  mkdirSync(dirname(join(root, path)), { recursive: true });
  writeFileSync(join(root, path), text);
}

describe('what a build depends on', () => {
  const build = { workspace: 'web', also: ['api/src/calc'] };
  beforeEach(() => {
    put('web/src/main.ts', 'one');
    put('api/src/calc/panel.ts', 'one');
    put('package-lock.json', '{}');
  });

  it.each(['web/src/main.ts', 'web/src/new.ts', 'api/src/calc/panel.ts', 'package-lock.json'])('%s', (path) => {
    const before = sourceHash(root, build);
    expect(sourceHash(root, build)).toBe(before);
    put(path, 'two');
    expect(sourceHash(root, build)).not.toBe(before);
  });

  it.each(['web/src/main.spec.ts', 'web/dist/main.js', 'web/node_modules/x/index.js', 'web/e2e/path.browser-spec.ts', 'api/src/main.ts'])(
    'not on %s',
    (path) => {
      const before = sourceHash(root, build);
      put(path, 'two');
      expect(sourceHash(root, build)).toBe(before);
    },
  );
});

describe('what npm has installed', () => {
  const lock = {
    packages: {
      '': { name: 'kerfside' },
      web: { name: 'web' },
      'node_modules/web': { link: true },
      'node_modules/a': { version: '1.0.0' },
      'node_modules/for-another-system': { version: '1.0.0', optional: true },
    },
  };
  const installed = (packages) => put('node_modules/.package-lock.json', JSON.stringify({ packages }));

  it('matches the lock, save for what is for other systems', () => {
    expect(installedLockMatches(root, lock)).toBe(false);
    installed({ 'node_modules/a': { version: '1.0.0' } });
    expect(installedLockMatches(root, lock)).toBe(true);
    installed({ 'node_modules/a': { version: '1.0.1' } });
    expect(installedLockMatches(root, lock)).toBe(false);
    installed({});
    expect(installedLockMatches(root, lock)).toBe(false);
  });

  it('needs a Node.js that the packages run on', () => {
    expect(() => checkNodeVersion('20.18.3')).toThrow(/20\.19/);
    expect(() => checkNodeVersion('18.20.0')).toThrow(/20\.19/);
    for (const version of ['20.19.0', '20.20.2', '22.0.0', '24.1.0']) expect(() => checkNodeVersion(version)).not.toThrow();
  });
});

describe('the script that a page loads', () => {
  const manifest = {
    'index.html': { file: 'assets/index.js', isEntry: true, imports: ['_react.js'], dynamicImports: ['src/list.tsx', 'src/editor.tsx'] },
    '_react.js': { file: 'assets/react.js' },
    'src/list.tsx': { file: 'assets/list.js', isDynamicEntry: true, imports: ['_table.js', '_react.js'], css: ['assets/list.css'] },
    '_table.js': { file: 'assets/table.js', imports: ['index.html'] },
    'src/editor.tsx': { file: 'assets/editor.js', isDynamicEntry: true, imports: ['_react.js', '_table.js'] },
    'src/look.css': { file: 'assets/look.css' },
  };

  it('is its own and all it imports, each file once, and no more', () => {
    expect([...scriptClosure(manifest, ['index.html', 'src/list.tsx'])].sort()).toEqual([
      'assets/index.js',
      'assets/list.js',
      'assets/react.js',
      'assets/table.js',
    ]);
    expect(() => scriptClosure(manifest, ['src/gone.tsx'])).toThrow(/src\/gone.tsx/);
  });

  it('is weighed as gzip, file by file; what comes on demand is weighed without what is there', () => {
    const texts = { index: 'index;'.repeat(50), react: 'react;'.repeat(80), list: 'list;'.repeat(20), table: 'table;'.repeat(9), editor: 'editor;'.repeat(99) };
    for (const [name, text] of Object.entries(texts)) put(`assets/${name}.js`, text);
    const size = (...names) => names.reduce((sum, name) => sum + gzipSync(texts[name]).length, 0);
    const loaded = scriptClosure(manifest, ['index.html']);
    expect(scriptSize(root, loaded)).toBe(size('index', 'react'));
    expect(Object.fromEntries(onDemandSizes(manifest, root, loaded).map((part) => [part.key, part.size]))).toEqual({
      'src/list.tsx': size('list', 'table'),
      'src/editor.tsx': size('editor', 'table'),
    });
  });
});
