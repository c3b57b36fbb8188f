import { useSyncExternalStore } from 'react';

const DARK = '(prefers-color-scheme: dark)';

function subscribe(notify: () => void): () => void {
  const query = matchMedia(DARK);
  query.addEventListener('change', notify);
  return () => query.removeEventListener('change', notify);
}

/** Light or dark, as the system is set, and as it changes. */
export const useAppearance = (): 'light' | 'dark' => useSyncExternalStore(subscribe, () => (matchMedia(DARK).matches ? 'dark' : 'light'));
