import { useParams } from 'react-router-dom';
import { ProjectProvider } from '../features/projects/project-context.js';
import { useProject } from '../features/projects/api/projects.js';
import { QueryState } from '../ui/states.js';
import { Shell } from './shell.js';

/** Loads the project of the address once for all of its pages. */
export function ProjectLayout() {
  const { projectId = '' } = useParams();
  const project = useProject(projectId);
  if (project.data === undefined) return <Shell><QueryState query={project} what="the project">{() => null}</QueryState></Shell>;
  return (
    <ProjectProvider project={project.data}>
      <Shell project={project.data} />
    </ProjectProvider>
  );
}
