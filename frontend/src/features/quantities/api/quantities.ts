import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { QuantitiesDto, QuantityQuery } from '@mantlet/common';
import { api, apiUrl } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';

export const quantitiesQuery = (projectId: string, query: QuantityQuery) =>
  queryOptions({ queryKey: projectKey(projectId, 'quantities', query), queryFn: ({ signal }) => api.get<QuantitiesDto>(`/projects/${projectId}/quantities`, query, signal) });
/** A change of split keeps the last one on screen until the next is there. */
export const useQuantities = (projectId: string, query: QuantityQuery) => useQuery({ ...quantitiesQuery(projectId, query), placeholderData: keepPreviousData });

export const linesCsvUrl = (projectId: string) => apiUrl(`/projects/${projectId}/quantities/lines.csv`);
export const workbookUrl = (projectId: string, query: QuantityQuery) => apiUrl(`/projects/${projectId}/quantities.xlsx`, query);
