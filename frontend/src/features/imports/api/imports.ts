import { keepPreviousData, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { ImportConfirm, ImportDto, ImportMapping, ImportPreviewDto, ImportResultDto, ImportRowState } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const at = (projectId: string) => `/projects/${projectId}/imports`;
const key = (projectId: string, importId: string, ...rest: readonly unknown[]) => projectKey(projectId, 'import', importId, ...rest);

export const importQuery = (projectId: string, importId: string) =>
  queryOptions({ queryKey: key(projectId, importId, 'self'), queryFn: ({ signal }) => api.get<ImportDto>(`${at(projectId)}/${importId}`, undefined, signal) });
export const useImport = (projectId: string, importId: string) => useQuery(importQuery(projectId, importId));

export interface PreviewQuery { state?: ImportRowState | undefined; page?: number; pageSize?: number }
/** What the check shows first, and what its heading counts from. */
export const firstPreview: PreviewQuery = { state: undefined, page: 1, pageSize: 100 };
export const previewQuery = (projectId: string, importId: string, query: PreviewQuery) =>
  queryOptions({
    queryKey: key(projectId, importId, 'preview', query),
    queryFn: ({ signal }) => api.get<ImportPreviewDto>(`${at(projectId)}/${importId}/preview`, { ...query }, signal),
    placeholderData: keepPreviousData,
  });
export const usePreview = (projectId: string, importId: string, query: PreviewQuery) => useQuery(previewQuery(projectId, importId, query));

/** Nothing of the project changes until an import is confirmed, so only the import itself goes stale. */
function useImportMutation<Body, Result>(projectId: string, send: (body: Body) => Promise<Result>, importId?: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: send,
    onSuccess: async () => { if (importId) await client.invalidateQueries({ queryKey: key(projectId, importId) }); },
  });
}
export const useUpload = (projectId: string) => useImportMutation<File, ImportDto>(projectId, (file) => api.upload(at(projectId), file));
export const useSetMapping = (projectId: string, importId: string) =>
  useImportMutation<ImportMapping, ImportPreviewDto>(projectId, (body) => api.put(`${at(projectId)}/${importId}/mapping`, body), importId);
export const useConfirm = (projectId: string, importId: string) =>
  useProjectMutation<ImportConfirm, ImportResultDto>(projectId, (body) => api.post(`${at(projectId)}/${importId}/confirm`, body));
export const useAbandon = (projectId: string, importId: string) => useImportMutation<void, void>(projectId, () => api.delete(`${at(projectId)}/${importId}`), importId);
