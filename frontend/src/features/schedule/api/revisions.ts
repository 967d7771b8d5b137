import { queryOptions, useMutation, useQuery } from '@tanstack/react-query';
import type { ReadinessDto, RecalculationDto, ReturnInput, RevisionDetailDto, RevisionDto, RevisionInput, RevisionUpdate, RevisionVerificationDto } from '@mantlet/common';
import { api, apiUrl } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const at = (projectId: string, ...rest: string[]) => [`/projects/${projectId}/revisions`, ...rest].join('/');

export const readinessQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'readiness'), queryFn: ({ signal }) => api.get<ReadinessDto>(`/projects/${projectId}/readiness`, undefined, signal) });
export const useReadiness = (projectId: string, enabled: boolean) => useQuery({ ...readinessQuery(projectId), enabled });

export const revisionsQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'revisions'), queryFn: ({ signal }) => api.get<RevisionDto[]>(at(projectId), undefined, signal) });
export const useRevisions = (projectId: string) => useQuery(revisionsQuery(projectId));

export const revisionQuery = (projectId: string, id: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'revisions', id), queryFn: ({ signal }) => api.get<RevisionDetailDto>(at(projectId, id), undefined, signal) });
export const useRevision = (projectId: string, id: string) => useQuery(revisionQuery(projectId, id));

export const useStartRevision = (projectId: string) => useProjectMutation(projectId, (body: RevisionInput) => api.post<RevisionDto>(at(projectId), body));
export const useChangeRevision = (projectId: string, id: string) => useProjectMutation(projectId, (body: RevisionUpdate) => api.patch<RevisionDto>(at(projectId, id), body));
export type Step = 'prepare' | 'check' | 'issue';
export const useTakeStep = (projectId: string, id: string) => useProjectMutation(projectId, (step: Step) => api.post<RevisionDto>(at(projectId, id, step)));
export const useReturnRevision = (projectId: string, id: string) => useProjectMutation(projectId, (body: ReturnInput) => api.post<RevisionDto>(at(projectId, id, 'return'), body));
/** Asked for by hand: the server reads the stored files and computes their digests anew. */
export const useVerify = (projectId: string, id: string) => useMutation({ mutationFn: () => api.get<RevisionVerificationDto>(at(projectId, id, 'verify')) });
export const useRecalculate = (projectId: string) => useProjectMutation<void, RecalculationDto>(projectId, () => api.post(`/projects/${projectId}/recalculate`));

export const pdfUrl = (projectId: string, id: string, download = false) => apiUrl(at(projectId, id, 'pdf'), download ? { download: 1 } : {});
