import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export type Thread = Schemas['ThreadDto'];
export type Remark = Schemas['RemarkDto'];

/** All threads of the case in one answer, shared by every margin on the page. */
export const threadsQuery = (caseId: string) =>
  queryOptions({
    queryKey: keys.cases.threads(caseId),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{caseId}/threads', { params: { path: { caseId } }, signal })),
  });
