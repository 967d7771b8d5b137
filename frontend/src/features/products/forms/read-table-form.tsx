import { Alert, Button, Input, Select } from 'antd';
import { useId, useRef, useState } from 'react';
import { evidenceShapes, orientations, ratingPeriods, sentence } from '@mantlet/common';
import type { ProductKind, ReadTableDto, ThicknessTable } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { useReadTable } from '../api/products.js';
import type { Library } from '../api/products.js';
import { orientationNames, shapeNames, tableName, thicknessUnitOf } from '../product-words.js';
import { hasTable } from './product-form.js';

type Key = Pick<ThicknessTable, 'shape' | 'orientation' | 'periodMin'>;
interface ReadTableFormProps { library: Library; kind: ProductKind; tables: readonly ThicknessTable[]; onRead: (table: ThicknessTable) => void }

/** A remark tells what was left out; anything else keeps the table from being used as it stands. */
const isRemark = (code: string) => code === 'product.table-row-left-out';
export function verdictOf({ messages }: ReadTableDto): { faults: string[]; remarks: string[] } {
  return { faults: messages.filter((m) => !isRemark(m.code)).map(sentence), remarks: messages.filter((m) => isRemark(m.code)).map(sentence) };
}

function Choose<T extends string | number>({ label, value, options, onChange }: { label: string; value: T; options: { value: T; label: string }[]; onChange: (value: T) => void }) {
  const id = useId();
  return <div className="mt-field"><label className="mt-label" htmlFor={id}>{label}</label><Select<T> id={id} value={value} options={options} onChange={onChange} style={{ width: '100%' }} /></div>;
}

function Outcome({ error, faults, remarks, name }: { error: unknown; faults: string[]; remarks: string[]; name: string }) {
  if (error) {
    const issues = error instanceof ApiError ? error.issues : [];
    return (
      <Alert
        type="error" role="alert" title="Not read"
        description={issues.length > 0 ? <ul>{issues.map((i) => <li key={i.path + i.message}>{i.message}</li>)}</ul> : error instanceof ApiError ? error.message : 'Something went wrong in this page; try again.'}
      />
    );
  }
  return (
    <>
      {faults.length > 0 && <div role="alert"><p className="mt-field-error">{name} was read but not added:</p><ul className="mt-said">{faults.map((f) => <li key={f}>{f}</li>)}</ul></div>}
      {remarks.length > 0 && <ul className="mt-said mt-said-quiet" role="status">{remarks.map((r) => <li key={r}>{r}</li>)}</ul>}
    </>
  );
}

/** Takes one table at a time from a file or pasted cells: the first row holds temperatures, the first column section factors. */
export function ReadTableForm({ library, kind, tables, onRead }: ReadTableFormProps) {
  const own = thicknessUnitOf(kind);
  const [key, setKey] = useState<Key>({ shape: 'open', orientation: 'beam', periodMin: 60 });
  const [fileUnit, setFileUnit] = useState<'µm' | 'mm' | null>(null);
  const [pasted, setPasted] = useState('');
  const [outcome, setOutcome] = useState<{ faults: string[]; remarks: string[]; name: string } | null>(null);
  const read = useReadTable(library);
  const input = useRef<HTMLInputElement>(null);
  const pasteId = useId();
  const send = (file: File) => {
    setOutcome(null);
    read.mutate({ file, fields: { shape: key.shape, orientation: key.orientation, periodMin: String(key.periodMin), kind, fileUnit: fileUnit ?? own } }, {
      onSuccess: (result) => {
        const { faults, remarks } = verdictOf(result);
        setOutcome({ faults, remarks, name: tableName(result.table) });
        if (faults.length > 0) return;
        onRead(result.table);
        setPasted('');
      },
    });
    if (input.current) input.current.value = '';
  };
  const verb = hasTable(tables, key) ? 'replace' : 'add';
  return (
    <div className="mt-form" role="group" aria-label="Add a thickness table">
      <div className="mt-form-row">
        <Choose label="Section" value={key.shape} options={evidenceShapes.map((value) => ({ value, label: shapeNames[value] }))} onChange={(shape) => setKey({ ...key, shape })} />
        <Choose label="Member" value={key.orientation} options={orientations.map((value) => ({ value, label: orientationNames[value] }))} onChange={(orientation) => setKey({ ...key, orientation })} />
        <Choose label="Period" value={key.periodMin} options={ratingPeriods.map((value) => ({ value, label: `R ${value}` }))} onChange={(periodMin) => setKey({ ...key, periodMin })} />
        <Choose label="Thickness in" value={fileUnit ?? own} options={(['µm', 'mm'] as const).map((value) => ({ value, label: value }))} onChange={setFileUnit} />
      </div>
      <div className="mt-field">
        <label className="mt-label" htmlFor={pasteId}>Cells, pasted from the report or a sheet</label>
        <Input.TextArea id={pasteId} value={pasted} onChange={(e) => setPasted(e.target.value)} rows={3} className="mt-grow" style={{ minHeight: 'calc(3lh + 12px)' }} placeholder={'A/V\t350\t400\t450\n60\t420\t380\t340'} />
        <p className="mt-help">First row: design temperatures in °C. First column: section factors in 1/m. An empty cell or a dash is outside the assessment.</p>
      </div>
      <div className="mt-file-row">
        <Button disabled={!pasted.trim()} loading={read.isPending} onClick={() => send(new File([pasted], 'pasted cells.csv', { type: 'text/csv' }))}>{`Read and ${verb}`}</Button>
        <span className="mt-sub">or</span>
        <input ref={input} type="file" accept=".csv,.xlsx" hidden aria-hidden="true" tabIndex={-1} data-testid="table-file" onChange={(e) => { const [file] = e.target.files ?? []; if (file) send(file); }} />
        <Button loading={read.isPending} onClick={() => input.current?.click()}>{`Choose a CSV or XLSX to ${verb}`}</Button>
      </div>
      <Outcome error={read.error} faults={outcome?.faults ?? []} remarks={outcome?.remarks ?? []} name={outcome?.name ?? ''} />
    </div>
  );
}
