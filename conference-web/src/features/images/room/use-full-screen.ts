import { useSyncExternalStore } from 'react';

function subscribe(notify: () => void): () => void {
  document.addEventListener('fullscreenchange', notify);
  return () => document.removeEventListener('fullscreenchange', notify);
}

/** The whole page over the whole screen, so that dialogs are seen there too. Null where the browser has none. */
export function useFullScreen(): { isFullScreen: boolean; toggle: (() => void) | null } {
  const isFullScreen = useSyncExternalStore(subscribe, () => document.fullscreenElement !== null);
  const toggle = () => void (document.fullscreenElement ? document.exitFullscreen() : document.documentElement.requestFullscreen()).catch(() => undefined);
  return { isFullScreen, toggle: document.fullscreenEnabled ? toggle : null };
}
