import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Problem } from './problem.mjs';
import { runCommand } from './processes.mjs';

/** Workspaces in the order they are built; `product` shows that a build is there, `also` counts as source. */
export const BUILDS = [
  { workspace: 'object-store-fake', product: 'dist/main.js' },
  { workspace: 'mail-fake', product: 'dist/main.js' },
  { workspace: 'conference-api', product: 'dist/main.js' },
  // The web computes live figures with the API's own functions and takes its types from the API's description.
  { workspace: 'conference-web', product: 'dist/index.html', also: ['conference-api/src/calc', 'conference-api/openapi.json'] },
];

const COMMON = ['package-lock.json', 'tsconfig.base.json'];
const IGNORED = new Set(['node_modules', 'dist', 'coverage', 'screenshots', '.cache']);
const IGNORED_AT_THE_TOP = new Set(['test', 'e2e', 'docs', 'README.md', 'jest.config.mjs', 'jest.e2e.config.mjs']);

/** A hash of everything that a workspace's build depends on. */
export function sourceHash(root, { workspace, also = [] }) {
  const hash = createHash('sha256').update(process.version);
  for (const path of [...COMMON, ...also]) addToHash(hash, root, path);
  addToHash(hash, root, workspace, IGNORED_AT_THE_TOP);
  return hash.digest('hex');
}

/** A hash of files and folders by their names and contents, tests left out. */
export function hashOf(root, paths) {
  const hash = createHash('sha256');
  for (const path of paths) addToHash(hash, root, path);
  return hash.digest('hex');
}

function addToHash(hash, root, path, alsoIgnored = new Set()) {
  const full = join(root, path);
  if (!existsSync(full)) return;
  if (!statSync(full).isDirectory()) {
    hash.update(`\0${path}\0`).update(readFileSync(full));
    return;
  }
  for (const name of readdirSync(full).sort()) {
    if (IGNORED.has(name) || alsoIgnored.has(name) || /[.-]spec\.(tsx?|mjs)$/.test(name)) continue;
    addToHash(hash, root, `${path}/${name}`);
  }
}

export function isBuilt(root, build) {
  const stamp = stampFile(root, build);
  if (!existsSync(join(root, build.workspace, build.product)) || !existsSync(stamp)) return false;
  return readFileSync(stamp, 'utf8') === sourceHash(root, build);
}

/** Builds one workspace unless it is built from these very sources; answers whether it had to. */
export async function buildWorkspace(root, build) {
  if (isBuilt(root, build)) return false;
  const hash = sourceHash(root, build);
  const stamp = stampFile(root, build);
  rmSync(stamp, { force: true });
  const { code, output } = await runCommand('npm', ['run', 'build', '-w', build.workspace], { cwd: root });
  if (code !== 0) throw new Problem(`${build.workspace} could not be built.`, { output });
  if (!existsSync(join(root, build.workspace, build.product))) {
    throw new Problem(`The build of ${build.workspace} left no ${build.product}.`, { output });
  }
  mkdirSync(join(root, 'node_modules/.cache/kerfside'), { recursive: true });
  writeFileSync(stamp, hash);
  return true;
}

function stampFile(root, { workspace }) {
  return join(root, 'node_modules/.cache/kerfside', `${workspace}.hash`);
}
