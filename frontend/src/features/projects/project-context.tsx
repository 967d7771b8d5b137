import { createContext, useContext, useMemo } from 'react';
import type { ReactNode } from 'react';
import type { ProjectDto } from '@mantlet/common';
import { may, whyNot } from '../../lib/may.js';
import type { Right } from '../../lib/may.js';
import { LinkButton } from '../../ui/link-button.js';
import { Page } from '../../ui/page.js';

const ProjectContext = createContext<ProjectDto | null>(null);
export function ProjectProvider({ project, children }: { project: ProjectDto; children: ReactNode }) {
  return <ProjectContext value={project}>{children}</ProjectContext>;
}

/** The project of the address; every page below /projects/:projectId has one. */
export function useCurrentProject(): ProjectDto {
  const project = useContext(ProjectContext);
  if (!project) throw new Error('useCurrentProject is used outside a project');
  return project;
}
/** The project of the address, or null on pages that also stand outside one (the shared product library). */
export const useProjectIfAny = (): ProjectDto | null => useContext(ProjectContext);

/** What the signed-in person may do here: may('edit-zones'). */
export function useMay(): (right: Right) => boolean {
  const roles = useContext(ProjectContext)?.roles;
  return useMemo(() => (right: Right) => may(roles ?? [], right), [roles]);
}

/** Shows the page only to those who hold the right; the others read who does. */
export function RequireRight({ right, children }: { right: Right; children: ReactNode }) {
  const project = useCurrentProject();
  if (useMay()(right)) return <>{children}</>;
  return (
    <Page title="Closed to you" projectName={project.name} heading="Not yours to see" sub={whyNot(right)}>
      <p><LinkButton to={`/projects/${project.id}`} type="primary">Go to the building</LinkButton></p>
    </Page>
  );
}
