import { useQueryClient } from '@tanstack/react-query';
import { type ReactNode, useCallback, useEffect, useMemo, useState } from 'react';
import { clearAccessToken, setAccessToken } from '../api/access-token';
import { api, call } from '../api/client';
import { asProblem } from '../api/problem';
import { onSessionEnd, refreshAccessToken } from '../api/refresh';
import type { Schemas } from '../api/types';
import { keys } from '../query-keys';
import { type Me, SessionContext, type SessionState } from './session';
import { onSessionNews, tellOtherTabs } from './session-channel';

const fetchMe = () => call(api.GET('/api/auth/me'));

/** Finds out who is signed in, and keeps it true in all tabs. */
export function SessionProvider({ children }: { children: ReactNode }) {
  const client = useQueryClient();
  const [state, setState] = useState<SessionState>({ status: 'loading' });

  const enter = useCallback(
    (me: Me) => {
      client.setQueryData(keys.me, me);
      setState((before) => {
        // another person at the same page must not see what the first had open
        if (before.status === 'ended' && before.me.id !== me.id) location.reload();
        // what was refused meanwhile
        else if (before.status === 'ended') void client.invalidateQueries();
        return { status: 'signed-in', me };
      });
      tellOtherTabs({ kind: 'signed-in', personId: me.id });
    },
    [client],
  );

  const begin = useCallback(
    () =>
      refreshAccessToken()
        .then(fetchMe)
        .then(enter, (error: unknown) => {
          const problem = asProblem(error);
          setState(problem.status === 401 ? { status: 'signed-out' } : { status: 'unreachable', error: problem });
        }),
    [enter],
  );

  const takeToken = useCallback(
    async ({ accessToken, expiresIn }: Schemas['AccessTokenDto']) => {
      setAccessToken(accessToken, expiresIn);
      enter(await fetchMe());
    },
    [enter],
  );

  const signIn = useCallback(
    async (email: string, password: string) => takeToken(await call(api.POST('/api/auth/sign-in', { body: { email, password } }))),
    [takeToken],
  );

  const leave = useCallback(() => {
    clearAccessToken();
    client.clear();
    setState({ status: 'signed-out' });
  }, [client]);

  const signOut = useCallback(async () => {
    await call(api.POST('/api/auth/sign-out'));
    leave();
    tellOtherTabs({ kind: 'signed-out' });
  }, [leave]);

  useEffect(() => void begin(), [begin]);
  useEffect(() => onSessionEnd(() => setState((now) => (now.status === 'signed-in' ? { status: 'ended', me: now.me } : now))), []);
  useEffect(
    () =>
      onSessionNews((news) => {
        if (news.kind === 'signed-out') leave();
        else
          setState((now) => {
            if (now.status === 'signed-in' && now.me.id !== news.personId) location.reload();
            return now;
          });
      }),
    [leave],
  );
  // a changed role or name arrives through the query, by a live event
  useEffect(
    () =>
      client.getQueryCache().subscribe(({ type, query }) => {
        if (type !== 'updated' || query.queryKey[0] !== keys.me[0] || !query.state.data) return;
        const me = query.state.data as Me;
        setState((now) => (now.status === 'signed-in' && now.me !== me ? { status: 'signed-in', me } : now));
      }),
    [client],
  );

  const retry = useCallback(() => {
    setState({ status: 'loading' });
    void begin();
  }, [begin]);
  const session = useMemo(() => ({ state, signIn, takeToken, signOut, retry }), [state, signIn, takeToken, signOut, retry]);
  return <SessionContext value={session}>{children}</SessionContext>;
}
