import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { identity, isAlive } from './process-identity.mjs';

/**
 * Runs `work` while no other start or test installs or builds in this checkout: two at once would
 * delete each other's node_modules and dist. A lock whose holder is gone is taken over.
 */
export async function withCheckoutLock(root, work, { say = () => {}, check = () => {} } = {}) {
  const file = join(root, '.cache/install-and-build.lock');
  mkdirSync(join(root, '.cache'), { recursive: true });
  let told = false;
  let unreadable = 0;
  while (!take(file)) {
    const holder = read(file);
    unreadable = holder ? 0 : unreadable + 1;
    if ((holder && !isAlive(holder)) || unreadable > 25) rmSync(file, { force: true });
    else {
      if (!told && holder) say(`Waiting for process ${holder.pid}, which installs or builds in this checkout.`);
      told ||= Boolean(holder);
      await pause(200);
      check();
    }
  }
  try {
    return await work();
  } finally {
    rmSync(file, { force: true });
  }
}

function take(file) {
  try {
    writeFileSync(file, JSON.stringify(identity(process.pid)), { flag: 'wx' });
    return true;
  } catch (error) {
    if (error.code === 'EEXIST') return false;
    throw error;
  }
}

/** Null while its holder is still writing it (or was killed while it wrote). */
function read(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}
