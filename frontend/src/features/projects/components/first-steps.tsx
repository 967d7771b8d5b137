import { roleNames } from '@mantlet/common';
import type { BuildingDto, ProjectDto } from '@mantlet/common';
import { countWord, joinWords } from '../../../lib/format.js';
import { may, rolesFor } from '../../../lib/may.js';
import { LinkButton } from '../../../ui/link-button.js';
import { Panel } from '../../../ui/panel.js';
import { LoadingState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useMemberships } from '../../team/api/team.js';
import { useZones } from '../../zones/api/zones.js';
import { firstSteps } from '../first-steps.js';
import type { FirstStep } from '../first-steps.js';
import './first-steps.css';

const whose = (step: FirstStep) => joinWords(rolesFor(step.right).map((role) => `the ${roleNames[role].toLowerCase()}`));

function Step({ step, number, next, project }: { step: FirstStep; number: number; next: boolean; project: ProjectDto }) {
  const mine = may(project.roles, step.right);
  return (
    <li className={step.done ? 'mt-first-done' : next ? 'mt-first-next' : ''} aria-current={next ? 'step' : undefined}>
      <span className="mt-first-number" aria-hidden="true">{number}</span>
      <div>
        <h3>{step.title}</h3>
        <p className="mt-sub">{step.how}</p>
      </div>
      <div className="mt-first-state">
        {step.done ? <StatusWord kind="settled">{step.state}</StatusWord> : <StatusWord kind={next ? 'attention' : 'neutral'}>{next && !mine ? `Waits on ${whose(step)}` : step.state}</StatusWord>}
        {!step.done && mine && <LinkButton type={next ? 'primary' : 'default'} to={`/projects/${project.id}/${step.to}`}>{step.link}</LinkButton>}
        {!step.done && !mine && !next && <span className="mt-sub">Then {whose(step)}</span>}
      </div>
    </li>
  );
}

/** The way from an empty project to the first settled member: what is done, whose turn it is, and where. Gone once it is walked. */
export function FirstSteps({ project, building }: { project: ProjectDto; building: Pick<BuildingDto, 'members' | 'settled' | 'openItems'> }) {
  const walked = building.settled > 0 || project.issuedRevision !== null;
  const zones = useZones(project.id, !walked);
  const team = useMemberships(project.id, !walked);
  if (walked || zones.isError || team.isError) return null;
  if (zones.data === undefined || team.data === undefined) return <Panel title="First steps"><LoadingState what="the first steps" /></Panel>;
  const steps = firstSteps(project, building, zones.data, team.data);
  const left = steps.filter((s) => !s.done).length;
  const next = steps.find((s) => !s.done);
  if (!next) return null;
  return (
    <Panel title="First steps" sub={`${countWord(left)} ${left === 1 ? 'step' : 'steps'} to go. From then on, this page lists what is open.`} className="mt-first">
      <ol>{steps.map((step, i) => <Step key={step.key} step={step} number={i + 1} next={step === next} project={project} />)}</ol>
    </Panel>
  );
}
