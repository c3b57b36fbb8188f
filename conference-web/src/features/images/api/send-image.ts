import { getAccessToken } from '@/lib/api/access-token';
import { liveAccessToken } from '@/lib/api/authorised-fetch';
import { offline, readProblem } from '@/lib/api/problem';
import { refreshAccessToken } from '@/lib/api/refresh';
import type { Schemas } from '@/lib/api/types';
import type { SendImage } from '../upload/upload-queue';

/** One try. XMLHttpRequest, since fetch tells nothing of how much has gone out. */
function attempt(caseId: string, body: FormData, token: string | null, signal: AbortSignal, onProgress: (sent: number, total: number) => void) {
  return new Promise<Response>((resolve, reject) => {
    const request = new XMLHttpRequest();
    const abort = () => request.abort();
    request.open('POST', new URL(`/api/cases/${encodeURIComponent(caseId)}/images`, location.origin));
    if (token) request.setRequestHeader('authorization', `Bearer ${token}`);
    request.upload.addEventListener('progress', ({ loaded, total }) => onProgress(loaded, total));
    request.addEventListener('load', () => resolve(asResponse(request)));
    request.addEventListener('error', () => reject(offline()));
    request.addEventListener('abort', () => reject(new DOMException('The upload was cancelled.', 'AbortError')));
    request.addEventListener('loadend', () => signal.removeEventListener('abort', abort));
    if (signal.aborted) return reject(new DOMException('The upload was cancelled.', 'AbortError'));
    signal.addEventListener('abort', abort);
    request.send(body);
  });
}

function asResponse(request: XMLHttpRequest): Response {
  const headers = new Headers();
  for (const name of ['content-type', 'retry-after']) {
    const value = request.getResponseHeader(name);
    if (value) headers.set(name, value);
  }
  return new Response(request.responseText, { status: request.status, headers });
}

/** Sends one picture of a case; renews the access token once where the server no longer takes it. */
export const sendImageOf =
  (caseId: string): SendImage =>
  async (file, fields, { signal, onProgress }) => {
    const body = new FormData();
    for (const [name, value] of Object.entries(fields)) if (value) body.append(name, value);
    // a file's own name may hold a patient's: it stays here
    body.append('file', file, 'image');
    const token = await liveAccessToken();
    let response = await attempt(caseId, body, token, signal, onProgress);
    if (response.status === 401 && token !== null) {
      const newer = getAccessToken();
      response = await attempt(caseId, body, newer !== null && newer !== token ? newer : await refreshAccessToken(), signal, onProgress);
    }
    if (!response.ok) throw await readProblem(response);
    return (await response.json()) as Schemas['ImageDto'];
  };
