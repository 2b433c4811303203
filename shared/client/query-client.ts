import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './api';

/** How long an answer of the server counts as fresh, by how fast it changes under others' hands. */
export const staleTimes = { steady: 60_000, working: 5_000 } as const;

export const createQueryClient = (): QueryClient =>
  new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: staleTimes.working,
        retry: (failures, error) => !(error instanceof ApiError) && failures < 2,
      },
      mutations: { retry: false },
    },
  });
