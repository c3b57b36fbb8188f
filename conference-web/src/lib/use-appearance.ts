import { useLayoutEffect, useSyncExternalStore } from 'react';

const DARK = '(prefers-color-scheme: dark)';

let darkRooms = 0;
const listeners = new Set<() => void>();

function subscribe(notify: () => void): () => void {
  const query = matchMedia(DARK);
  query.addEventListener('change', notify);
  listeners.add(notify);
  return () => {
    query.removeEventListener('change', notify);
    listeners.delete(notify);
  };
}

/** Light or dark, as the system is set, and as it changes; dark wherever a dark room is open. */
export const useAppearance = (): 'light' | 'dark' =>
  useSyncExternalStore(subscribe, () => (darkRooms > 0 || matchMedia(DARK).matches ? 'dark' : 'light'));

/** Makes everything dark while the component is on the page, its dialogs too: films are read in the dark. */
export function useDarkRoom(): void {
  useLayoutEffect(() => {
    const change = (by: number) => {
      darkRooms += by;
      for (const notify of listeners) notify();
    };
    change(1);
    return () => change(-1);
  }, []);
}
