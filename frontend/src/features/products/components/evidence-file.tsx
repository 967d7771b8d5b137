import { Alert, Button } from 'antd';
import { useRef } from 'react';
import type { ProductDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { formatNumber } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';
import { evidenceFileUrl, useStoreEvidenceFile } from '../api/products.js';
import type { Library } from '../api/products.js';

const fileSize = (bytes: number) => (bytes < 100_000 ? `${formatNumber(Math.max(1, bytes / 1000))} kB` : `${formatNumber(bytes / 1_000_000, 1)} MB`);

/** The report itself: kept with its digest, to be read beside the figures taken from it. */
export function EvidenceFile({ product, library, canEdit }: { product: ProductDto; library: Library; canEdit: boolean }) {
  const input = useRef<HTMLInputElement>(null);
  const store = useStoreEvidenceFile(library, product.id);
  const file = product.evidenceFile;
  const choose = (chosen: File | undefined) => {
    if (chosen) store.mutate(chosen);
    if (input.current) input.current.value = '';
  };
  return (
    <Panel title="Evidence file" sub={file ? undefined : canEdit ? 'Upload the report the figures come from: PDF, CSV or XLSX, up to 10 MB.' : 'No report has been uploaded.'}>
      {file && (
        <dl className="mt-facts">
          <dt>File</dt><dd><a href={evidenceFileUrl(library, product.id)} download={file.name}>{file.name}</a>, {fileSize(file.bytes)}</dd>
          <dt>SHA-256</dt><dd className="mt-digest" title={file.sha256}>{file.sha256.slice(0, 16)}…</dd>
        </dl>
      )}
      {store.error && <Alert type="error" role="alert" title="Not uploaded" description={store.error instanceof ApiError ? store.error.message : 'Something went wrong in this page; try again.'} />}
      {canEdit && (
        <div className="mt-actions">
          <input ref={input} type="file" accept=".pdf,.csv,.xlsx" hidden aria-hidden="true" tabIndex={-1} data-testid="evidence-file" onChange={(e) => choose(e.target.files?.[0])} />
          <Button loading={store.isPending} onClick={() => input.current?.click()}>{file ? 'Replace the report' : 'Upload the report'}</Button>
        </div>
      )}
    </Panel>
  );
}
