import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

/** Makes a unit, or changes the one of this id. */
export function useWriteUnit(id?: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['WriteUnitDto']) =>
      id ? call(api.PATCH('/api/units/{id}', { params: { path: { id } }, body })) : call(api.POST('/api/units', { body })),
    onSuccess: () =>
      Promise.all([client.invalidateQueries({ queryKey: keys.units }), client.invalidateQueries({ queryKey: keys.people.everything })]),
  });
}
