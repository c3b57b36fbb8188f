/*
 * The example for all of features/<plural>/api: one file an endpoint, named for what it does. It exports
 *   - for reading: `<thing>Query(…)`, made by queryOptions or infiniteQueryOptions with a key of lib/query-keys,
 *     used as useQuery(caseQuery(id)) and in tests as client.fetchQuery(caseQuery(id));
 *   - for writing: a hook `use<Verb><Thing>()` that returns useMutation, whose onSuccess invalidates (and returns the
 *     promise of it, so that the mutation is over when the page is true again).
 * Bodies and answers are typed by the generated schema: call() gives the answer or throws an ApiProblem.
 */
import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { operations } from '@/lib/api/schema.gen';
import { keys } from '@/lib/query-keys';

export type CaseListFilter = Omit<NonNullable<operations['Cases_findVisible']['parameters']['query']>, 'cursor' | 'limit'>;

export const PAGE_SIZE = 30;

export const caseListQuery = (filter: CaseListFilter) =>
  infiniteQueryOptions({
    queryKey: keys.cases.list(filter),
    queryFn: ({ pageParam, signal }) =>
      call(api.GET('/api/cases', { params: { query: { ...filter, limit: PAGE_SIZE, cursor: pageParam } }, signal })),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
  });
