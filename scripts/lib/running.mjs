import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { Problem } from './problem.mjs';
import { identity, isAlive } from './process-identity.mjs';
import { signalGroup } from './processes.mjs';

/**
 * running.json in the data folder says whose it is at the moment. Left by a start that was killed, it
 * leads to that start's children, which are ended; it never stops a new start by itself.
 */
export function createRunningFile(dataDir) {
  const file = join(dataDir, 'running.json');

  function read() {
    try {
      return JSON.parse(readFileSync(file, 'utf8'));
    } catch {
      return null;
    }
  }

  return {
    /** Ends children that outlived a killed start. */
    async clearLeftovers(patienceMs = 20_000) {
      const last = read();
      if (!last || isAlive(last.parent)) return [];
      const left = last.children.filter(isAlive);
      for (const child of left) signalGroup(child.pid, 'SIGTERM');
      const deadline = Date.now() + patienceMs;
      while (left.some(isAlive)) {
        if (Date.now() > deadline) for (const child of left.filter(isAlive)) signalGroup(child.pid, 'SIGKILL');
        await pause(100);
      }
      rmSync(file, { force: true });
      return left;
    },
    checkUnused() {
      const last = read();
      if (!last || last.parent.pid === process.pid || !isAlive(last.parent)) return;
      throw new Problem(
        `Kerfside is already running on ${dataDir} (process ${last.parent.pid}). Stop it first, or set KERFSIDE_DATA to another folder.`,
      );
    },
    write(childPids) {
      const children = childPids.filter(Boolean).map(identity);
      writeFileSync(file, `${JSON.stringify({ parent: identity(process.pid), children })}\n`, { mode: 0o600 });
    },
    remove() {
      if (existsSync(file) && read()?.parent.pid === process.pid) rmSync(file);
    },
  };
}
