import { useMemo, useState } from 'react';
import type { IssuedBuildingDto, IssuedZoneDto, ProjectDto } from '@mantlet/common';
import { formatDate } from '../../../lib/format.js';
import { BuildingElevation } from '../../../ui/drawing/building-elevation.js';
import type { Pointed, Rail } from '../../../ui/drawing/building-elevation.js';
import { LinkButton } from '../../../ui/link-button.js';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { EmptyState } from '../../../ui/states.js';
import { issuedWords, sayIssued } from '../building-words.js';
import { DrawingSheet, KeyLine } from './drawing-sheet.js';

type Level = IssuedBuildingDto['levels'][number];
/** The zone as the drawing takes it; what was issued is neither settled nor open any more. */
const drawn = (zone: IssuedZoneDto) => ({ ...zone, settled: zone.members, open: 0, issuedMembers: zone.members });
const asIssued = (zone: unknown) => zone as IssuedZoneDto;
const railsOf = (zone: unknown): Rail[] => [{ key: 'protected', kind: 'ink', members: asIssued(zone).protectedMembers }];

const legend = (
  <>
    <KeyLine mark="ink">Share of the zone’s members to protect; the rest stay bare</KeyLine>
    <span className="mt-key-note">What is applied and accepted is drawn once work is recorded on site.</span>
  </>
);

function ByLevel({ levels, at }: { levels: readonly Level[]; at: string }) {
  const sum = (level: Level, of: (zone: IssuedZoneDto) => number) => level.zones.reduce((total, zone) => total + of(zone), 0);
  const rows = [...levels].sort((a, b) => b.elevationM - a.elevationM);
  return (
    <Panel flush title="By level" actions={<LinkButton to={`${at}/site`} type="primary">Floor by floor on the Site page</LinkButton>}>
      <ScheduleTable
        caption="Issued by level" rows={rows} rowKey={(l) => l.id} sticky={false} fold={false} className="mt-tight"
        columns={[
          { title: 'Level', key: 'level', render: (_, l) => `${l.code} ${l.name}` },
          { title: 'Protect', key: 'protect', numeric: true, width: 72, render: (_, l) => <Quantity value={sum(l, (z) => z.protectedMembers)} what="Members to protect" /> },
          { title: 'Bare', key: 'bare', numeric: true, width: 56, render: (_, l) => <Quantity value={sum(l, (z) => z.bareMembers)} what="Members that stay bare" /> },
          { title: 'Area m²', key: 'area', numeric: true, width: 84, render: (_, l) => <Quantity value={sum(l, (z) => z.protectedAreaM2)} decimals={1} unit="m²" bare what="Area to protect" /> },
        ]}
      />
    </Panel>
  );
}

/** The front page of those who build, inspect or read: the building of the issued revision, and nothing of work in progress. */
export function IssuedBuilding({ building, project }: { building: IssuedBuildingDto; project: ProjectDto }) {
  const [pointed, point] = useState<Pointed>({ zoneId: null, keynote: null });
  const levels = useMemo(() => building.levels.map((level) => ({ ...level, zones: level.zones.map(drawn) })), [building.levels]);
  const at = `/projects/${project.id}`;
  const { revision } = building;
  if (!revision) {
    return <Panel flush label="Building"><EmptyState title="Nothing to show yet">The schedule is still being worked on. Once a specifier issues a revision, its building, quantities and PDF stand here.</EmptyState></Panel>;
  }
  const found = levels.flatMap((level) => level.zones.map((zone) => ({ level, zone }))).find(({ zone }) => zone.id === pointed.zoneId);
  const block = [
    { term: 'Drawing', value: 'Elevation by zone' },
    { term: 'Heights', value: 'To scale, in metres' },
    { term: 'Widths', value: 'By protected area' },
    { term: 'Revision', value: `${revision.code} issued` },
    { term: 'Issued', value: formatDate(revision.issuedAt) },
  ];
  return (
    <div className="mt-columns mt-building">
      <DrawingSheet label="Elevation" reading={found ? sayIssued(found.zone, found.level) : null} legend={legend} block={block}>
        <BuildingElevation
          levels={levels} zoneHref={(zone) => `${at}/site#zone-${zone.id}`} label={`Elevation of ${project.name}. ${issuedWords(building).heading}.`}
          rails={railsOf} say={(zone, level) => sayIssued(asIssued(zone), level)} pointed={pointed} onPoint={point}
        />
      </DrawingSheet>
      <ByLevel levels={building.levels} at={at} />
    </div>
  );
}
