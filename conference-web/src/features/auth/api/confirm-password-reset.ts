import { useMutation } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';

export const useConfirmPasswordReset = (token: string) =>
  useMutation({ mutationFn: (password: string) => call(api.POST('/api/auth/password-reset/confirm', { body: { token, password } })) });
