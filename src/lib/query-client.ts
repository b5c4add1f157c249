import { QueryClient } from '@tanstack/react-query';

import { ProblemError } from './problem-error.ts';

/** Asked again only where asking again can help: never after a clear no. */
export const queryClient = new QueryClient({
  defaultOptions: {
    queries: {
      staleTime: 10_000,
      retry: (times, error) => times < 2 && !(error instanceof ProblemError && error.problem.status < 500),
    },
    mutations: { retry: false },
  },
});
