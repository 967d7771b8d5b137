import { queryOptions, useQuery } from '@tanstack/react-query';
import type { BuildingDto, IssuedBuildingDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';

export const buildingQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'building'), queryFn: ({ signal }) => api.get<BuildingDto>(`/projects/${projectId}/building`, undefined, signal) });
export const useBuilding = (projectId: string) => useQuery(buildingQuery(projectId));

/** What everybody on the team may see: the building of the issued revision. */
export const issuedBuildingQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'issued-building'), queryFn: ({ signal }) => api.get<IssuedBuildingDto>(`/projects/${projectId}/site/building`, undefined, signal) });
export const useIssuedBuilding = (projectId: string) => useQuery(issuedBuildingQuery(projectId));
