import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { CustomSection, Page, SectionDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const at = (projectId: string) => `/projects/${projectId}/sections`;

/** Sections of the catalogue and of the project whose name fits what is typed. */
export const sectionsQuery = (projectId: string, search: string) =>
  queryOptions({
    queryKey: projectKey(projectId, 'sections', search),
    queryFn: ({ signal }) => api.get<Page<SectionDto>>(at(projectId), { search, pageSize: 40 }, signal),
    placeholderData: keepPreviousData,
    staleTime: 5 * 60_000,
  });
export const useSections = (projectId: string, search: string, enabled: boolean) => useQuery({ ...sectionsQuery(projectId, search), enabled });
/** One section by its id, for a form that was given the id alone. */
export const useSection = (projectId: string, id: string | null) =>
  useQuery({
    queryKey: projectKey(projectId, 'section', id), staleTime: 5 * 60_000, enabled: id !== null,
    queryFn: async ({ signal }) => (await api.get<Page<SectionDto>>(at(projectId), { id, pageSize: 1 }, signal)).items[0] ?? null,
  });
export const useCreateSection = (projectId: string) => useProjectMutation<CustomSection, SectionDto>(projectId, (body) => api.post(at(projectId), body));
