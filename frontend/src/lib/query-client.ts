import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './api-client.js';

/** A refusal stays a refusal however often it is asked; only a lost connection or a server fault is tried again. */
const worthRetrying = (failures: number, error: unknown) =>
  failures < 1 && (!(error instanceof ApiError) || error.status === 0 || error.status >= 500);

export const createQueryClient = () =>
  new QueryClient({
    defaultOptions: {
      queries: { staleTime: 15_000, retry: worthRetrying, refetchOnWindowFocus: true },
      // a save that cannot go out fails at once and says so; held back, it would go out later behind the person's back
      mutations: { retry: false, networkMode: 'always' },
    },
  });

export const sessionKey = ['session'] as const;
/** Everything of a project hangs below this key, so that one edit can make all of it stale at once. */
export const projectKey = (projectId: string, ...rest: readonly unknown[]) => ['projects', projectId, ...rest] as const;
