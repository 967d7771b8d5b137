import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { ProjectCreate, ProjectDto, ProjectListItemDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';

const listKey = ['project-list'] as const;
export const projectsQuery = () =>
  queryOptions({ queryKey: listKey, queryFn: ({ signal }) => api.get<ProjectListItemDto[]>('/projects', undefined, signal) });
export const useProjects = () => useQuery(projectsQuery());

export const projectQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'self'), queryFn: ({ signal }) => api.get<ProjectDto>(`/projects/${projectId}`, undefined, signal) });
export const useProject = (projectId: string) => useQuery(projectQuery(projectId));

export function useCreateProject() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: ProjectCreate) => api.post<ProjectDto>('/projects', body),
    onSuccess: () => client.invalidateQueries({ queryKey: listKey }),
  });
}

/**
 * An edit inside a project. Results hang together (a zone's period changes its members, its quantities and what is open),
 * so everything of the project is asked for again.
 */
export function useProjectMutation<Body, Result = void>(projectId: string, send: (body: Body) => Promise<Result>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: send,
    onSuccess: async () => {
      void client.invalidateQueries({ queryKey: listKey });
      await client.invalidateQueries({ queryKey: projectKey(projectId) });
    },
  });
}
