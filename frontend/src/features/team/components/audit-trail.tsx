import { Pagination } from 'antd';
import { useCallback, useEffect, useRef } from 'react';
import { useLocation, useSearchParams } from 'react-router-dom';
import type { AuditEntryDto } from '@mantlet/common';
import { formatDateTime, formatNumber } from '../../../lib/format.js';
import { fieldName, isNothing, partsOfChange, valueInWords } from '../../../lib/record-words.js';
import type { Change } from '../../../lib/record-words.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { Term } from '../../../ui/term.js';
import { auditPageSize, useAudit } from '../api/team.js';
import type { AuditFilter } from '../api/team.js';
import { auditFilterOf, auditParams, isNarrowed } from '../audit-filter.js';
import { AuditFilters } from './audit-filters.js';
import { actInWords, groupEntries, groupSize } from './audit-groups.js';
import type { AuditGroup } from './audit-groups.js';

const shownParts = 8;
const naming = ({ field, old, new: next }: Change) => `${fieldName(field)} ${valueInWords(field, isNothing(next) ? old : next)}`;

/** What a made or deleted thing held in one running line, what a change changed in a line each. */
function Parts({ parts }: { parts: readonly Change[] }) {
  const made = parts.every((p) => isNothing(p.old));
  if (made || parts.every((p) => isNothing(p.new))) return <div>{made ? '' : 'Was: '}{parts.map(naming).join('; ')}</div>;
  return <>{parts.map((p) => <div key={p.field}><span className="mt-sub">{fieldName(p.field)}:</span> {valueInWords(p.field, p.old)} → <span className="mt-strong">{valueInWords(p.field, p.new)}</span></div>)}</>;
}

function Changes({ entry }: { entry: AuditEntryDto }) {
  const parts = entry.changes.flatMap(partsOfChange);
  const rest = parts.slice(shownParts);
  return (
    <>
      {parts.length > 0 && <Parts parts={parts.slice(0, shownParts)} />}
      {rest.length > 0 && <details><summary className="mt-sub">{rest.length} more</summary><Parts parts={rest} /></details>}
    </>
  );
}

const shownLabels = 6;
function GroupChanges({ group }: { group: AuditGroup }) {
  const [first] = group;
  if (!first) return null;
  const labels = group.map((e) => e.label);
  return (
    <>
      {group.length === 1 ? <Changes entry={first} /> : (
        <details className="mt-trail">
          <summary>{labels.slice(0, shownLabels).join(', ')}{labels.length > shownLabels ? ` and ${labels.length - shownLabels} more` : ''}</summary>
          <ul>{group.map((entry) => <li key={entry.id}><span className="mt-strong">{entry.label}</span><Changes entry={entry} /></li>)}</ul>
        </details>
      )}
      {first.why && <div className="mt-sub">Why: {first.why}</div>}
    </>
  );
}

const columns: ScheduleColumn<AuditGroup>[] = [
  { title: 'When', key: 'at', width: 160, className: 'mt-fold-hide', render: (_, g) => formatDateTime(g[0]?.at) },
  { title: 'Who', key: 'who', width: 150, className: 'mt-fold-hide', render: (_, g) => g[0]?.userName },
  {
    title: 'What', key: 'what', width: 280, className: 'mt-fold-head', render: (_, g) => g[0] && (
      <>{actInWords(g[0], g.length > 1)}<div className="mt-strong">{g.length === 1 ? g[0].label : groupSize(g)}</div><div className="mt-fold-only mt-sub">{formatDateTime(g[0].at)}, {g[0].userName}</div></>
    ),
  },
  { title: 'Change and why', key: 'changes', className: 'mt-fold-text', render: (_, g) => <GroupChanges group={g} /> },
];

/** Who changed what, when, from what to what, and why. Nothing can be taken out of it. */
export function AuditTrail({ projectId }: { projectId: string }) {
  const [params, setParams] = useSearchParams();
  const filter = auditFilterOf(params);
  const audit = useAudit(projectId, filter);
  const change = useCallback((next: AuditFilter) => setParams(auditParams(next), { replace: true, preventScrollReset: true }), [setParams]);
  // an address made for the trail opens at it, once
  const asked = useRef(useLocation().hash === '#audit' || isNarrowed(filter) || filter.page > 1);
  useEffect(() => {
    if (!asked.current || audit.data === undefined) return;
    asked.current = false;
    document.getElementById('audit')?.scrollIntoView();
  }, [audit.data]);
  return (
    <div id="audit" className="mt-audit">
      <Panel flush title={<Term name="audit-trail" />} sub="Newest first. Nothing can be taken out of it.">
        <AuditFilters projectId={projectId} filter={filter} onChange={change} />
        <QueryState query={audit} what="the audit trail">
          {(data) => (
            <>
              <ScheduleTable<AuditGroup>
                caption="Audit trail" columns={columns} rows={groupEntries(data.items)} rowKey={(g) => g[0]?.id ?? ''} sticky={false} minWidth={860}
                empty={<EmptyState title={isNarrowed(filter) ? 'No entry is as asked' : 'Nothing has been changed yet'}>{isNarrowed(filter) ? 'Widen the dates, or show everything.' : null}</EmptyState>}
              />
              {data.total > auditPageSize && (
                <Pagination className="mt-pages" current={filter.page} pageSize={auditPageSize} total={data.total} showSizeChanger={false} showLessItems onChange={(page) => change({ ...filter, page })} showTotal={(n) => `${formatNumber(n)} entries`} />
              )}
            </>
          )}
        </QueryState>
      </Panel>
    </div>
  );
}
