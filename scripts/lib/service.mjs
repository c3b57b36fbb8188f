import { setTimeout as pause } from 'node:timers/promises';
import { Problem } from './problem.mjs';
import { exited, hasExited, logTail, spawnService, stopProcess } from './processes.mjs';

/**
 * A long-running child: `prepare` (once before each start), `command()` → {file, args, cwd, env},
 * `isReady()` asked until it answers true.
 */
export function createService({ title, logFile, prepare, command, isReady, afterReady, readyWithinMs = 90_000 }) {
  let child = null;
  let stopping = false;
  const exitListeners = new Set();

  async function start() {
    if (child && !hasExited(child)) return;
    stopping = false;
    await prepare?.();
    if (stopping) throw new Problem(`${title} was stopped while it started.`);
    const own = spawnService({ ...command(), logFile });
    child = own;
    let spawnError = null;
    own.once('error', (error) => {
      spawnError = error;
    });
    own.once('exit', (code, signal) => {
      if (!stopping) for (const listener of exitListeners) listener({ code, signal });
    });
    await waitUntilReady(own, () => spawnError);
    await afterReady?.();
  }

  async function waitUntilReady(own, spawnError) {
    const deadline = Date.now() + readyWithinMs;
    const end = exited(own);
    while (!(await isReady())) {
      if (stopping) throw new Problem(`${title} was stopped while it started.`);
      if (spawnError() || hasExited(own)) {
        const why = spawnError()?.message ?? `ended with ${own.signalCode ?? `code ${own.exitCode}`}`;
        throw new Problem(`${title} did not start: ${why}. Its log: ${logFile}`, { output: logTail(logFile) });
      }
      if (Date.now() > deadline) {
        await stop();
        throw new Problem(`${title} was not ready after ${readyWithinMs / 1000} s. Its log: ${logFile}`, {
          output: logTail(logFile),
        });
      }
      await Promise.race([pause(100), end]);
    }
  }

  async function stop() {
    stopping = true;
    if (child) await stopProcess(child);
  }

  return {
    title,
    logFile,
    start,
    stop,
    get pid() {
      return child && !hasExited(child) ? child.pid : null;
    },
    /** Calls `listener({code, signal})` when the child ends without having been asked to. */
    onUnexpectedExit(listener) {
      exitListeners.add(listener);
    },
  };
}
