import { Alert, Button } from 'antd';
import { useState } from 'react';
import type { RevisionDto, RevisionSummaryDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { formatDate, formatNumber } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { StatusWord } from '../../../ui/status-word.js';
import { Term } from '../../../ui/term.js';
import { pdfUrl, useVerify } from '../api/revisions.js';
import { isOpen, shortDigest, verificationWords } from '../revision-words.js';

/** Digests of what is stored, and their verification on demand. */
export function Digests({ revision, projectId }: { revision: RevisionDto; projectId: string }) {
  const verify = useVerify(projectId, revision.id);
  const found = verify.data && verificationWords(verify.data);
  return (
    <Panel title={<Term name="digest">Digests</Term>} sub="Verify reads the stored files again and compares.">
      <dl className="mt-facts">
        <dt>Frozen schedule</dt><dd title={revision.snapshotSha256 ?? undefined}>{shortDigest(revision.snapshotSha256)}</dd>
        <dt>PDF</dt><dd title={revision.pdfSha256 ?? undefined}>{shortDigest(revision.pdfSha256)}{revision.pdfBytes !== null && <span className="mt-sub">, {formatNumber(revision.pdfBytes / 1000)} kB</span>}</dd>
      </dl>
      <div className="mt-actions"><Button loading={verify.isPending} onClick={() => verify.mutate()}>Verify</Button></div>
      <div role="status">{found && <StatusWord kind={found.kind}>{found.text}</StatusWord>}</div>
      {verify.error && <Alert type="error" role="alert" title="Not verified" description={verify.error instanceof ApiError ? verify.error.message : 'Try again.'} />}
    </Panel>
  );
}

/** The PDF in a frame, asked for by hand: a draft is rendered anew each time. */
export function PdfPreview({ revision, projectId }: { revision: RevisionDto; projectId: string }) {
  const [shown, setShown] = useState(false);
  const draft = isOpen(revision.state);
  return (
    <Panel
      title="PDF" sub={draft ? 'A preview with a watermark, made as the schedule stands now. The PDF that counts is made once, on issue.' : 'Made once on issue and kept; this is the very file.'}
      actions={<>
        <Button onClick={() => setShown(!shown)} aria-expanded={shown}>{shown ? 'Hide the preview' : 'Show it here'}</Button>
        <Button href={pdfUrl(projectId, revision.id)} target="_blank" rel="noopener">Open in a tab</Button>
        <Button href={pdfUrl(projectId, revision.id, true)} download>{draft ? 'Download the preview' : 'Download'}</Button>
      </>}
    >
      {shown && (
        <>
          <iframe className="mt-pdf" title={`PDF of ${revision.code}`} src={pdfUrl(projectId, revision.id)} />
          <p className="mt-sub">Nothing to see? Some browsers, on phones above all, show no PDF within a page: open it in a tab.</p>
        </>
      )}
    </Panel>
  );
}

/** What the frozen snapshot holds. */
export function Summary({ summary }: { summary: RevisionSummaryDto }) {
  return (
    <>
      <Panel title="What it holds">
        <dl className="mt-facts">
          <dt>Members</dt><dd><Quantity value={summary.members} /> marks, <Quantity value={summary.pieces} /> pieces</dd>
          <dt>May stay bare</dt><dd><Quantity value={summary.bareMembers} /></dd>
          <dt>Protected area</dt><dd><Quantity value={summary.protectedAreaM2} decimals={1} unit="m²" /></dd>
          <dt>Levels and zones</dt><dd>{summary.levels} and {summary.zones}</dd>
        </dl>
      </Panel>
      <Panel flush title="Systems">
        <ScheduleTable
          caption="Systems of the revision" rows={summary.products} rowKey={(p) => p.id} sticky={false}
          columns={[
            { title: 'Product', key: 'name', render: (_, p) => <div>{p.name}{p.invented && <div className="mt-sub">Invented for demonstration</div>}</div> },
            { title: 'Evidence', key: 'evidence', render: (_, p) => <div>{p.evidenceReference}, edition {p.evidenceEdition}<div className="mt-sub">valid until {formatDate(p.evidenceExpiresOn)}</div></div> },
            { title: 'Members', key: 'members', numeric: true, render: (_, p) => <Quantity value={p.members} /> },
            { title: 'Area m²', key: 'area', numeric: true, render: (_, p) => <Quantity value={p.areaM2} decimals={1} unit="m²" bare what="Area" /> },
            { title: 'To buy', key: 'purchase', numeric: true, render: (_, p) => p.purchase ?? <span className="mt-sub" title="The product’s supply data lack something">not determined</span> },
          ]}
        />
      </Panel>
      {summary.warnings.length > 0 && (
        <Panel title="Worth a look when it was prepared"><ul className="mt-missing-list">{summary.warnings.map((w) => <li key={`${w.code} ${w.title}`}>{w.title}{w.zoneLabel && <span className="mt-sub"> {w.zoneLabel}</span>}</li>)}</ul></Panel>
      )}
    </>
  );
}
