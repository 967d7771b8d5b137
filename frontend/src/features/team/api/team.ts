import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { AuditEntryDto, DesignBasisUpdate, MembershipDto, MembershipInput, MembershipRoles, Page, ProjectDto, ProjectUpdate, TakeoffSettingsUpdate } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const at = (projectId: string) => `/projects/${projectId}`;

export const membershipsQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'memberships'), queryFn: ({ signal }) => api.get<MembershipDto[]>(`${at(projectId)}/memberships`, undefined, signal) });
export const useMemberships = (projectId: string, enabled = true) => useQuery({ ...membershipsQuery(projectId), enabled });
export const useAddMembership = (projectId: string) =>
  useProjectMutation<MembershipInput, MembershipDto>(projectId, (body) => api.post(`${at(projectId)}/memberships`, body));
export const useSetRoles = (projectId: string) =>
  useProjectMutation<MembershipRoles & { userId: string }, MembershipDto>(projectId, ({ userId, ...body }) => api.put(`${at(projectId)}/memberships/${userId}`, body));
export const useRemoveMembership = (projectId: string) =>
  useProjectMutation<string>(projectId, (userId) => api.delete(`${at(projectId)}/memberships/${userId}`));

export const useUpdateProject = (projectId: string) => useProjectMutation<ProjectUpdate, ProjectDto>(projectId, (body) => api.patch(at(projectId), body));
export const useSaveDesignBasis = (projectId: string) =>
  useProjectMutation<DesignBasisUpdate, ProjectDto>(projectId, (body) => api.put(`${at(projectId)}/design-basis`, body));
export const useSaveTakeoff = (projectId: string) =>
  useProjectMutation<TakeoffSettingsUpdate, ProjectDto>(projectId, (body) => api.put(`${at(projectId)}/takeoff-settings`, body));

/** from and to are days of the reader's calendar, both included; '' narrows nothing */
export interface AuditFilter { search: string; who: string; what: string; from: string; to: string; page: number }
const midnight = (day: string, plus = 0) => {
  const [year = 0, month = 1, date = 1] = day.split('-').map(Number);
  return new Date(year, month - 1, date + plus).toISOString();
};
export const auditPageSize = 50;
export const auditQuery = (projectId: string, filter: AuditFilter) =>
  queryOptions({
    queryKey: projectKey(projectId, 'audit', filter), placeholderData: keepPreviousData,
    queryFn: ({ signal }) => api.get<Page<AuditEntryDto>>(`${at(projectId)}/audit`, {
      search: filter.search, userId: filter.who, entity: filter.what, page: filter.page, pageSize: auditPageSize,
      from: filter.from && midnight(filter.from), before: filter.to && midnight(filter.to, 1),
    }, signal),
  });
export const useAudit = (projectId: string, filter: AuditFilter) => useQuery(auditQuery(projectId, filter));
