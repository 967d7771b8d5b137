import { Button } from 'antd';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { revisionStateNames } from '@mantlet/common';
import type { ProjectListItemDto } from '@mantlet/common';
import { count, countWord, formatNumber, joinWords } from '../../../lib/format.js';
import { rolesInWords } from '../../../lib/may.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { QueryState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useProjects } from '../api/projects.js';
import { ProjectSheet } from '../components/project-sheet.js';
import { CreateProjectDrawer } from '../components/create-project-drawer.js';
import { FirstVisit } from '../components/first-visit.js';

/** Up to this many, each project has a sheet with its building; more are a table. */
const mostSheets = 3;
const notIssued = 'nothing is issued yet';

const columns: ScheduleColumn<ProjectListItemDto>[] = [
  { title: 'Number', dataIndex: 'number', width: 110, className: 'mt-fold-hide' },
  { title: 'Project', key: 'name', className: 'mt-fold-head', render: (_, p) => <><span className="mt-fold-only mt-sub">{p.number}</span><Link to={`/projects/${p.id}`} className="mt-strong">{p.name}</Link>{p.place && <div className="mt-sub">{p.place}</div>}</> },
  { title: 'Your roles', key: 'roles', render: (_, p) => rolesInWords(p.roles) || '–' },
  { title: 'Revision', key: 'revision', width: 150, render: (_, p) => (p.revision ? `${p.revision.code} ${revisionStateNames[p.revision.state].toLowerCase()}` : 'None yet') },
  { title: 'Members', key: 'members', numeric: true, width: 96, render: (_, p) => <Quantity value={p.members} what="Members" reason={notIssued} /> },
  { title: 'Protected m²', key: 'area', numeric: true, width: 120, render: (_, p) => <Quantity value={p.protectedAreaM2} decimals={1} unit="m²" bare what="Protected area" reason={notIssued} /> },
  { title: 'Open', key: 'open', numeric: true, width: 80, render: (_, p) => <Quantity value={p.open} what="Open items" reason={notIssued} /> },
  {
    title: 'Waits on you', key: 'waits', width: 150,
    render: (_, p) => (p.waitsOnMe > 0 ? <StatusWord kind="attention">{count(p.waitsOnMe, 'item')}</StatusWord> : <StatusWord kind="neutral">Nothing</StatusWord>),
  },
];

function headingOf(projects: readonly ProjectListItemDto[]): { heading: string; sub: string } {
  const waiting = projects.filter((p) => p.waitsOnMe > 0);
  const items = waiting.reduce((sum, p) => sum + p.waitsOnMe, 0);
  if (projects.length === 0) return { heading: 'You are on no project yet', sub: 'Others add you to theirs, or you start one.' };
  if (items === 0) return { heading: 'Nothing waits on you', sub: `${countWord(projects.length)} ${projects.length === 1 ? 'project' : 'projects'} with you on the team.` };
  return {
    heading: items === 1 ? 'One item waits on you' : `${countWord(items)} items wait on you`,
    sub: `In ${joinWords(waiting.slice(0, 4).map((p) => p.name))}${waiting.length > 4 ? ` and ${formatNumber(waiting.length - 4)} more` : ''}.`,
  };
}

export default function ProjectsPage() {
  const projects = useProjects();
  const navigate = useNavigate();
  const [creating, setCreating] = useState(false);
  const start = <Button type="primary" onClick={() => setCreating(true)}>Start a project</Button>;
  const words = projects.data ? headingOf(projects.data) : { heading: 'Projects', sub: undefined };
  return (
    <Page title="Projects" heading={words.heading} sub={words.sub} actions={projects.data?.length ? start : null}>
      <QueryState query={projects} what="your projects">
        {(rows) => (
          rows.length > 0 && rows.length <= mostSheets ? <div className="mt-stack">{rows.map((p) => <ProjectSheet key={p.id} project={p} />)}</div> : (
            <Panel flush label="Projects">
              {rows.length === 0 ? (
                <FirstVisit start={start} />
              ) : (
                <ScheduleTable
                  caption="Projects" columns={columns} rows={rows} rowKey={(p) => p.id}
                  onRow={(p) => ({ style: { cursor: 'pointer' }, onClick: (event) => { if (!(event.target as HTMLElement).closest('a')) void navigate(`/projects/${p.id}`); } })}
                />
              )}
            </Panel>
          )
        )}
      </QueryState>
      <CreateProjectDrawer open={creating} onClose={() => setCreating(false)} />
    </Page>
  );
}
