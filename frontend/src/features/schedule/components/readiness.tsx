import { Alert, Button } from 'antd';
import { Link } from 'react-router-dom';
import type { OpenItemDto, ReadinessDto, Role } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { keepUnits } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';
import { StatusWord } from '../../../ui/status-word.js';
import { openItemLink } from '../../projects/open-item-link.js';
import { useRecalculate } from '../api/revisions.js';
import { groupByRole, roleTally } from '../revision-words.js';

function Item({ item, projectId }: { item: OpenItemDto; projectId: string }) {
  return (
    <li>
      <StatusWord kind={item.kind === 'blocker' ? 'attention' : 'neutral'}>{item.kind === 'blocker' ? 'Blocks' : 'Worth a look'}</StatusWord>
      <span>
        <Link className="mt-strong mt-quiet-link" to={openItemLink(projectId, item)}>{keepUnits(item.title)}</Link>
        {item.zoneLabel && <span className="mt-sub"> {item.zoneLabel}</span>}
      </span>
    </li>
  );
}

function Stale({ projectId }: { projectId: string }) {
  const recalculate = useRecalculate(projectId);
  return (
    <div className="mt-readiness-stale">
      <p>Some results are older than what they rest on.</p>
      <Button loading={recalculate.isPending} onClick={() => recalculate.mutate()}>Recalculate</Button>
      {recalculate.error && <Alert type="error" role="alert" title="Not recalculated" description={recalculate.error instanceof ApiError ? recalculate.error.message : 'Try again.'} />}
    </div>
  );
}

/** What keeps the schedule from being prepared, by who must act; each line leads to where it is settled. */
export function Readiness({ readiness, projectId, held }: { readiness: ReadinessDto; projectId: string; held: readonly Role[] }) {
  const groups = groupByRole(readiness);
  // a worker is at it: nothing to press
  const inWork = readiness.blockers.some((item) => item.code === 'recalculating');
  const open = readiness.blockers.length;
  return (
    <Panel title="Readiness" sub={open > 0 ? 'Each line leads to the place where it is settled.' : undefined}>
      {open === 0 && <StatusWord kind="settled">Nothing keeps the schedule from being prepared</StatusWord>}
      {!readiness.current && !inWork && <Stale projectId={projectId} />}
      {groups.map((group) => (
        <section key={group.role} aria-label={roleTally(group)} className="mt-readiness">
          <h3>{roleTally(group)}{held.includes(group.role) && <span className="mt-sub"> (you)</span>}</h3>
          <ul>{group.items.map((item) => <Item key={`${item.code} ${item.zoneId ?? ''} ${item.memberIds[0] ?? ''} ${item.title}`} item={item} projectId={projectId} />)}</ul>
        </section>
      ))}
    </Panel>
  );
}
