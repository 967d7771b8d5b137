import { roleNames } from '@mantlet/common';
import type { MembershipDto, ProjectDto, ProjectSettings, Role } from '@mantlet/common';
import { countWord, joinWords } from '../../../lib/format.js';
import { Page } from '../../../ui/page.js';
import { useCurrentProject, useMay } from '../../projects/project-context.js';
import { useMemberships } from '../api/team.js';
import { AuditTrail } from '../components/audit-trail.js';
import { DesignBasisPanel } from '../components/design-basis.js';
import { People } from '../components/people.js';
import { ProjectParticulars } from '../components/project-particulars.js';
import { TakeoffSettingsPanel } from '../components/takeoff-settings.js';
import '../team.css';

/** A schedule needs these three, and a second specifier to check it. */
export function teamWords(people: readonly MembershipDto[]): { heading: string; sub: string } {
  const holders = (role: Role) => people.filter((p) => p.roles.includes(role)).length;
  const missing = (['fire-engineer', 'structural-engineer', 'specifier'] as const).filter((r) => holders(r) === 0);
  const heading = `${countWord(people.length)} ${people.length === 1 ? 'person' : 'people'} on the team`;
  if (missing.length) return { heading, sub: `Still without ${joinWords(missing.map((r) => `a ${roleNames[r].toLowerCase()}`))}.` };
  if (holders('specifier') < 2) return { heading, sub: 'Only one specifier: nobody can check what they prepare. Add a second before the schedule is prepared.' };
  return { heading, sub: 'Every part of the schedule has somebody to decide it, and somebody else to check it.' };
}

function Settings({ project, settings }: { project: ProjectDto; settings: ProjectSettings }) {
  return (
    <>
      <div className="mt-halves">
        <div className="mt-stack"><ProjectParticulars project={project} /><TakeoffSettingsPanel project={project} settings={settings} /></div>
        <DesignBasisPanel project={project} settings={settings} />
      </div>
      <AuditTrail projectId={project.id} />
    </>
  );
}

export default function TeamPage() {
  const project = useCurrentProject();
  const design = useMay()('see-design');
  const people = useMemberships(project.id);
  const words = people.data ? teamWords(people.data) : { heading: 'Team and basis', sub: undefined };
  return (
    <Page title="Team and basis" projectName={project.name} heading={words.heading} sub={words.sub}>
      <People projectId={project.id} />
      {design && project.settings && <Settings project={project} settings={project.settings} />}
    </Page>
  );
}
