import { Button, Input, Select } from 'antd';
import { useEffect, useId, useState } from 'react';
import type { ReactNode } from 'react';
import { useMemberships } from '../api/team.js';
import type { AuditFilter } from '../api/team.js';
import { auditThings, isNarrowed } from '../audit-filter.js';

const things = [{ value: '', label: 'Everything' }, ...Object.entries(auditThings).map(([value, label]) => ({ value, label }))];
const none: AuditFilter = { search: '', who: '', what: '', from: '', to: '', page: 1 };

function Narrow({ label, children }: { label: string; children: (id: string) => ReactNode }) {
  const id = useId();
  return <div className="mt-field"><label className="mt-label" htmlFor={id}>{label}</label>{children(id)}</div>;
}

/** Search by what was typed a moment ago, so that the address does not change with every letter. */
function Search({ id, value, onChange }: { id: string; value: string; onChange: (text: string) => void }) {
  const [typed, setTyped] = useState(value);
  useEffect(() => {
    if (typed.trim() === value) return;
    const wait = setTimeout(() => onChange(typed.trim()), 300);
    return () => clearTimeout(wait);
  }, [typed, value, onChange]);
  return <Input id={id} allowClear value={typed} maxLength={200} placeholder="Mark, code or act" aria-label="Search the audit trail" onChange={(e) => setTyped(e.target.value)} />;
}

/** The trail by person, thing and time. */
export function AuditFilters({ projectId, filter, onChange }: { projectId: string; filter: AuditFilter; onChange: (filter: AuditFilter) => void }) {
  const people = useMemberships(projectId).data ?? [];
  const set = (more: Partial<AuditFilter>) => onChange({ ...filter, ...more, page: 1 });
  const known = people.map((p) => ({ value: p.userId, label: p.name }));
  // somebody who has left the team keeps their part of the trail
  const whose = [{ value: '', label: 'Everybody' }, ...known, ...(filter.who && people.length > 0 && !known.some((p) => p.value === filter.who) ? [{ value: filter.who, label: 'Somebody no longer on the team' }] : [])];
  return (
    <div className="mt-audit-filters mt-noprint" role="search" aria-label="Audit trail">
      <Narrow label="Search">{(id) => <Search key={isNarrowed(filter) ? 'narrowed' : 'all'} id={id} value={filter.search} onChange={(search) => set({ search })} />}</Narrow>
      <Narrow label="Who">{(id) => <Select id={id} value={filter.who} options={whose} onChange={(who) => set({ who })} />}</Narrow>
      <Narrow label="What">{(id) => <Select id={id} value={filter.what} options={things} onChange={(what) => set({ what })} />}</Narrow>
      <Narrow label="From">{(id) => <Input id={id} type="date" value={filter.from} max={filter.to || undefined} onChange={(e) => set({ from: e.target.value })} />}</Narrow>
      <Narrow label="To">{(id) => <Input id={id} type="date" value={filter.to} min={filter.from || undefined} onChange={(e) => set({ to: e.target.value })} />}</Narrow>
      {isNarrowed(filter) && <Button onClick={() => onChange(none)}>Show everything</Button>}
    </div>
  );
}
