import { Button } from 'antd';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { suggestRevisionCode } from '@mantlet/common';
import type { ProjectDto, RevisionDto } from '@mantlet/common';
import { whyNot } from '../../../lib/may.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { useCurrentProject, useMay } from '../../projects/project-context.js';
import { useReadiness, useRevisions } from '../api/revisions.js';
import { LifeLine } from '../components/life-line.js';
import { Readiness } from '../components/readiness.js';
import { Register } from '../components/register.js';
import { StartRevision } from '../components/revision-drawers.js';
import { RevisionActions } from '../components/revision-actions.js';
import { AwaitedFrom } from '../../team/components/awaited-from.js';
import { isOpen, scheduleWords } from '../revision-words.js';
import '../schedule.css';

function InWork({ revision, project, readiness }: { revision: RevisionDto; project: ProjectDto; readiness: ReturnType<typeof useReadiness>['data'] }) {
  return (
    <section className="mt-stack" aria-label={`${revision.code}, in work`}>
      <LifeLine revision={revision} />
      {revision.returnedComment && <p className="mt-returned"><span className="mt-strong">Returned: </span>{revision.returnedComment}</p>}
      <RevisionActions projectId={project.id} revision={revision} held={project.roles} readiness={readiness} listed="They are listed under Readiness, each with the place where it is settled." />
      <p><Link to={`/projects/${project.id}/schedule/${revision.id}`}>Open {revision.code} with its PDF</Link></p>
    </section>
  );
}

function Nothing({ projectId, design, canStart, onStart }: { projectId: string; design: boolean; canStart: boolean; onStart: () => void }) {
  if (!design) return <Panel label="Revisions"><EmptyState title="Nothing has been issued yet">Revisions appear here once a specifier issues the schedule. <AwaitedFrom projectId={projectId} /></EmptyState></Panel>;
  return (
    <Panel label="Revisions">
      <EmptyState title={canStart ? 'Start the first revision' : 'No revision yet'} action={canStart ? <Button type="primary" onClick={onStart}>Start a revision</Button> : null}>
        {canStart ? 'A revision starts as a draft. Preparing it freezes the schedule; another specifier checks it; then it is issued.' : whyNot('edit-revisions')}
      </EmptyState>
    </Panel>
  );
}

export default function SchedulePage() {
  const project = useCurrentProject();
  const may = useMay();
  const go = useNavigate();
  const design = may('see-design');
  const revisions = useRevisions(project.id);
  const readiness = useReadiness(project.id, design);
  const [starting, setStarting] = useState(false);
  const words = revisions.data ? scheduleWords(revisions.data, readiness.data, project.roles) : { heading: 'Schedule', sub: undefined };
  const open = revisions.data?.find((r) => isOpen(r.state));
  const canStart = may('edit-revisions') && revisions.data !== undefined && !open;
  return (
    <Page
      title="Schedule" projectName={project.name} heading={words.heading} sub={words.sub}
      actions={canStart && revisions.data && revisions.data.length > 0 ? <Button type="primary" onClick={() => setStarting(true)}>Start the next revision</Button> : null}
    >
      <QueryState query={revisions} what="the revisions">
        {(list) => (
          <>
            {open && <InWork revision={open} project={project} readiness={readiness.data} />}
            {design && <QueryState query={readiness} what="what is open">{(r) => <Readiness readiness={r} projectId={project.id} held={project.roles} />}</QueryState>}
            {list.length > 0 ? <Register revisions={list} projectId={project.id} /> : <Nothing projectId={project.id} design={design} canStart={canStart} onStart={() => setStarting(true)} />}
          </>
        )}
      </QueryState>
      {starting && (
        <StartRevision projectId={project.id} code={suggestRevisionCode((revisions.data ?? []).map((r) => r.code))} onClose={() => setStarting(false)} onStarted={(r) => { setStarting(false); void go(`/projects/${project.id}/schedule/${r.id}`); }} />
      )}
    </Page>
  );
}
