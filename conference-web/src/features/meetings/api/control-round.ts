import { useMutation, useQueryClient } from '@tanstack/react-query';
import { roundsQuery } from '@/features/ratings/api/get-rounds';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

const path = (caseId: string, number: number) => ({ params: { path: { caseId, number } } });

/** Opens or closes a rating round at the meeting. */
export function useControlRound(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ act, number }: { act: 'open' | 'close'; number: number }) =>
      act === 'open'
        ? call(api.POST('/api/cases/{caseId}/rounds/{number}/open', path(caseId, number)))
        : call(api.POST('/api/cases/{caseId}/rounds/{number}/close', path(caseId, number))),
    onSuccess: (rounds) => {
      client.setQueryData(roundsQuery(caseId).queryKey, rounds);
      return client.invalidateQueries({ queryKey: keys.cases.one(caseId) });
    },
    // another chair may have done it already: then the page must say so
    onError: () => client.invalidateQueries({ queryKey: keys.cases.rounds(caseId) }),
  });
}
