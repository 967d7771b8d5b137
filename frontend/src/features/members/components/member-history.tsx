import type { AuditEntryDto } from '@mantlet/common';
import { formatDateTime } from '../../../lib/format.js';
import { fieldName, isNothing, partsOfChange, valueInWords } from '../../../lib/record-words.js';
import type { Change } from '../../../lib/record-words.js';
import { Panel } from '../../../ui/panel.js';

/** What was there before is struck out; what was not there is not spelled out as nothing. */
function ChangeLine({ change: { field, old, new: next } }: { change: Change }) {
  return <span>{fieldName(field)}: {!isNothing(old) && <><s className="mt-sub">{valueInWords(field, old)}</s> → </>}{valueInWords(field, next)}</span>;
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
