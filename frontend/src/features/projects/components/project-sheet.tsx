import { Link } from 'react-router-dom';
import { revisionStateNames } from '@mantlet/common';
import type { ProjectListItemDto } from '@mantlet/common';
import { countWord, formatNumber, keepUnits } from '../../../lib/format.js';
import { may, rolesInWords } from '../../../lib/may.js';
import { BuildingSketch } from '../../../ui/drawing/building-sketch.js';
import type { ElevationLevel } from '../../../ui/drawing/building-elevation-layout.js';
import { Quantity } from '../../../ui/quantity.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useBuilding, useIssuedBuilding } from '../../building/api/building.js';
import { openItemLink } from '../open-item-link.js';
import './project-sheet.css';

const notIssued = 'nothing is issued yet';
const longest = 4;

/** What the reader must act on, line by line; the rest is on the project's front page. */
interface WaitingItem { title: string; zoneLabel: string | null; to: string }
function Waiting({ project, items }: { project: ProjectListItemDto; /** null until they are known */ items: readonly WaitingItem[] | null }) {
  const known = items ?? [];
  const waits = Math.max(project.waitsOnMe, known.length);
  if (waits === 0) return <StatusWord kind="neutral">Nothing waits on you here</StatusWord>;
  const more = waits - Math.min(known.length, longest);
  return (
    <>
      <StatusWord kind="attention">{waits === 1 ? 'One item waits on you' : `${countWord(waits)} items wait on you`}</StatusWord>
      <ul>
        {known.slice(0, longest).map((item) => <li key={item.to + item.title}><Link to={item.to}>{keepUnits(item.title)}</Link>{item.zoneLabel && <span className="mt-sub"> {item.zoneLabel}</span>}</li>)}
        {items && more > 0 && <li><Link to={`/projects/${project.id}${known.length === 0 ? '/schedule' : ''}`}>{known.length === 0 ? 'A revision waits for your signature' : `and ${formatNumber(more)} more`}</Link></li>}
      </ul>
    </>
  );
}

function Sheet({ project, levels, items, drawing }: { project: ProjectListItemDto; levels: readonly ElevationLevel[]; drawing: string; items: readonly WaitingItem[] | null }) {
  const revision = project.revision ? `${project.revision.code} ${revisionStateNames[project.revision.state].toLowerCase()}` : 'None yet';
  return (
    <article className="mt-panel mt-project" aria-labelledby={`project-${project.id}`}>
      <div className="mt-project-words">
        <p className="mt-sub">{project.number}{project.place && `, ${project.place}`}</p>
        <h2 id={`project-${project.id}`}><Link to={`/projects/${project.id}`}>{project.name}</Link></h2>
        <div className="mt-project-waits"><Waiting project={project} items={items} /></div>
        <dl className="mt-project-facts">
          <div><dt>Revision</dt><dd>{revision}</dd></div>
          <div><dt>Members</dt><dd><Quantity value={project.members} what="Members" reason={notIssued} /></dd></div>
          <div><dt>Protected</dt><dd><Quantity value={project.protectedAreaM2} unit="m²" what="Protected area" reason={notIssued} /></dd></div>
          {project.open !== null && <div><dt>Open</dt><dd className={project.open > 0 ? 'mt-attention' : ''}>{formatNumber(project.open)}</dd></div>}
          <div><dt>Your roles</dt><dd>{rolesInWords(project.roles) || '–'}</dd></div>
        </dl>
      </div>
      <Link className="mt-project-drawing" to={`/projects/${project.id}`} tabIndex={-1} aria-hidden="true">
        {levels.length > 0 ? <BuildingSketch levels={levels} /> : <span className="mt-sub">{drawing}</span>}
      </Link>
    </article>
  );
}

function DesignSheet({ project }: { project: ProjectListItemDto }) {
  const building = useBuilding(project.id);
  const items = building.data ? building.data.openItems.filter((item) => item.kind === 'blocker' && project.roles.includes(item.role)).map((item) => ({ title: item.title, zoneLabel: item.zoneLabel, to: openItemLink(project.id, item) })) : null;
  return <Sheet project={project} levels={building.data?.levels ?? []} items={items} drawing={building.data ? 'No levels yet' : ''} />;
}
function IssuedSheet({ project }: { project: ProjectListItemDto }) {
  const building = useIssuedBuilding(project.id);
  const levels = (building.data?.levels ?? []).map((level) => ({ ...level, zones: level.zones.map((zone) => ({ ...zone, settled: zone.members, open: 0, issuedMembers: zone.members })) }));
  return <Sheet project={project} levels={levels} items={[]} drawing={building.data ? 'Nothing is issued yet' : ''} />;
}

/** A project on a sheet of its own, for those who have few: what waits on them, how it stands, and the building. */
export function ProjectSheet({ project }: { project: ProjectListItemDto }) {
  return may(project.roles, 'see-design') ? <DesignSheet project={project} /> : <IssuedSheet project={project} />;
}
