import type { AuditEntryDto } from '@mantlet/common';
import { wayNames } from '@mantlet/common';
import { formatDateTime } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';

/** What a stored value looked like, in a line: objects by their parts. */
export function valueInWords(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'nothing';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (Array.isArray(value)) return value.length === 0 ? 'nothing' : value.map(valueInWords).join(', ');
  if (typeof value === 'object') return Object.entries(value).filter(([, v]) => v !== null && v !== '').map(([k, v]) => `${fieldInWords(k)} ${valueInWords(v)}`).join('; ');
  return String(value);
}

const unitEnding = /(Mm|M2|Kn|Knm|C)$/;
const units: Record<string, string> = { Mm: 'mm', M2: 'm²', Kn: 'kN', Knm: 'kNm', C: '°C' };
/** lengthMm → length, mm */
export function fieldInWords(field: string): string {
  const unit = unitEnding.exec(field)?.[1];
  const stem = unit ? field.slice(0, -unit.length) : field;
  const words = stem.replace(/\.(\w)/g, ' $1').replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();
  return unit ? `${words}, ${units[unit] ?? unit}` : words;
}

type Change = AuditEntryDto['changes'][number];
const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);

/** A change of a whole record as changes of the parts that differ: one line a part. */
export function partsOfChange(change: Change): Change[] {
  const { old, new: next, field } = change;
  if (!isRecord(old) && !isRecord(next)) return [change];
  const [before, after] = [isRecord(old) ? old : {}, isRecord(next) ? next : {}];
  return [...new Set([...Object.keys(before), ...Object.keys(after)])]
    .filter((part) => JSON.stringify(before[part] ?? null) !== JSON.stringify(after[part] ?? null))
    .flatMap((part) => partsOfChange({ field: field === 'basis' ? part : `${field}.${part}`, old: before[part] ?? null, new: after[part] ?? null }));
}

function ChangeLine({ change: { field, old, new: next } }: { change: Change }) {
  const said = (value: unknown) => (field === 'way' && typeof value === 'string' && value in wayNames ? wayNames[value as keyof typeof wayNames] : valueInWords(value));
  return <span>{field === 'way' ? 'critical temperature' : fieldInWords(field)}: <s className="mt-sub">{said(old)}</s> → {said(next)}</span>;
}

const shownParts = 6;
function Changes({ changes }: { changes: readonly Change[] }) {
  const parts = changes.flatMap(partsOfChange);
  const rest = parts.slice(shownParts);
  return (
    <>
      {parts.slice(0, shownParts).map((part) => <ChangeLine key={part.field} change={part} />)}
      {rest.length > 0 && <details><summary className="mt-sub">{rest.length} more</summary>{rest.map((part) => <div key={part.field}><ChangeLine change={part} /></div>)}</details>}
    </>
  );
}

export function MemberHistory({ history }: { history: readonly AuditEntryDto[] }) {
  return (
    <Panel title="History">
      {history.length === 0 ? <p className="mt-sub">Nothing is recorded yet.</p> : (
        <ul className="mt-history">
          {history.map((entry) => (
            <li key={entry.id}>
              <span><span className="mt-strong">{entry.userName}</span>, {entry.action} <span className="mt-sub">{formatDateTime(entry.at)}</span></span>
              <Changes changes={entry.changes} />
              {entry.why && <span className="mt-sub">Why: {entry.why}</span>}
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}
