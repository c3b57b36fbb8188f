import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export interface AuditFilter {
  personId?: string;
  caseId?: string;
  action?: string;
}

export const auditQuery = (filter: AuditFilter) =>
  infiniteQueryOptions({
    queryKey: keys.audit(filter),
    queryFn: ({ pageParam, signal }) => call(api.GET('/api/audit', { params: { query: { ...filter, limit: 50, cursor: pageParam } }, signal })),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
    staleTime: 0,
  });
