import { useMutation } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';

/** Has the server compute the fingerprints of the conference's whole chain again. Never from memory, so no query. */
export const useCheckDecision = (id: string) =>
  useMutation({ mutationFn: () => call(api.GET('/api/decisions/{id}/check', { params: { path: { id } } })) });
