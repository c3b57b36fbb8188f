import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** Those one belongs to; all for an administrator. */
export const conferencesQuery = () =>
  queryOptions({ queryKey: keys.conferences.list, queryFn: ({ signal }) => call(api.GET('/api/conferences', { signal })) });
