import type { RevisionDto, SignatureDto } from '@mantlet/common';
import { formatDateTime } from '../../../lib/format.js';
import type { TermName } from '../../../lib/terms.js';
import { Term } from '../../../ui/term.js';

interface Step { name: string; term: TermName; signed: SignatureDto | null; next: string }

/** Draft, prepared, checked, issued: who signed each and when, and whose turn is next. */
export function LifeLine({ revision }: { revision: RevisionDto }) {
  const steps: Step[] = [
    { name: 'Prepared', term: 'prepared', signed: revision.prepared, next: 'By a specifier, when nothing blocks it' },
    { name: 'Checked', term: 'checked', signed: revision.checked, next: 'By another specifier' },
    { name: 'Issued', term: 'issued', signed: revision.issued, next: 'By a specifier; cannot be changed afterwards' },
  ];
  const current = steps.findIndex((s) => !s.signed);
  return (
    <ol className="mt-life" aria-label={`The life of ${revision.code}`}>
      <li className="mt-life-done"><span className="mt-strong"><Term name="draft">Draft</Term></span><span className="mt-sub">{formatDateTime(revision.createdAt)}</span></li>
      {steps.map((step, i) => (
        <li key={step.name} className={step.signed ? 'mt-life-done' : i === current ? 'mt-life-next' : ''} aria-current={i === current ? 'step' : undefined}>
          <span className="mt-strong"><Term name={step.term}>{step.name}</Term></span>
          {step.signed ? <><span>{step.signed.name}</span><span className="mt-sub">{formatDateTime(step.signed.at)}</span></> : <span className="mt-sub">{i === current ? `Next: ${step.next.charAt(0).toLowerCase()}${step.next.slice(1)}` : step.next}</span>}
        </li>
      ))}
    </ol>
  );
}
