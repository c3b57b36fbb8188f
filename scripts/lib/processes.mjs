import { spawn } from 'node:child_process';
import { closeSync, existsSync, mkdirSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import { dirname } from 'node:path';

const SETPRIV = '/usr/bin/setpriv';
const LOG_LIMIT = 5 * 1024 * 1024;

/**
 * Starts a long-running child in a process group of its own (a Ctrl-C reaches the parent alone, which
 * then stops all in order). On Linux the kernel ends it when the parent is killed outright.
 */
export function spawnService({ file, args, cwd, env, logFile, toTerminal = false }) {
  const [command, commandArgs] = existsSync(SETPRIV)
    ? [SETPRIV, ['--pdeathsig', 'TERM', '--', file, ...args]]
    : [file, args];
  if (toTerminal) return spawn(command, commandArgs, { cwd, env, detached: true, stdio: ['ignore', 'inherit', 'inherit'] });
  const log = openLog(logFile);
  const child = spawn(command, commandArgs, { cwd, env, detached: true, stdio: ['ignore', log, log] });
  closeSync(log);
  return child;
}

/** Opens a log to append to; one over 5 MB is set aside first, one older log is kept. */
function openLog(logFile) {
  mkdirSync(dirname(logFile), { recursive: true });
  if (existsSync(logFile) && statSync(logFile).size > LOG_LIMIT) renameSync(logFile, `${logFile}.1`);
  return openSync(logFile, 'a', 0o600);
}

/** The end of a log, for a message about what went wrong. */
export function logTail(logFile, lines = 25) {
  if (!existsSync(logFile)) return '';
  return readFileSync(logFile, 'utf8').trimEnd().split('\n').slice(-lines).join('\n');
}

export function hasExited(child) {
  return child.pid === undefined || child.exitCode !== null || child.signalCode !== null;
}

/** Resolves when the child has ended, at once if it already has. */
export function exited(child) {
  if (hasExited(child)) return Promise.resolve();
  return new Promise((resolve) => child.once('exit', () => resolve()));
}

/** Asks a child and its group to end, waits for it, and kills it when it takes longer than `patienceMs`. */
export async function stopProcess(child, { patienceMs = 20_000, signal = 'SIGTERM' } = {}) {
  if (hasExited(child)) return;
  signalGroup(child.pid, signal);
  const timer = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), patienceMs);
  await exited(child);
  clearTimeout(timer);
}

export function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}

const running = new Set();

/** Runs a command to its end: {code, output}. `onOutput` sees the output as it comes. */
export function runCommand(file, args, { cwd, env = process.env, timeoutMs, onOutput } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(file, args, { cwd, env, detached: true, stdio: ['ignore', 'pipe', 'pipe'] });
    running.add(child);
    const chunks = [];
    const take = (chunk) => {
      chunks.push(chunk);
      onOutput?.(chunk);
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    let overdue = false;
    const timer = timeoutMs && setTimeout(() => {
      overdue = true;
      signalGroup(child.pid, 'SIGKILL');
    }, timeoutMs);
    const finish = () => {
      clearTimeout(timer);
      running.delete(child);
    };
    child.once('error', (error) => {
      finish();
      reject(error);
    });
    child.once('close', (code, signal) => {
      finish();
      let output = Buffer.concat(chunks).toString('utf8');
      if (overdue) output += `\nEnded after ${timeoutMs / 1000} s without an answer.\n`;
      resolve({ code: code ?? 1, signal, output });
    });
  });
}

/** Ends every command that `runCommand` has not finished yet, and waits for them. */
export async function stopCommands() {
  await Promise.all([...running].map((child) => stopProcess(child)));
}
