import { Navigate } from 'react-router-dom';
import type { BuildingDto, ProjectDto } from '@mantlet/common';
import { countWord, formatNumber } from '../../../lib/format.js';
import { BuildingElevation } from '../../../ui/drawing/building-elevation.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { QueryState } from '../../../ui/states.js';
import { FirstSteps } from '../../projects/components/first-steps.js';
import { useCurrentProject, useMay } from '../../projects/project-context.js';
import { useBuilding } from '../api/building.js';
import { OpenItems } from '../components/open-items.js';
import { ProtectionTotals } from '../components/protection-totals.js';
import { ZoneList } from '../components/zone-list.js';

export function buildingWords({ members, settled, open, levels }: BuildingDto): { heading: string; sub: string } {
  if (levels.length === 0) return { heading: 'No levels yet', sub: 'The building is drawn from its levels and zones.' };
  if (members === 0) return { heading: 'No members yet', sub: 'The levels are there; the member schedule is not.' };
  if (open === 0 && settled === members) return { heading: `All ${formatNumber(members)} members settled`, sub: 'Nothing is open; the schedule can be prepared.' };
  return {
    heading: `${formatNumber(settled)} of ${formatNumber(members)} members settled`,
    sub: open === 0 ? 'No member is open.' : `${countWord(open)} ${open === 1 ? 'is' : 'are'} open; the schedule can be prepared when ${open === 1 ? 'it is' : 'they are'} closed.`,
  };
}

function Content({ building, project }: { building: BuildingDto; project: ProjectDto }) {
  const at = `/projects/${project.id}`;
  const zoneHref = (zone: { id: string }) => `${at}/zones?zone=${zone.id}`;
  const words = buildingWords(building);
  const steps = <FirstSteps project={project} building={building} />;
  if (building.levels.length === 0) return steps;
  return (
    <>
      {steps}
      <div className="mt-columns">
        <Panel flush label="Elevation">
          <BuildingElevation levels={building.levels} zoneHref={zoneHref} label={`Elevation of ${project.name}. ${words.heading}.`} />
          <p className="mt-drawing-note">
            Heights to scale, level marks in metres. Within a level, widths follow protected area. Bar: share of members settled. Line above it: share issued. Hatch: share still open.
          </p>
          <ZoneList levels={building.levels} zoneHref={zoneHref} />
        </Panel>
        <div className="mt-stack">
          {building.members > 0 && <OpenItems items={building.openItems} projectId={project.id} held={project.roles} />}
          <ProtectionTotals lines={building.protection} />
        </div>
      </div>
    </>
  );
}

export default function BuildingPage() {
  const project = useCurrentProject();
  const may = useMay();
  // those who see issued work only start where that work is
  if (!may('see-design')) return <Navigate to={`/projects/${project.id}/site`} replace />;
  return <DesignBuilding project={project} />;
}

function DesignBuilding({ project }: { project: ProjectDto }) {
  const building = useBuilding(project.id);
  const words = building.data ? buildingWords(building.data) : { heading: project.name, sub: undefined };
  return (
    <Page title="Building" projectName={project.name} heading={words.heading} sub={words.sub}>
      <QueryState query={building} what="the building">{(data) => <Content building={data} project={project} />}</QueryState>
    </Page>
  );
}
