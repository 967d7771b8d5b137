import { Link } from 'react-router-dom';
import { roleNames } from '@mantlet/common';
import type { OpenItemDto, Role } from '@mantlet/common';
import { keepUnits } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { StatusWord } from '../../../ui/status-word.js';
import { openItemLink } from '../../projects/open-item-link.js';

/** What is open, in the order of who must act; every line leads to the place where it is settled. */
export function OpenItems({ items, projectId, held }: { items: readonly OpenItemDto[]; projectId: string; held: readonly Role[] }) {
  if (items.length === 0) return <Panel label="What is open"><StatusWord kind="settled">Nothing is open</StatusWord></Panel>;
  return (
    <Panel flush label="What is open">
      <ScheduleTable
        caption="What is open, and who must act" rows={items} sticky={false}
        rowKey={(i) => `${i.role} ${i.kind} ${i.code} ${i.zoneId ?? ''} ${i.memberIds[0] ?? ''} ${i.title}`}
        columns={[
          { title: 'Who must act', key: 'who', width: 112, className: 'mt-fold-text', render: (_, i) => <span className="mt-sub">{roleNames[i.role]}{held.includes(i.role) && <> <span className="mt-strong mt-ink mt-own-line">You</span></>}</span> },
          {
            title: 'What is open', key: 'what', className: 'mt-fold-text', render: (_, i) => (
              <div>
                <Link className="mt-strong mt-quiet-link" to={openItemLink(projectId, i)}>{keepUnits(i.title)}</Link>
                <div className="mt-sub">{[i.kind === 'warning' ? 'Worth a look' : null, i.zoneLabel].filter(Boolean).join(' · ')}</div>
              </div>
            ),
          },
        ]}
      />
    </Panel>
  );
}
