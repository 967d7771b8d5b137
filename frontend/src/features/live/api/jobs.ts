import { queryOptions, useQuery } from '@tanstack/react-query';
import type { JobDto } from '@mantlet/common';
import { api } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';
import { useProjectMutation } from '../../projects/api/projects.js';

const at = (projectId: string) => `/projects/${projectId}/jobs`;
/** whether a worker is there is told by nobody: it has to be asked */
const ASK_MS = 3000;

export const jobsQuery = (projectId: string) =>
  queryOptions({
    queryKey: projectKey(projectId, 'jobs'),
    queryFn: ({ signal }) => api.get<JobDto[]>(at(projectId), undefined, signal),
    refetchInterval: ({ state }) => (state.data?.some((job) => job.state !== 'failed') ? ASK_MS : false),
  });
export const useJobs = (projectId: string, enabled: boolean) => useQuery({ ...jobsQuery(projectId), enabled });
export const useRetryJob = (projectId: string) => useProjectMutation<string, JobDto[]>(projectId, (jobId) => api.post(`${at(projectId)}/${jobId}/retry`));
