import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const unitsQuery = () =>
  queryOptions({ queryKey: keys.units, queryFn: ({ signal }) => call(api.GET('/api/units', { signal })) });
