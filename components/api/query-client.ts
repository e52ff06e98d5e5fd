import { QueryClient } from '@tanstack/react-query';
import { Unreachable } from './api-problem';

const RETRIES = 2;
const FRESH_FOR_MS = 10_000;

/** The cache of what the server said. Only an unreachable server is asked again; a refusal stands. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        networkMode: 'always',
        staleTime: FRESH_FOR_MS,
        retry: (failures, error) => error instanceof Unreachable && failures < RETRIES,
      },
      mutations: { networkMode: 'always', retry: false },
    },
  });
}
