import { useMutation } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';

export const useInviteAgain = () =>
  useMutation({ mutationFn: (id: string) => call(api.POST('/api/people/{id}/invitation', { params: { path: { id } } })) });
