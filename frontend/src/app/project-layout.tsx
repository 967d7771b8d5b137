import { useParams } from 'react-router-dom';
import { JobProgress } from '../features/live/components/job-progress.js';
import { LiveNotice } from '../features/live/components/live-notice.js';
import { useLiveProject } from '../features/live/use-live-project.js';
import { ProjectProvider } from '../features/projects/project-context.js';
import { useProject } from '../features/projects/api/projects.js';
import { useSession } from '../features/session/api/session.js';
import { ApiError } from '../lib/api-client.js';
import { may } from '../lib/may.js';
import { QueryState } from '../ui/states.js';
import { NoSuchProject } from './faults.js';
import { Shell } from './shell.js';

/** Loads the project of the address once for all of its pages, and keeps them as the server has them. */
export function ProjectLayout() {
  const { projectId = '' } = useParams();
  const project = useProject(projectId);
  const live = useLiveProject(projectId, useSession().data?.user?.id ?? null);
  // there never, or taken off the team meanwhile: what is still in memory is no longer theirs to see
  if (project.error instanceof ApiError && project.error.isMissing) return <Shell><NoSuchProject /></Shell>;
  if (project.data === undefined) return <Shell><QueryState query={project} what="the project">{() => null}</QueryState></Shell>;
  return (
    <ProjectProvider project={project.data}>
      <Shell project={project.data} notice={<><LiveNotice {...live} /><JobProgress projectId={projectId} enabled={may(project.data.roles, 'see-design')} /></>} />
    </ProjectProvider>
  );
}
