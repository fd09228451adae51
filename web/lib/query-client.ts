import { QueryClient } from '@tanstack/react-query';
import { ProblemError } from './http.ts';

/** One cache for the whole application. A refusal is never asked again; a lost connection is, twice. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        retry: (failures, error) => !(error instanceof ProblemError) && failures < 2,
      },
      mutations: { retry: false },
    },
  });
}
