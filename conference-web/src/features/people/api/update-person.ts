import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useUpdatePerson(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['UpdatePersonDto']) => call(api.PATCH('/api/people/{id}', { params: { path: { id } }, body })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.people.everything }),
  });
}
