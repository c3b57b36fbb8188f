type SessionNews = { kind: 'signed-in'; personId: string } | { kind: 'signed-out' };

/** Tells this person's other tabs; the refresh cookie is shared by all of them. */
const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel('kerfside-session');
// only Node's has this: an open channel must not keep a finished test run alive
(channel as { unref?: () => void } | null)?.unref?.();

export const tellOtherTabs = (news: SessionNews): void => channel?.postMessage(news);

export function onSessionNews(listener: (news: SessionNews) => void): () => void {
  const receive = (event: MessageEvent<SessionNews>) => listener(event.data);
  channel?.addEventListener('message', receive);
  return () => channel?.removeEventListener('message', receive);
}
