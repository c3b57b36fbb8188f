import { type QueryClient, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { threadsQuery } from './api/list-threads';
import { markRead } from './api/mark-read';

const LONG_ENOUGH_MS = 1000;

// the server keeps one mark for each case, so it is set once the last new remark of the case has been on the screen
const seenByCase = new Map<string, Set<string>>();
const running = new Set<string>();

/** Notes that a new remark was on the screen; when it was the last one, the case counts as read. */
export function noteSeen(client: QueryClient, caseId: string, remarkId: string): void {
  const seen = seenByCase.get(caseId) ?? new Set();
  seenByCase.set(caseId, seen.add(remarkId));
  const threads = client.getQueryData(threadsQuery(caseId).queryKey)?.items ?? [];
  const fresh = threads.flatMap(({ remarks }) => remarks).filter(({ isNew, deletedAt }) => isNew && deletedAt === null);
  if (!fresh.every(({ id }) => seen.has(id)) || running.has(caseId)) return;
  running.add(caseId);
  // if it fails it is tried again at the next remark that comes into view
  void markRead(client, caseId)
    .catch(() => undefined)
    .finally(() => running.delete(caseId));
}

/** Watches a remark until it has been on the screen long enough to be read. */
export function useSeen(caseId: string, remarkId: string, isNew: boolean) {
  const client = useQueryClient();
  const element = useRef<HTMLLIElement>(null);
  useEffect(() => {
    const target = element.current;
    if (!isNew || !target || typeof IntersectionObserver === 'undefined') return;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const observer = new IntersectionObserver(
      ([entry]) => {
        clearTimeout(timer);
        if (!entry?.isIntersecting) return;
        timer = setTimeout(() => {
          observer.disconnect();
          noteSeen(client, caseId, remarkId);
        }, LONG_ENOUGH_MS);
      },
      { threshold: 0.2 },
    );
    observer.observe(target);
    return () => {
      clearTimeout(timer);
      observer.disconnect();
    };
  }, [client, caseId, remarkId, isNew]);
  return element;
}
