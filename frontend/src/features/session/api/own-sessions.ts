import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { OwnSessionDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';

const ownSessionsKey = ['own-sessions'] as const;
export const ownSessionsQuery = () => queryOptions({ queryKey: ownSessionsKey, queryFn: ({ signal }) => api.get<OwnSessionDto[]>('/sessions', undefined, signal) });
export const useOwnSessions = () => useQuery(ownSessionsQuery());

/** One of them, or all but this one. */
export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (which: string | 'others') => api.delete(which === 'others' ? '/sessions' : `/sessions/${which}`),
    onSettled: () => client.invalidateQueries({ queryKey: ownSessionsKey }),
  });
}
