import { useEffect } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { roleNames, roles } from '@mantlet/common';
import type { Role } from '@mantlet/common';
import { administratorSteps, roleDecides, roleSteps } from '../../../lib/role-words.js';
import { termAnchor, termGroups, termNames, terms } from '../../../lib/terms.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { useSession } from '../../session/api/session.js';
import { useProjects } from '../../projects/api/projects.js';
import '../help.css';

const order: readonly (Role | 'administrator')[] = [...roles, 'administrator'];
const nameOf = (who: Role | 'administrator') => (who === 'administrator' ? 'Administrator' : roleNames[who]);

function Steps({ who, mine, projectId }: { who: Role | 'administrator'; mine: boolean; projectId: string | null }) {
  return (
    <section id={who} className="mt-help-role" aria-labelledby={`${who}-name`}>
      <h3 id={`${who}-name`}>{nameOf(who)}{mine && <> <span className="mt-unit">(you)</span></>}</h3>
      <p className="mt-sub">{who === 'administrator' ? 'Keeps accounts, the shared product library and the section catalogue.' : roleDecides[who]}</p>
      <ol>
        {who === 'administrator'
          ? administratorSteps.map((text) => <li key={text}>{text}</li>)
          : roleSteps[who].map((s) => <li key={s.text}>{s.text} {projectId ? <Link to={`/projects/${projectId}${s.page && `/${s.page}`}`}>{s.pageName}</Link> : <span className="mt-sub">({s.pageName})</span>}</li>)}
      </ol>
    </section>
  );
}

function Words() {
  return (
    <Panel title="Words" sub="The same sentences stand behind the underlined words on every page.">
      {termGroups.map((group) => (
        <section key={group} aria-label={group} className="mt-help-words">
          <h3>{group}</h3>
          <dl>{termNames.filter((name) => terms[name].group === group).map((name) => <div key={name} id={termAnchor(name)}><dt>{terms[name].word}</dt><dd>{terms[name].sentence}</dd></div>)}</dl>
        </section>
      ))}
    </Panel>
  );
}

/** What each role does from first sign-in to done, and the trade's words. An address with # opens at a role or a word. */
export default function HelpPage() {
  const user = useSession().data?.user;
  const projects = useProjects();
  const { hash } = useLocation();
  useEffect(() => { if (hash) document.getElementById(decodeURIComponent(hash.slice(1)))?.scrollIntoView(); }, [hash]);
  // with one project, the steps lead into it
  const only = projects.data?.length === 1 ? projects.data[0] : undefined;
  const held = new Set<string>((projects.data ?? []).flatMap((p) => p.roles));
  if (user?.administrator) held.add('administrator');
  const sorted = [...order].sort((a, b) => Number(held.has(b)) - Number(held.has(a)));
  return (
    <Page title="Help" heading="Your part, step by step" sub="Each role decides its own part; the server keeps it so. The schedule is done when nobody waits on anybody.">
      <Panel title="Who does what">
        <div className="mt-help-roles">
          {sorted.map((who) => <Steps key={who} who={who} mine={held.has(who)} projectId={only && who !== 'administrator' && held.has(who) ? only.id : null} />)}
        </div>
      </Panel>
      <Words />
      <Panel title="Keys">
        <dl className="mt-help-keys">
          <div><dt>Tab, Shift Tab</dt><dd>Go through everything that can be opened, changed or read out; drawings too.</dd></div>
          <div><dt>Enter</dt><dd>Opens a link, presses a button, saves the form you are in.</dd></div>
          <div><dt>Arrow keys</dt><dd>Move within a list of choices, and along a drawing.</dd></div>
          <div><dt>Escape</dt><dd>Closes the explanation of a word, a list or a form. A form with unsaved changes asks first.</dd></div>
        </dl>
      </Panel>
      <p className="mt-sub">
        Results support design by licensed engineers and do not replace it. Local codes and the authority having jurisdiction govern; the period comes from the fire strategy;
        a product’s own evidence governs its thickness. Nothing here certifies a product.
      </p>
    </Page>
  );
}
