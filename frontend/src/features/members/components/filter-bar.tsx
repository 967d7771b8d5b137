import { Button, Input, InputNumber, Radio, Select } from 'antd';
import { useEffect, useEffectEvent, useId, useRef, useState } from 'react';
import type { MemberValuesDto } from '@mantlet/common';
import { count } from '../../../lib/format.js';
import { chipWords, chosenFields, filterFields, isSet, rangeKeys, without } from '../filter-fields.js';
import type { FilterField } from '../filter-fields.js';
import { cleared, isNarrowed } from '../member-filter.js';
import type { MemberFilter } from '../member-filter.js';
import { verdictNames } from '../member-words.js';

/** Asks for the text only after a pause in typing; follows the address when that changes elsewhere. */
function Search({ value, onChange }: { value: string; onChange: (text: string) => void }) {
  const id = useId();
  const [text, setText] = useState(value);
  const [last, setLast] = useState(value);
  if (value !== last) { setLast(value); setText(value); }
  const send = useEffectEvent(onChange);
  useEffect(() => {
    if (text.trim() === value) return;
    const timer = setTimeout(() => send(text.trim()), 300);
    return () => clearTimeout(timer);
  }, [text, value]);
  return (
    <div className="mt-filter mt-filter-search">
      <label htmlFor={id}>Search</label>
      <Input id={id} type="search" allowClear value={text} onChange={(e) => setText(e.target.value)} placeholder="Mark, section or note" maxLength={100} />
    </div>
  );
}

interface EditorProps { field: FilterField; filter: MemberFilter; values: MemberValuesDto | undefined; onChange: (next: MemberFilter) => void }

function Limit({ label, unit, value, onChange }: { label: string; unit: string; value: number | undefined; onChange: (next: number | undefined) => void }) {
  const id = useId();
  return (
    <div className="mt-filter">
      <label htmlFor={id}>{label}</label>
      <InputNumber id={id} value={value ?? null} onChange={(next) => onChange(next ?? undefined)} min={-1e6} max={1e6} {...(unit ? { suffix: unit } : {})} style={{ width: 140 }} />
    </div>
  );
}

function Editor({ field, filter, values, onChange }: EditorProps) {
  const id = useId();
  if (field.kind === 'flag') {
    return (
      <Radio.Group aria-label={field.label} className="mt-radios" value={filter[field.key]} onChange={(e) => onChange({ ...filter, [field.key]: e.target.value as 'true' | 'false' })}
        options={[{ value: 'true', label: field.yes }, { value: 'false', label: field.no }]} />
    );
  }
  if (field.kind === 'range') {
    const { above, upTo } = rangeKeys(field.key);
    return (
      <>
        <Limit label={`${field.label} above`} unit={field.unit} value={filter[above]} onChange={(v) => onChange({ ...filter, [above]: v })} />
        <Limit label={`${field.label} up to`} unit={field.unit} value={filter[upTo]} onChange={(v) => onChange({ ...filter, [upTo]: v })} />
      </>
    );
  }
  const options = (values?.[field.key] ?? []).map((v) => ({ value: v.value, label: `${field.key === 'verdicts' ? verdictNames[v.value as keyof typeof verdictNames] : v.label} (${v.members})` }));
  const chosen = ((filter[field.key] ?? []) as (string | number)[]).map(String);
  const set = (next: string[]) => onChange({ ...filter, [field.key]: field.key === 'periods' ? next.map(Number) : next });
  return (
    <div className="mt-filter mt-filter-wide">
      <label htmlFor={id}>{field.label}</label>
      <Select<string[]> id={id} mode="multiple" allowClear value={chosen} options={options} onChange={set} placeholder="Any" showSearch={{ optionFilterProp: 'label' }} style={{ width: '100%' }} />
    </div>
  );
}

interface FilterBarProps { filter: MemberFilter; values: MemberValuesDto | undefined; found: string; onChange: (next: MemberFilter, how?: 'typing' | undefined) => void }

/** What narrows the list, in words. Choosing a filter opens it below; everything stands in the address. */
export function FilterBar({ filter, values, found, onChange }: FilterBarProps) {
  const addId = useId();
  const [open, setOpen] = useState<FilterField | null>(null);
  const editor = useRef<HTMLDivElement>(null);
  const bar = useRef<HTMLDivElement>(null);
  useEffect(() => { if (open) editor.current?.querySelector<HTMLElement>('input')?.focus(); }, [open]);
  const searchFor = (text: string) => onChange({ ...filter, search: text }, 'typing');
  const close = () => { setOpen(null); bar.current?.querySelector<HTMLElement>('input[role=combobox]')?.focus(); };
  const drop = (field: FilterField) => { if (open?.key === field.key) setOpen(null); onChange(without(filter, field)); bar.current?.querySelector<HTMLElement>('input[role=combobox]')?.focus(); };
  return (
    <div role="search" className="mt-filters mt-noprint" aria-label="Narrow the list of members">
      <div className="mt-filter-row" ref={bar}>
        <Search value={filter.search ?? ''} onChange={searchFor} />
        <div className="mt-filter mt-filter-add">
          <label htmlFor={addId}>Add a filter</label>
          <Select id={addId} value={null} placeholder="By level, zone, result …" options={filterFields.map((f) => ({ value: f.key, label: f.label }))} showSearch={{ optionFilterProp: 'label' }}
            onChange={(key: string | null) => setOpen(filterFields.find((f) => f.key === key) ?? null)} style={{ width: '100%' }} />
        </div>
        <ul className="mt-chips" aria-label="Filters">
          {filter.memberIds && (
            <li className="mt-chip"><span className="mt-chip-words">{count(filter.memberIds.length, 'member')} picked out</span>
              <button type="button" aria-label="Take out the filter by members picked out" onClick={() => onChange({ ...filter, memberIds: undefined })}>×</button></li>
          )}
          {chosenFields(filter).map((field) => {
            const words = chipWords(field, filter, values);
            return (
              <li key={field.key} className="mt-chip">
                <button type="button" className="mt-chip-words" aria-expanded={open?.key === field.key} onClick={() => setOpen(open?.key === field.key ? null : field)}>{words}</button>
                <button type="button" aria-label={`Take out ${words}`} onClick={() => drop(field)}>×</button>
              </li>
            );
          })}
          {isNarrowed(filter) && <li><Button size="small" type="link" onClick={() => { setOpen(null); onChange(cleared(filter)); }}>Clear all</Button></li>}
        </ul>
        <span className="mt-found" role="status">{found}</span>
      </div>
      {open && (
        <div className="mt-filter-editor" ref={editor} role="group" aria-label={`Filter by ${open.label}`} onKeyDown={(e) => { if (e.key === 'Escape' && !e.defaultPrevented) close(); }}>
          <Editor field={open} filter={filter} values={values} onChange={(next) => onChange(next, isSet(filter, open) ? 'typing' : undefined)} />
          <Button onClick={close}>Done</Button>
        </div>
      )}
    </div>
  );
}
