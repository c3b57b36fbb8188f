import { useCallback, useState } from 'react';
import { useMe } from './auth/session';

const PREFIX = 'kerfside:kept:';
const LONGEST_DAYS = 30;

interface Kept {
  at: number;
  value: unknown;
}

const keyOf = (personId: string, name: string) => `${PREFIX}${personId}:${name}`;

function read(key: string): { value: unknown } | null {
  try {
    const text = localStorage.getItem(key);
    if (!text) return null;
    const kept = JSON.parse(text) as Kept;
    if (Date.now() - kept.at < LONGEST_DAYS * 86_400_000) return { value: kept.value };
    localStorage.removeItem(key);
  } catch {
    // no storage, or something else under this name: then nothing was kept
  }
  return null;
}

function write(key: string, value: unknown): void {
  try {
    localStorage.setItem(key, JSON.stringify({ at: Date.now(), value } satisfies Kept));
  } catch {
    // full or forbidden: the text is still in the page
  }
}

/**
 * State that outlives the page: what somebody types is kept in this browser, under their own id, until it is sent
 * (`forget`) or a month old. Give the component a `key` where the name can change.
 */
export function useKept<T>(name: string, initial: T) {
  const key = keyOf(useMe().id, name);
  const [state, setState] = useState(() => {
    const kept = read(key);
    return kept ? { value: kept.value as T, wasKept: true } : { value: initial, wasKept: false };
  });
  const set = useCallback(
    (value: T) => {
      write(key, value);
      setState((now) => ({ ...now, value }));
    },
    [key],
  );
  const forget = useCallback(
    (value: T) => {
      localStorage.removeItem(key);
      setState({ value, wasKept: false });
    },
    [key],
  );
  return { ...state, set, forget };
}

/** Whether something unsent lies under this name. */
export function useHasKept(name: string): boolean {
  const key = keyOf(useMe().id, name);
  const [has] = useState(() => read(key) !== null);
  return has;
}
