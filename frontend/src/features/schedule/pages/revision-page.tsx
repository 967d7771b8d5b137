import { Link, useParams } from 'react-router-dom';
import { Page } from '../../../ui/page.js';
import { QueryState } from '../../../ui/states.js';
import { useCurrentProject, useMay } from '../../projects/project-context.js';
import { useReadiness, useRevision } from '../api/revisions.js';
import { LifeLine } from '../components/life-line.js';
import { RevisionActions } from '../components/revision-actions.js';
import { Digests, PdfPreview, Summary } from '../components/revision-papers.js';
import { revisionHeading, stateWord } from '../revision-words.js';
import '../schedule.css';

/** One revision: its life, its signatures, its PDF and what it froze. */
export default function RevisionPage() {
  const project = useCurrentProject();
  const { revisionId = '' } = useParams();
  const design = useMay()('see-design');
  const query = useRevision(project.id, revisionId);
  const revision = query.data;
  const readiness = useReadiness(project.id, design && revision?.state === 'draft');
  return (
    <Page
      title={revision ? `Schedule ${revision.code}` : 'Schedule'} trail={revision ? [revision.code, 'Schedule'] : undefined} projectName={project.name} heading={revision ? revisionHeading(revision) : 'Revision'} sub={revision?.purpose || undefined}
      state={revision ? { ...stateWord(revision.state), revision: `${revision.code} ${stateWord(revision.state).word.toLowerCase()}` } : undefined} actions={<Link to={`/projects/${project.id}/schedule`}>All revisions</Link>}
    >
      <QueryState query={query} what="the revision">
        {(r) => (
          <>
            <LifeLine revision={r} />
            {r.returnedComment && <p className="mt-returned"><span className="mt-strong">Returned: </span>{r.returnedComment}</p>}
            <RevisionActions projectId={project.id} revision={r} held={project.roles} readiness={readiness.data} listed={<Link to={`/projects/${project.id}/schedule`}>See what is open</Link>} />
            <div className="mt-columns">
              <div className="mt-stack">
                <PdfPreview revision={r} projectId={project.id} />
                {r.summary && <Summary summary={r.summary} />}
              </div>
              <div className="mt-stack"><Digests revision={r} projectId={project.id} /></div>
            </div>
          </>
        )}
      </QueryState>
    </Page>
  );
}
