import { Button, Checkbox, Input, Select } from 'antd';
import { useEffect, useId, useState } from 'react';
import type { ReactNode } from 'react';
import { memberTypeNames, memberTypes, verdictKinds } from '@mantlet/common';
import { count } from '../../../lib/format.js';
import { useLevels, useZones } from '../../zones/api/zones.js';
import { changed, cleared, isNarrowed } from '../member-filter.js';
import type { MemberFilter } from '../member-filter.js';
import { verdictNames } from '../member-words.js';

interface MemberFiltersProps { projectId: string; filter: MemberFilter; onChange: (next: MemberFilter) => void }

function Labelled({ label, children }: { label: string; children: (id: string) => ReactNode }) {
  const id = useId();
  return <div className="mt-filter"><label htmlFor={id}>{label}</label>{children(id)}</div>;
}

interface ManyProps<T extends string> { label: string; value: readonly T[] | undefined; options: { value: T; label: string }[]; onChange: (next: T[]) => void }
function Many<T extends string>({ label, value, options, onChange }: ManyProps<T>) {
  return (
    <Labelled label={label}>
      {(id) => (
        <Select<T[]>
          id={id} mode="multiple" allowClear value={[...(value ?? [])]} options={options} onChange={onChange} placeholder="Any" maxTagCount="responsive"
          showSearch={{ optionFilterProp: 'label' }} style={{ width: '100%' }}
        />
      )}
    </Labelled>
  );
}

/** Asks for the text only after a pause in typing; follows the address when that changes elsewhere. */
function Search({ value, onChange }: { value: string; onChange: (text: string) => void }) {
  const [text, setText] = useState(value);
  const [last, setLast] = useState(value);
  if (value !== last) { setLast(value); setText(value); }
  useEffect(() => {
    if (text.trim() === value) return;
    const timer = setTimeout(() => onChange(text.trim()), 300);
    return () => clearTimeout(timer);
  }, [text, value, onChange]);
  return (
    <Labelled label="Search">
      {(id) => <Input id={id} type="search" allowClear value={text} onChange={(e) => setText(e.target.value)} placeholder="Mark, section or note" maxLength={100} />}
    </Labelled>
  );
}

/** Everything the list can be narrowed by. What is chosen stands in the address, so that a list can be kept and sent. */
export function MemberFilters({ projectId, filter, onChange }: MemberFiltersProps) {
  const zones = useZones(projectId).data ?? [];
  const levels = useLevels(projectId).data ?? [];
  const set = (change: MemberFilter) => onChange(changed(filter, change));
  return (
    <div role="search" className="mt-filters mt-noprint" aria-label="Narrow the list of members">
      <Search value={filter.search ?? ''} onChange={(search) => set({ search })} />
      <Many label="Zone" value={filter.zoneIds} onChange={(zoneIds) => set({ zoneIds })} options={zones.map((z) => ({ value: z.id, label: `${z.code} ${z.name}` }))} />
      <Many label="Level" value={filter.levelIds} onChange={(levelIds) => set({ levelIds })} options={levels.map((l) => ({ value: l.id, label: `${l.code} ${l.name}` }))} />
      <Many label="Type" value={filter.memberTypes} onChange={(memberTypes_) => set({ memberTypes: memberTypes_ })} options={memberTypes.map((value) => ({ value, label: memberTypeNames[value] }))} />
      <Many label="Verdict" value={filter.verdicts} onChange={(verdicts) => set({ verdicts })} options={verdictKinds.map((value) => ({ value, label: verdictNames[value] }))} />
      <div className="mt-filter-last">
        <Checkbox checked={filter.open === 'true'} onChange={(e) => set({ open: e.target.checked ? 'true' : undefined })}>Open only</Checkbox>
        {filter.memberIds && <Button size="small" onClick={() => set({ memberIds: undefined })}>{count(filter.memberIds.length, 'chosen member')}: show all</Button>}
        {isNarrowed(filter) && <Button size="small" type="link" onClick={() => onChange(cleared(filter))}>Clear all</Button>}
      </div>
    </div>
  );
}
