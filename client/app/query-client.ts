import { QueryClient } from '@tanstack/react-query';
import { ApiError } from '#client/lib/api-error.ts';

/** Tries again what may pass by itself (no answer, a fault of the server), never what the server refused. */
export function shouldRetry(failures: number, error: unknown): boolean {
  if (error instanceof ApiError && error.status >= 400 && error.status < 500) return false;
  if (error instanceof ApiError && error.code === 'unreadable-answer' && error.status < 500) return false;
  return failures < 2;
}

/** The cache of what was fetched: fresh for half a minute, kept for ten. */
export function makeQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { retry: shouldRetry, staleTime: 30_000, gcTime: 600_000, refetchOnWindowFocus: false },
      mutations: { retry: false },
    },
  });
}
