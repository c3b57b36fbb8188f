import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './api/problem';

const worthRetrying = (count: number, error: Error) => count < 2 && error instanceof ApiProblem && error.isPassing;

export const createQueryClient = () =>
  new QueryClient({
    defaultOptions: {
      queries: {
        // live events say what changed, so data is not asked for again at every look
        staleTime: 30_000,
        retry: worthRetrying,
        // without a connection it fails at once and says so, rather than waiting in silence
        networkMode: 'always',
        retryDelay: (attempt) => Math.min(1000 * 2 ** attempt, 8000),
      },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
