import { problem, type ReceivedRequest, sendJson, startApiServer } from '@/testing/api-server';
import { clearAccessToken, getAccessToken, setAccessToken } from './access-token';
import { authorisedFetch } from './authorised-fetch';
import { ApiProblem } from './problem';
import { onSessionEnd, refreshAccessToken } from './refresh';

type Server = Awaited<ReturnType<typeof startApiServer>>;

let server: Server;
let valid: string;
let mayRefresh: boolean;
let refreshes: number;

beforeEach(async () => {
  valid = 'first';
  mayRefresh = true;
  refreshes = 0;
  server = await startApiServer((request, response) => {
    if (request.path === '/api/auth/refresh') {
      if (!mayRefresh) return sendJson(response, 401, problem(401, 'session-ended', 'Sign in again.'));
      refreshes += 1;
      valid = `renewed-${refreshes}`;
      return sendJson(response, 200, { accessToken: valid, expiresIn: 900 });
    }
    if (request.authorization !== `Bearer ${valid}`) return sendJson(response, 401, problem(401, 'unauthorized', 'Sign in first.'));
    sendJson(response, 200, { echo: request.body });
  });
});

afterEach(async () => {
  clearAccessToken();
  await server.close();
});

const get = () => authorisedFetch(new Request(`${server.origin}/api/cases`));
const post = (body: string) => authorisedFetch(new Request(`${server.origin}/api/cases`, { method: 'POST', body }));
const refreshRequests = (received: ReceivedRequest[]) => received.filter(({ path }) => path === '/api/auth/refresh');

it('sends the bearer token', async () => {
  setAccessToken('first', 900);
  const response = await get();
  expect(response.status).toBe(200);
  expect(server.received).toEqual([expect.objectContaining({ path: '/api/cases', authorization: 'Bearer first' })]);
});

it('renews a refused token and sends the request once more, body and all', async () => {
  setAccessToken('out of date', 900);
  const response = await post('a sentence');
  expect(await response.json()).toEqual({ echo: 'a sentence' });
  expect(getAccessToken()).toBe('renewed-1');
  expect(server.received.map(({ path }) => path)).toEqual(['/api/cases', '/api/auth/refresh', '/api/cases']);
});

it('renews once for many requests refused together, since an old refresh cookie would end the session', async () => {
  setAccessToken('out of date', 900);
  const responses = await Promise.all(Array.from({ length: 12 }, get));
  expect(responses.map(({ status }) => status)).toEqual(Array(12).fill(200));
  expect(refreshRequests(server.received)).toHaveLength(1);
});

it('renews a token that is about to run out before it sends anything', async () => {
  setAccessToken('first', 3);
  await get();
  expect(server.received.map(({ path }) => path)).toEqual(['/api/auth/refresh', '/api/cases']);
});

it('does not renew for ever when the new token is refused too', async () => {
  setAccessToken('out of date', 900);
  const refused = await startApiServer((request, response) =>
    request.path === '/api/auth/refresh'
      ? sendJson(response, 200, { accessToken: 'another', expiresIn: 900 })
      : sendJson(response, 401, problem(401, 'unauthorized', 'Sign in first.')),
  );
  const response = await authorisedFetch(new Request(`${refused.origin}/api/cases`));
  expect(response.status).toBe(401);
  expect(refused.received).toHaveLength(3);
  await refused.close();
});

it('tells that the session has ended when the refresh cookie is refused', async () => {
  setAccessToken('out of date', 900);
  mayRefresh = false;
  const ended = jest.fn();
  const stop = onSessionEnd(ended);
  await expect(get()).rejects.toMatchObject({ status: 401, code: 'session-ended' });
  stop();
  expect(ended).toHaveBeenCalledTimes(1);
  expect(getAccessToken()).toBeNull();
});

it('asks for no token while nobody is signed in: a wrong password is not an ended session', async () => {
  const response = await get();
  expect(response.status).toBe(401);
  expect(refreshRequests(server.received)).toHaveLength(0);
});

it('says so when the server can not be reached, and keeps the session', async () => {
  setAccessToken('first', 900);
  await server.close();
  const error = await get().catch((thrown: unknown) => thrown);
  expect(error).toBeInstanceOf(ApiProblem);
  expect(error).toMatchObject({ code: 'offline', status: 0, isPassing: true });
  expect(getAccessToken()).toBe('first');
});

it('gives a renewal that a closed page left behind time to finish, since the old cookie must not be sent twice', async () => {
  localStorage.setItem('kerfside.refresh-begun', String(Date.now() - 1_700));
  const begun = Date.now();
  await refreshAccessToken();
  // timers may fire a moment early
  expect(Date.now() - begun).toBeGreaterThanOrEqual(290);
  const again = Date.now();
  await refreshAccessToken();
  expect(Date.now() - again).toBeLessThan(290);
});
