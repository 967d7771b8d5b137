import { Link } from 'react-router-dom';
import { roleNames } from '@mantlet/common';
import { keepUnits } from '../../../lib/format.js';
import type { Pointed } from '../../../ui/drawing/building-elevation.js';
import { Panel } from '../../../ui/panel.js';
import { StatusWord } from '../../../ui/status-word.js';
import { openItemLink } from '../../projects/open-item-link.js';
import { groupsOf } from '../keynotes.js';
import type { Keynote } from '../keynotes.js';

interface KeynoteListProps { keynotes: readonly Keynote[]; projectId: string; pointed: Pointed; onPoint: (pointed: Pointed) => void }

function Line({ keynote: { number, item }, projectId, pointed, onPoint }: Omit<KeynoteListProps, 'keynotes'> & { keynote: Keynote }) {
  const on = pointed.keynote === number || (pointed.keynote === null && pointed.zoneId !== null && pointed.zoneId === item.zoneId);
  const here = { zoneId: item.zoneId, keynote: number };
  const away = { zoneId: null, keynote: null };
  return (
    <li className={on ? 'mt-keynote mt-keynote-on' : 'mt-keynote'} onPointerEnter={() => onPoint(here)} onPointerLeave={() => onPoint(away)} onFocus={() => onPoint(here)} onBlur={() => onPoint(away)}>
      <Link to={openItemLink(projectId, item)}>
        <span className="mt-balloon" aria-hidden="true">{number}</span>
        <span>
          <span className="mt-keynote-title">{keepUnits(item.title)}</span>
          <span className="mt-sub">{[item.kind === 'warning' ? 'Worth a look' : null, item.zoneLabel ?? 'Whole project'].filter(Boolean).join(' · ')}</span>
        </span>
      </Link>
    </li>
  );
}

/** What is open, the reader's own first; the number stands on the zone in the drawing, the line leads to where it is settled. */
export function KeynoteList({ keynotes, ...line }: KeynoteListProps) {
  if (keynotes.length === 0) return <Panel label="What is open"><StatusWord kind="settled">Nothing is open</StatusWord></Panel>;
  return (
    <Panel flush label="What is open" className="mt-keynotes">
      {groupsOf(keynotes).map(({ role, keynotes: own }) => (
        <section key={role} aria-label={role === 'you' ? 'Waits on you' : `Waits on the ${roleNames[role].toLowerCase()}`}>
          <h2 className={role === 'you' ? 'mt-keynote-who mt-keynote-you' : 'mt-keynote-who'}>{role === 'you' ? 'Waits on you' : roleNames[role]}</h2>
          <ol>{own.map((keynote) => <Line key={keynote.number} keynote={keynote} {...line} />)}</ol>
        </section>
      ))}
    </Panel>
  );
}
