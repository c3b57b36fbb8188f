import { getAccessToken, hasLiveAccessToken } from './access-token';
import { offline } from './problem';
import { refreshAccessToken } from './refresh';

async function send(request: Request, token: string | null): Promise<Response> {
  if (token) request.headers.set('authorization', `Bearer ${token}`);
  try {
    return await fetch(request);
  } catch (error) {
    if (request.signal.aborted) throw error;
    throw offline();
  }
}

/** A token that is good for a request begun now; null while nobody is signed in. */
export async function liveAccessToken(): Promise<string | null> {
  if (getAccessToken() === null) return null;
  return hasLiveAccessToken() ? getAccessToken() : refreshAccessToken();
}

/** fetch with the bearer token; renews it once when the server no longer takes it. */
export async function authorisedFetch(request: Request): Promise<Response> {
  // the body can be read once only, so the second try needs a copy made before the first
  const again = request.clone();
  const token = await liveAccessToken();
  const response = await send(request, token);
  if (response.status !== 401 || token === null) return response;
  // another request may have renewed it while this one was on its way
  const newer = getAccessToken();
  return send(again, newer !== null && newer !== token ? newer : await refreshAccessToken());
}
