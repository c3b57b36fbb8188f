import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Problem } from './problem.mjs';
import { runCommand } from './processes.mjs';

const STAMP = 'node_modules/.kerfside-lock-hash';

/** Runs `npm ci` unless node_modules is what package-lock.json says; answers whether it ran. */
export async function installNpmPackages(root) {
  const lock = readFileSync(join(root, 'package-lock.json'), 'utf8');
  const hash = createHash('sha256').update(lock).digest('hex');
  const stamp = join(root, STAMP);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8').trim() === hash) return false;
  const upToDate = installedLockMatches(root, JSON.parse(lock));
  if (!upToDate) await npmCi(root);
  writeFileSync(stamp, `${hash}\n`);
  return !upToDate;
}

/** npm keeps a lock of what it installed: a plain `npm install` by a developer must not set off `npm ci`. */
export function installedLockMatches(root, lock) {
  const file = join(root, 'node_modules/.package-lock.json');
  if (!existsSync(file)) return false;
  const installed = JSON.parse(readFileSync(file, 'utf8')).packages ?? {};
  return Object.entries(lock.packages).every(([path, wanted]) => {
    if (!path.includes('node_modules/') || wanted.link) return true;
    const found = installed[path];
    // Optional ones are for other systems: npm leaves them out.
    if (!found) return Boolean(wanted.optional || wanted.devOptional);
    return found.version === wanted.version;
  });
}

async function npmCi(root) {
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--no-progress'];
  const { code, output } = await runCommand('npm', args, { cwd: root });
  if (code !== 0) {
    throw new Problem('npm ci failed. Is the npm registry within reach?', { output: output.trimEnd().split('\n').slice(-30).join('\n') });
  }
}
