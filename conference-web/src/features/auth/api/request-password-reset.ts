import { useMutation } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';

export const useRequestPasswordReset = () =>
  useMutation({ mutationFn: (email: string) => call(api.POST('/api/auth/password-reset', { body: { email } })) });
