import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';
import { caseQuery } from './get-case';

/** Begins a draft. */
export function useCreateCase() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['CreateCaseDto']) => call(api.POST('/api/cases', { body })),
    onSuccess: (made) => {
      client.setQueryData(caseQuery(made.id).queryKey, made);
      return client.invalidateQueries({ queryKey: keys.cases.lists });
    },
  });
}
