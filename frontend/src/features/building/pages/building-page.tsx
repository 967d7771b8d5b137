import { useMemo } from 'react';
import type { ProjectDto } from '@mantlet/common';
import { Page } from '../../../ui/page.js';
import { QueryState } from '../../../ui/states.js';
import { useCurrentProject, useMay } from '../../projects/project-context.js';
import { useBuilding, useIssuedBuilding } from '../api/building.js';
import { buildingWords, issuedWords } from '../building-words.js';
import { DesignBuilding } from '../components/design-building.js';
import { IssuedBuilding } from '../components/issued-building.js';
import { keynotesOf } from '../keynotes.js';
import '../building.css';

function Design({ project }: { project: ProjectDto }) {
  const building = useBuilding(project.id);
  const keynotes = useMemo(() => keynotesOf(building.data?.openItems ?? [], project.roles), [building.data, project.roles]);
  const words = building.data ? buildingWords(building.data, keynotes) : { heading: project.name, sub: undefined };
  return (
    <Page title="Building" projectName={project.name} heading={words.heading} sub={words.sub}>
      <QueryState query={building} what="the building">
        {(data) => <DesignBuilding building={data} project={project} keynotes={keynotes} asOf={building.dataUpdatedAt} />}
      </QueryState>
    </Page>
  );
}

/** For those without a design role: what is issued, and nothing else. */
function Issued({ project }: { project: ProjectDto }) {
  const building = useIssuedBuilding(project.id);
  const words = building.data ? issuedWords(building.data) : { heading: project.name, sub: undefined };
  return (
    <Page title="Building" projectName={project.name} heading={words.heading} sub={words.sub}>
      <QueryState query={building} what="the building">{(data) => <IssuedBuilding building={data} project={project} />}</QueryState>
    </Page>
  );
}

export default function BuildingPage() {
  const project = useCurrentProject();
  return useMay()('see-design') ? <Design project={project} /> : <Issued project={project} />;
}
