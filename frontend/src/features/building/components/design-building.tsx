import { useMemo, useState } from 'react';
import { revisionStateNames } from '@mantlet/common';
import type { BuildingDto, BuildingZoneDto, ProjectDto } from '@mantlet/common';
import { formatDate } from '../../../lib/format.js';
import { BuildingElevation } from '../../../ui/drawing/building-elevation.js';
import type { Pointed, Rail } from '../../../ui/drawing/building-elevation.js';
import type { ElevationZone } from '../../../ui/drawing/building-elevation-layout.js';
import { FirstSteps } from '../../projects/components/first-steps.js';
import { buildingWords, sayZone } from '../building-words.js';
import { numbersByZone } from '../keynotes.js';
import type { Keynote } from '../keynotes.js';
import { DrawingSheet, KeyLine } from './drawing-sheet.js';
import { KeynoteList } from './keynote-list.js';
import { ProtectionTotals } from './protection-totals.js';
import { ZoneList } from './zone-list.js';

interface DesignBuildingProps { building: BuildingDto; project: ProjectDto; keynotes: readonly Keynote[]; asOf: number }

const railsOf = (zone: ElevationZone): Rail[] => [
  { key: 'settled', kind: 'settled', members: zone.settled },
  { key: 'issued', kind: 'ink', members: zone.issuedMembers },
];

const legend = (
  <>
    <KeyLine mark="settled">Settled</KeyLine>
    <KeyLine mark="ink">Issued</KeyLine>
    <KeyLine mark="open">Open</KeyLine>
    <KeyLine mark="balloon">Line of the list</KeyLine>
    <span className="mt-key-note">Shares of a zone’s members. What is applied and accepted is drawn once work is recorded on site.</span>
  </>
);

function Sheet({ building, project, keynotes, asOf, pointed, onPoint }: DesignBuildingProps & { pointed: Pointed; onPoint: (pointed: Pointed) => void }) {
  const at = `/projects/${project.id}`;
  const zoneHref = (zone: { id: string }) => `${at}/zones?zone=${zone.id}`;
  const numbers = useMemo(() => numbersByZone(keynotes), [keynotes]);
  const found = building.levels.flatMap((level) => level.zones.map((zone) => ({ level, zone }))).find(({ zone }) => zone.id === pointed.zoneId);
  const { revision } = project;
  const block = [
    { term: 'Drawing', value: 'Elevation by zone' },
    { term: 'Heights', value: 'To scale, in metres' },
    { term: 'Widths', value: 'By protected area' },
    { term: 'Revision', value: revision ? `${revision.code} ${revisionStateNames[revision.state].toLowerCase()}` : 'None yet' },
    { term: 'As of', value: formatDate(new Date(asOf).toISOString()) },
  ];
  return (
    <DrawingSheet label="Elevation" reading={found ? sayZone(found.zone, found.level) : null} legend={legend} block={block}>
      <BuildingElevation
        levels={building.levels} zoneHref={zoneHref} label={`Elevation of ${project.name}. ${buildingWords(building).heading}.`}
        rails={railsOf} say={(zone, level) => sayZone(zone as BuildingZoneDto, level)} keynotes={numbers} pointed={pointed} onPoint={onPoint}
      />
    </DrawingSheet>
  );
}

/** The building as its designers see it: the drawing with what is open numbered on it, the list with the same numbers, the totals. */
export function DesignBuilding(props: DesignBuildingProps) {
  const { building, project, keynotes } = props;
  const [pointed, point] = useState<Pointed>({ zoneId: null, keynote: null });
  const at = `/projects/${project.id}`;
  const steps = <FirstSteps project={project} building={building} />;
  if (building.levels.length === 0) return steps;
  return (
    <>
      {steps}
      <div className="mt-columns mt-building">
        <div className="mt-stack">
          <Sheet {...props} pointed={pointed} onPoint={point} />
          <ZoneList levels={building.levels} zoneHref={(zone) => `${at}/zones?zone=${zone.id}`} />
        </div>
        <div className="mt-stack">
          {building.members > 0 && <KeynoteList keynotes={keynotes} projectId={project.id} pointed={pointed} onPoint={point} />}
          <ProtectionTotals lines={building.protection} />
        </div>
      </div>
    </>
  );
}
