import { queryOptions, useQuery } from '@tanstack/react-query';
import type { SiteDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';

export const siteQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'site'), queryFn: ({ signal }) => api.get<SiteDto>(`/projects/${projectId}/site`, undefined, signal) });
export const useSite = (projectId: string) => useQuery(siteQuery(projectId));
