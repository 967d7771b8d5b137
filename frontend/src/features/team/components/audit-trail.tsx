import { Input, Pagination } from 'antd';
import { useDeferredValue, useState } from 'react';
import type { AuditEntryDto } from '@mantlet/common';
import { formatDateTime, formatNumber } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { auditPageSize, useAudit } from '../api/team.js';
import { changeLines } from './audit-words.js';

function Changes({ entry }: { entry: AuditEntryDto }) {
  const lines = changeLines(entry);
  const shown = lines.slice(0, 6);
  return (
    <>
      {shown.map((l) => <div key={l.field}><span className="mt-sub">{l.field}:</span> {l.old} → <span className="mt-strong">{l.new}</span></div>)}
      {lines.length > shown.length && <div className="mt-sub">and {lines.length - shown.length} more fields</div>}
      {entry.why && <div className="mt-sub">Why: {entry.why}</div>}
    </>
  );
}

/** Who changed what, when, from what to what, and why. Nothing can be taken out of it. */
export function AuditTrail({ projectId }: { projectId: string }) {
  const [search, setSearch] = useState('');
  const [page, setPage] = useState(1);
  const asked = useDeferredValue(search.trim());
  const audit = useAudit(projectId, { search: asked, page });
  return (
    <Panel
      flush title="Audit trail"
      actions={<Input allowClear value={search} aria-label="Search the audit trail" placeholder="Search" style={{ width: 220 }} onChange={(e) => { setSearch(e.target.value); setPage(1); }} />}
    >
      <QueryState query={audit} what="the audit trail">
        {(data) => (
          <>
            <ScheduleTable
              caption="Audit trail" rows={data.items} rowKey={(e) => e.id} sticky={false} minWidth={860}
              empty={<EmptyState title={asked ? `Nothing holds "${asked}"` : 'Nothing has been changed yet'} />}
              columns={[
                { title: 'When', key: 'at', width: 160, render: (_, e) => formatDateTime(e.at) },
                { title: 'Who', dataIndex: 'userName', width: 140 },
                { title: 'What', key: 'what', width: 260, render: (_, e) => <>{e.action} <span className="mt-sub">{e.entity}</span> <span className="mt-strong">{e.label}</span></> },
                { title: 'Change and why', key: 'changes', render: (_, e) => <Changes entry={e} /> },
              ]}
            />
            {data.total > auditPageSize && (
              <Pagination className="mt-pages" current={page} pageSize={auditPageSize} total={data.total} showSizeChanger={false} onChange={setPage} showTotal={(n) => `${formatNumber(n)} entries`} />
            )}
          </>
        )}
      </QueryState>
    </Panel>
  );
}
