import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';
import { roundsQuery } from './get-rounds';

/** Gives or changes the own rating of a round. */
export function useGiveRating(caseId: string, number: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['GiveRatingDto']) =>
      call(api.PUT('/api/cases/{caseId}/rounds/{number}/rating', { params: { path: { caseId, number } }, body })),
    onSuccess: (rounds) => {
      client.setQueryData(roundsQuery(caseId).queryKey, rounds);
      return client.invalidateQueries({ queryKey: keys.cases.lists });
    },
    // the round may have closed meanwhile: then the page must say so
    onError: () => client.invalidateQueries({ queryKey: keys.cases.rounds(caseId) }),
  });
}
