/** Defaults of the client cache. */
import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './api-client.ts';

/** Retries only what may pass by itself: no answer at all, or a fault on our side. */
const mayRetry = (failures: number, error: unknown): boolean =>
  failures < 2 && !(error instanceof ApiProblem && error.problem.status < 500);

export const createQueryClient = (): QueryClient =>
  new QueryClient({
    defaultOptions: {
      queries: { retry: mayRetry, staleTime: 10_000, refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
  });
