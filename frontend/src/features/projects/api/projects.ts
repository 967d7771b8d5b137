import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { ProjectCreate, ProjectDto, ProjectListItemDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';

export const projectListKey = ['project-list'] as const;
export const projectsQuery = () =>
  queryOptions({ queryKey: projectListKey, queryFn: ({ signal }) => api.get<ProjectListItemDto[]>('/projects', undefined, signal) });
export const useProjects = () => useQuery(projectsQuery());

export const projectQuery = (projectId: string) =>
  queryOptions({ queryKey: projectKey(projectId, 'self'), queryFn: ({ signal }) => api.get<ProjectDto>(`/projects/${projectId}`, undefined, signal) });
export const useProject = (projectId: string) => useQuery(projectQuery(projectId));

export function useCreateProject() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: ProjectCreate) => api.post<ProjectDto>('/projects', body),
    onSuccess: () => client.invalidateQueries({ queryKey: projectListKey }),
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
      void client.invalidateQueries({ queryKey: projectListKey });
      await client.invalidateQueries({ queryKey: projectKey(projectId) });
    },
  });
}
