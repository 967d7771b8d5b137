import { Link } from 'react-router-dom';
import type { RevisionDto, SignatureDto } from '@mantlet/common';
import { formatDate, formatDateTime } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { StatusWord } from '../../../ui/status-word.js';
import { pdfUrl } from '../api/revisions.js';
import { shortDigest, stateWord } from '../revision-words.js';

const Signature = ({ signed }: { signed: SignatureDto | null }) =>
  signed ? <span title={formatDateTime(signed.at)}>{signed.name}<br /><span className="mt-sub">{formatDate(signed.at)}</span></span> : <span className="mt-sub">–</span>;

/** The register of revisions, newest first. */
export function Register({ revisions, projectId }: { revisions: readonly RevisionDto[]; projectId: string }) {
  return (
    <Panel flush title="Revisions">
      <ScheduleTable<RevisionDto>
        caption="Revisions" rows={revisions} rowKey={(r) => r.id} minWidth={1040} sticky={false}
        columns={[
          { title: 'Revision', term: 'revision', key: 'code', width: 90, render: (_, r) => <Link className="mt-strong" to={`/projects/${projectId}/schedule/${r.id}`}>{r.code}</Link> },
          { title: 'State', key: 'state', width: 124, render: (_, r) => { const { word, kind } = stateWord(r.state); return <StatusWord kind={kind}>{word}</StatusWord>; } },
          { title: 'Purpose', key: 'purpose', width: 200, render: (_, r) => r.purpose || <span className="mt-sub">–</span> },
          { title: 'Prepared', term: 'prepared', key: 'prepared', width: 130, render: (_, r) => <Signature signed={r.prepared} /> },
          { title: 'Checked', term: 'checked', key: 'checked', width: 130, render: (_, r) => <Signature signed={r.checked} /> },
          { title: 'Issued', term: 'issued', key: 'issued', width: 130, render: (_, r) => <Signature signed={r.issued} /> },
          { title: 'Members', key: 'members', numeric: true, width: 84, render: (_, r) => <Quantity value={r.members} what="Members" reason="frozen when prepared" /> },
          { title: 'Area m²', key: 'area', numeric: true, width: 96, render: (_, r) => <Quantity value={r.protectedAreaM2} decimals={1} unit="m²" bare what="Protected area" reason="frozen when prepared" /> },
          { title: 'PDF, SHA-256', term: 'digest', key: 'pdf', width: 130, render: (_, r) => r.pdfSha256 ? <><a href={pdfUrl(projectId, r.id, true)} aria-label={`Download the PDF of ${r.code}`}>Download</a><div className="mt-sub mt-small" title={`SHA-256 ${r.pdfSha256}`}>{shortDigest(r.pdfSha256)}</div></> : <span className="mt-sub">made on issue</span> },
        ]}
      />
    </Panel>
  );
}
