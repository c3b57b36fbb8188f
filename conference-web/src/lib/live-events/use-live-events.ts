import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { liveAccessToken } from '../api/authorised-fetch';
import { refreshAccessToken } from '../api/refresh';
import { followEvents } from './event-stream';
import { invalidateFor, type LiveEvent } from './invalidate';

/** Keeps what the page shows up to date while somebody is signed in. Once, in the shell. */
export function useLiveEvents(): void {
  const client = useQueryClient();
  useEffect(() => {
    const stop = new AbortController();
    void followEvents(
      {
        url: new URL('/api/events', location.origin).href,
        token: liveAccessToken,
        renew: refreshAccessToken,
        onMessage: ({ event, data }) => {
          // the server has no memory back to our last event: everything may be old
          if (event === 'reset') void client.invalidateQueries();
          else if (data) {
            try {
              invalidateFor(client, JSON.parse(data) as LiveEvent);
            } catch {
              // not one of ours
            }
          }
        },
      },
      stop.signal,
    );
    return () => stop.abort();
  }, [client]);
}
