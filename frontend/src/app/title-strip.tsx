import { Link } from 'react-router-dom';
import { revisionStateNames } from '@mantlet/common';
import type { MeDto, ProjectDto } from '@mantlet/common';
import { may, rolesInWords } from '../lib/may.js';
import { Mark } from '../ui/mark.js';
import { usePageInfo } from '../ui/page-info.js';
import { AccountMenu } from './account-menu.js';

const stateOf = (project: ProjectDto) =>
  project.counts.open > 0
    ? { word: `${project.counts.open} open`, kind: 'attention' as const }
    : project.counts.members > 0 ? { word: 'Settled', kind: 'settled' as const } : { word: 'No members yet', kind: 'neutral' as const };

/** On a project, one's roles there; elsewhere, whether one is the administrator. */
export const standing = (project: ProjectDto | undefined, user: MeDto | null) =>
  project?.roles.length ? rolesInWords(project.roles) : user?.administrator ? 'Administrator' : user?.name ?? '';

/** Like the title block of a drawing: what this is, which page and revision, how it stands, and who looks at it. */
export function TitleStrip({ project, user, onMenu }: { project: ProjectDto | undefined; user: MeDto | null; onMenu: () => void }) {
  const { title, state } = usePageInfo();
  const design = project ? may(project.roles, 'see-design') : false;
  const shownState = state ?? (project && design ? stateOf(project) : undefined);
  const revision = project && (design ? project.revision : project.issuedRevision && { ...project.issuedRevision, state: 'issued' as const });
  const shownRevision = state?.revision ?? (revision ? `${revision.code} ${revisionStateNames[revision.state].toLowerCase()}` : null);
  return (
    <header className="mt-strip">
      <Link className="mt-strip-brand" to="/projects" aria-label="Mantlet, all projects"><Mark /><span>Mantlet</span></Link>
      <dl>
        {project && <div className="mt-strip-cell mt-strip-project"><dt>Project {project.number}</dt><dd title={project.name}><Link to={`/projects/${project.id}`}>{project.name}</Link></dd></div>}
        <div className="mt-strip-cell mt-strip-page"><dt>{project ? <><span className="mt-strip-wide">Page</span><span className="mt-strip-narrow">{project.number}{shownRevision ? `, ${shownRevision}` : ''}</span></> : 'Page'}</dt><dd title={title}>{title || '…'}</dd></div>
        {project && <div className="mt-strip-cell mt-strip-revision"><dt>Revision</dt><dd>{shownRevision ?? 'None yet'}</dd></div>}
        {shownState && <div className="mt-strip-cell mt-strip-state"><dt>State</dt><dd className={shownState.kind === 'neutral' ? '' : `mt-${shownState.kind}`}>{shownState.word}</dd></div>}
      </dl>
      <AccountMenu user={user} roles={standing(project, user)} />
      <button type="button" className="mt-strip-menu" onClick={onMenu}>Menu</button>
    </header>
  );
}
