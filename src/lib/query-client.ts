import { QueryClient } from '@tanstack/react-query';

import { AppError } from '#shared/errors/app-error.ts';

/** Answers that a second try would not change. */
const isFinal = (error: unknown) => error instanceof AppError && !['busy', 'timedOut'].includes(error.code);

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        // Without a connection a screen says so, and asks again when the connection is back.
        networkMode: 'always',
        refetchOnReconnect: true,
        retry: (failures, error) => failures < 2 && !isFinal(error),
        refetchOnWindowFocus: true,
      },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
