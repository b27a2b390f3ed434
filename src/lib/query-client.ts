import { QueryClient } from '@tanstack/react-query';
import { OfflineError } from './api/error.ts';

/** One cache for the page. Refusals are final; a lost connection is tried three times. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 30_000,
        retry: (count, error) => error instanceof OfflineError && count < 3,
        retryDelay: (count) => Math.min(4000, 500 * 2 ** count),
        refetchOnWindowFocus: true,
        networkMode: 'always',
      },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
