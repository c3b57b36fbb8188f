import { readFileSync } from 'node:fs';

/** When a process was started, in the kernel's ticks; null when there is none. */
function startedAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? null : fields[19];
  } catch {
    return null;
  }
}

/** {pid, started}: a process is told from a later one with the same number by when it was started. */
export function identity(pid) {
  return { pid, started: startedAt(pid) };
}

export function isAlive({ pid, started }) {
  return started !== null && startedAt(pid) === started;
}
