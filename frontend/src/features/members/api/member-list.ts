import { queryOptions, useQuery } from '@tanstack/react-query';
import type { BulkMember, BulkStructural, FoundRequest, FoundSummaryDto, MembersChangedDto, MemberValuesDto, MemberViewDto, MemberViewInput, PreviewAnswerDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const members = (projectId: string) => `/projects/${projectId}/members`;
const views = (projectId: string) => `/projects/${projectId}/member-views`;

export const memberValuesQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'member-values'), queryFn: ({ signal }) => api.get<MemberValuesDto>(`${members(projectId)}/values`, undefined, signal) });
export const useMemberValues = (projectId: string) => useQuery(memberValuesQuery(projectId));

/** All that a filter finds; asked for once somebody means all of it. */
export const useFound = (projectId: string, query: FoundRequest | null) =>
  useQuery({
    queryKey: projectKey(projectId, 'members-found', query), enabled: query !== null, gcTime: 0, staleTime: 0,
    queryFn: () => api.post<FoundSummaryDto>(`${members(projectId)}/found`, query),
  });

export const useBulkPreview = (projectId: string, body: BulkMember | null) =>
  useQuery({
    queryKey: projectKey(projectId, 'bulk-preview', body), enabled: body !== null, gcTime: 0, staleTime: 0, retry: false,
    queryFn: () => api.post<PreviewAnswerDto>(`${members(projectId)}/bulk/preview`, body),
  });
export const useBulkStructural = (projectId: string) =>
  useProjectMutation<BulkStructural, MembersChangedDto>(projectId, (body) => api.post(`${members(projectId)}/structural`, body));

export const useMemberViews = (projectId: string) =>
  useQuery({ queryKey: projectKey(projectId, 'member-views'), queryFn: ({ signal }) => api.get<MemberViewDto[]>(views(projectId), undefined, signal) });
export const useKeepView = (projectId: string) => useProjectMutation<MemberViewInput, MemberViewDto>(projectId, (body) => api.post(views(projectId), body));
export const useChangeView = (projectId: string) =>
  useProjectMutation<MemberViewDto, MemberViewDto>(projectId, ({ id, ...body }) => api.put(`${views(projectId)}/${id}`, body));
export const useDropView = (projectId: string) => useProjectMutation<string>(projectId, (id) => api.delete(`${views(projectId)}/${id}`));
