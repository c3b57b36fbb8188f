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

async function askForToken(): Promise<string> {
  let response: Response;
  try {
    response = await fetch(new URL('/api/auth/refresh', location.origin), { method: 'POST', credentials: 'same-origin' });
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
