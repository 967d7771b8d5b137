import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { Acceptance, AcceptanceDto, BulkMember, MemberChoice, MemberDto, MemberInput, MemberNeighboursDto, MemberQuery, MemberSheetDto, MemberStructural, MemberUpdate, MembersChangedDto, MemberPageDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const at = (projectId: string) => `/projects/${projectId}/members`;

export const membersQuery = (projectId: string, query: Partial<MemberQuery>) =>
  queryOptions({
    queryKey: projectKey(projectId, 'members', query),
    queryFn: ({ signal }) => api.get<MemberPageDto>(at(projectId), query, signal),
    // the rows stay on screen while the next page or order is fetched
    placeholderData: keepPreviousData,
  });
export const useMembers = (projectId: string, query: Partial<MemberQuery>) => useQuery(membersQuery(projectId, query));

export const memberQuery = (projectId: string, memberId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'member', memberId), queryFn: ({ signal }) => api.get<MemberSheetDto>(`${at(projectId)}/${memberId}`, undefined, signal) });
export const useMember = (projectId: string, memberId: string) => useQuery(memberQuery(projectId, memberId));

/** Before and after in the list as it was filtered and sorted; asked beside the sheet, which has its own by mark. */
export const useMemberNeighbours = (projectId: string, memberId: string, filter: Partial<MemberQuery> | null) => useQuery({
  queryKey: projectKey(projectId, 'member', memberId, 'neighbours', filter), enabled: filter !== null,
  queryFn: ({ signal }) => api.get<MemberNeighboursDto>(`${at(projectId)}/${memberId}/neighbours`, filter ?? undefined, signal),
});

export interface SavedMember { id: string }
export const useCreateMember = (projectId: string) => useProjectMutation<MemberInput, SavedMember>(projectId, (body) => api.post(at(projectId), body));
export const useUpdateMember = (projectId: string, memberId: string) =>
  useProjectMutation<MemberUpdate, MemberDto>(projectId, (body) => api.patch(`${at(projectId)}/${memberId}`, body));
export const useSetStructural = (projectId: string, memberId: string) =>
  useProjectMutation<MemberStructural, MemberDto>(projectId, (body) => api.put(`${at(projectId)}/${memberId}/structural`, body));
export const useBulkMembers = (projectId: string) =>
  useProjectMutation<BulkMember, MembersChangedDto>(projectId, (body) => api.post(`${at(projectId)}/bulk`, body));
export const useDeleteMembers = (projectId: string) =>
  useProjectMutation<MemberChoice, { deleted: number }>(projectId, (body) => api.post(`${at(projectId)}/delete`, body));

export const useAccept = (projectId: string) =>
  useProjectMutation<Acceptance, { accepted: number }>(projectId, (body) => api.post(`/projects/${projectId}/acceptances`, body));
export const useWithdrawAcceptance = (projectId: string) =>
  useProjectMutation<{ memberIds: string[]; kind: AcceptanceDto['kind'] }>(projectId, (body) => api.delete(`/projects/${projectId}/acceptances`, body));
