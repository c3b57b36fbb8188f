import type { QueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** Everything said in the case so far counts as read. The marks on the page stay until it is asked for again. */
export async function markRead(client: QueryClient, caseId: string): Promise<void> {
  await call(api.PUT('/api/cases/{caseId}/read', { params: { path: { caseId } } }));
  await Promise.all([keys.unread, keys.cases.lists, keys.cases.one(caseId)].map((queryKey) => client.invalidateQueries({ queryKey })));
}
