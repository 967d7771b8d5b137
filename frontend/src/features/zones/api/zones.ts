import { queryOptions, useQuery } from '@tanstack/react-query';
import type { LevelDto, LevelInput, LevelUpdate, ProductSummaryDto, ZoneDto, ZoneInput, ZoneProtection, ZoneUpdate } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const at = (projectId: string) => `/projects/${projectId}`;

export const levelsQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'levels'), queryFn: ({ signal }) => api.get<LevelDto[]>(`${at(projectId)}/levels`, undefined, signal) });
export const useLevels = (projectId: string) => useQuery(levelsQuery(projectId));

export const zonesQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'zones'), queryFn: ({ signal }) => api.get<ZoneDto[]>(`${at(projectId)}/zones`, undefined, signal) });
export const useZones = (projectId: string, enabled = true) => useQuery({ ...zonesQuery(projectId), enabled });

/** The products a zone's systems may be chosen from: the shared library and the project's own. */
export const zoneProductsQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'products', 'for-zones'), queryFn: ({ signal }) => api.get<ProductSummaryDto[]>(`${at(projectId)}/products`, undefined, signal) });
export const useZoneProducts = (projectId: string) => useQuery(zoneProductsQuery(projectId));

/** Without an id a new level, with one a change; the same for zones. */
export const useSaveLevel = (projectId: string, levelId: string | null) =>
  useProjectMutation<LevelInput | LevelUpdate, LevelDto>(projectId, (body) =>
    levelId ? api.patch(`${at(projectId)}/levels/${levelId}`, body) : api.post(`${at(projectId)}/levels`, body));
export const useDeleteLevel = (projectId: string) => useProjectMutation<string>(projectId, (id) => api.delete(`${at(projectId)}/levels/${id}`));

export const useSaveZone = (projectId: string, zoneId: string | null) =>
  useProjectMutation<ZoneInput | ZoneUpdate, ZoneDto>(projectId, (body) =>
    zoneId ? api.patch(`${at(projectId)}/zones/${zoneId}`, body) : api.post(`${at(projectId)}/zones`, body));
export const useDeleteZone = (projectId: string) => useProjectMutation<string>(projectId, (id) => api.delete(`${at(projectId)}/zones/${id}`));
export const useSaveProtection = (projectId: string, zoneId: string) =>
  useProjectMutation<ZoneProtection, ZoneDto>(projectId, (body) => api.put(`${at(projectId)}/zones/${zoneId}/protection`, body));
