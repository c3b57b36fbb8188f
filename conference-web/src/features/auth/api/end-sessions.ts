import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => call(api.DELETE('/api/auth/sessions/{id}', { params: { path: { id } } })),
    onSettled: () => client.invalidateQueries({ queryKey: keys.sessions }),
  });
}

export function useEndOtherSessions() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(api.DELETE('/api/auth/sessions')),
    onSettled: () => client.invalidateQueries({ queryKey: keys.sessions }),
  });
}
