import { queryOptions, useQuery } from '@tanstack/react-query';
import type { BuildingDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';

export const buildingQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'building'), queryFn: ({ signal }) => api.get<BuildingDto>(`/projects/${projectId}/building`, undefined, signal) });
export const useBuilding = (projectId: string) => useQuery(buildingQuery(projectId));
