import { clearAccessToken, setAccessToken } from './access-token';
import { offline, readProblem } from './problem';

type EndListener = () => void;
const endListeners = new Set<EndListener>();

/** Called when the server no longer takes the refresh cookie. */
export function onSessionEnd(listener: EndListener): () => void {
  endListeners.add(listener);
  return () => endListeners.delete(listener);
}

// The cookie changes with each use and an old one ends the session, so two tabs must never send it at once.
const serialised = async (work: () => Promise<string>): Promise<string> =>
  'locks' in navigator ? await navigator.locks.request('kerfside-refresh', work) : await work();

const UNFINISHED = 'kerfside.refresh-begun';
const SETTLE_MS = 2_000;

/** localStorage may be switched off; then a page closed at the wrong moment asks for the password again. */
function remember(begun: number | null): void {
  try {
    if (begun === null) localStorage.removeItem(UNFINISHED);
    else localStorage.setItem(UNFINISHED, String(begun));
  } catch {
    // nothing to remember it in
  }
}

/**
 * A page that was closed or reloaded while it renewed the cookie has let go of the lock, but its request goes on:
 * sending the old cookie again before the new one is there would end the session.
 */
async function letUnfinishedSettle(): Promise<void> {
  let begun: number;
  try {
    begun = Number(localStorage.getItem(UNFINISHED));
  } catch {
    return;
  }
  const left = begun + SETTLE_MS - Date.now();
  if (left > 0 && left <= SETTLE_MS) await new Promise((resolve) => setTimeout(resolve, left));
}

async function askForToken(): Promise<string> {
  await letUnfinishedSettle();
  remember(Date.now());
  try {
    return await exchangeCookie();
  } finally {
    remember(null);
  }
}

async function exchangeCookie(): Promise<string> {
  let response: Response;
  try {
    response = await fetch(new URL('/api/auth/refresh', location.origin), { method: 'POST', credentials: 'same-origin', keepalive: true });
  } catch {
    throw offline();
  }
  if (!response.ok) {
    const problem = await readProblem(response);
    if (response.status === 401) {
      clearAccessToken();
      for (const listener of endListeners) listener();
    }
    throw problem;
  }
  const { accessToken, expiresIn } = (await response.json()) as { accessToken: string; expiresIn: number };
  setAccessToken(accessToken, expiresIn);
  return accessToken;
}

let running: Promise<string> | null = null;

/** A new access token for the refresh cookie; all who ask meanwhile share one request. */
export function refreshAccessToken(): Promise<string> {
  running ??= serialised(askForToken).finally(() => {
    running = null;
  });
  return running;
}
