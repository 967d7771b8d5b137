import { queryOptions, useQuery } from '@tanstack/react-query';
import type { CaughtMailDto, CaughtMailTextDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';

/** Mail leaves beside the answer that caused it, so the list is asked for again by itself. */
export const caughtMailQuery = () =>
  queryOptions({ queryKey: ['caught-mail'], queryFn: ({ signal }) => api.get<CaughtMailDto[]>('/caught-mail', undefined, signal), refetchInterval: 3_000, staleTime: 0 });
export const useCaughtMail = () => useQuery(caughtMailQuery());
export const caughtMailTextQuery = (id: string) =>
  queryOptions({ queryKey: ['caught-mail', id], queryFn: ({ signal }) => api.get<CaughtMailTextDto>(`/caught-mail/${id}`, undefined, signal), staleTime: Infinity });
export const useCaughtMailText = (id: string) => useQuery(caughtMailTextQuery(id));
