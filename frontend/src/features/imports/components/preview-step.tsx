import { Alert, Button, Checkbox, Pagination, Radio } from 'antd';
import { useState } from 'react';
import type { ReactNode } from 'react';
import { importFieldNames } from '@mantlet/common';
import type { ImportPreviewDto, ImportResultDto, ImportRowDto, ImportRowState } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { count, formatNumber } from '../../../lib/format.js';
import { FailedSave } from '../../../ui/form/failed-save.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { QueryState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useConfirm, usePreview } from '../api/imports.js';
import { rowInWords, rowStates, stateNames } from '../import-words.js';

const kinds = { new: 'settled', changed: 'settled', unchanged: 'neutral', wrong: 'attention' } as const;

function What({ row }: { row: ImportRowDto }) {
  return (
    <div>
      {row.problems.map((p) => <p key={p.column + p.sentence}><span className="mt-strong">{p.column}</span>: {p.sentence}</p>)}
      {row.changes.map((c) => <p key={c.field}>{importFieldNames[c.field]}: <s className="mt-sub">{c.old || 'nothing'}</s> → {c.new || 'nothing'}</p>)}
      {row.problems.length === 0 && row.changes.length === 0 && <p className="mt-sub">{rowInWords(row)}</p>}
    </div>
  );
}

const columns: ScheduleColumn<ImportRowDto>[] = [
  { title: 'Row', dataIndex: 'row', numeric: true, width: 70 },
  { title: 'Mark', dataIndex: 'mark', width: 140, render: (mark: string) => <span className="mt-strong">{mark || '–'}</span> },
  { title: 'Outcome', dataIndex: 'state', width: 130, render: (state: ImportRowState) => <StatusWord kind={kinds[state]}>{stateNames[state]}</StatusWord> },
  { title: 'What is wrong, what changes', foldLabel: '', key: 'what', render: (_, row) => <What row={row} /> },
];

function Counts({ preview, state, onChange }: { preview: ImportPreviewDto; state: ImportRowState | undefined; onChange: (next: ImportRowState | undefined) => void }) {
  const all = rowStates.reduce((sum, s) => sum + preview.counts[s], 0);
  const options = [{ value: 'all', label: `All ${formatNumber(all)}` }, ...rowStates.map((s) => ({ value: s, label: `${stateNames[s]} ${formatNumber(preview.counts[s])}`, disabled: preview.counts[s] === 0 && s !== state }))];
  return <Radio.Group aria-label="Rows shown" optionType="button" value={state ?? 'all'} options={options} onChange={(e) => onChange(e.target.value === 'all' ? undefined : (e.target.value as ImportRowState))} className="mt-counts" />;
}

interface PreviewStepProps { projectId: string; importId: string; onDone: (result: ImportResultDto) => void; onBack: () => void; onAbandon: ReactNode }

/** Every row before anything is written: what is wrong in words, and what would change. */
export function PreviewStep({ projectId, importId, onDone, onBack, onAbandon }: PreviewStepProps) {
  const [state, setState] = useState<ImportRowState | undefined>();
  const [page, setPage] = useState(1);
  const [leaveOut, setLeaveOut] = useState(false);
  const preview = usePreview(projectId, importId, { state, page, pageSize: 100 });
  const confirm = useConfirm(projectId, importId);
  const show = (next: ImportRowState | undefined) => { setState(next); setPage(1); };
  // not by mutate's own callbacks: this step is gone once the import is confirmed
  const send = () => confirm.mutateAsync({ leaveOutWrongRows: leaveOut }).then(onDone, (error: unknown) => {
    // the outcome would differ from what was shown: show what it would be now
    if (error instanceof ApiError && error.status === 409) void preview.refetch();
  });
  return (
    <QueryState query={preview} what="the rows">
      {(data) => {
        const { counts } = data;
        const right = counts.new + counts.changed;
        const blocked = right === 0 ? 'There is nothing to write: no row is new or changed.' : counts.wrong > 0 && !leaveOut ? `${count(counts.wrong, 'row')} ${counts.wrong === 1 ? 'is' : 'are'} wrong. Correct the file and choose it again, or leave ${counts.wrong === 1 ? 'it' : 'them'} out.` : null;
        return (
          <>
            {data.notes.length > 0 && <Alert type="info" title="Not read from the file" description={<ul className="mt-notes">{data.notes.map((note) => <li key={note}>{note}</li>)}</ul>} />}
            <Panel flush label="Rows of the file">
              <div className="mt-choice"><Counts preview={data} state={state} onChange={show} /></div>
              <ScheduleTable<ImportRowDto> caption="Rows of the file" rows={data.rows} rowKey={(r) => String(r.row)} columns={columns} loading={preview.isPlaceholderData} empty="No row is like this." />
              {data.total > data.pageSize && <div className="mt-list-foot"><span className="mt-sub">{count(data.total, 'row')}</span><Pagination size="small" current={data.page} pageSize={data.pageSize} total={data.total} showSizeChanger={false} onChange={setPage} /></div>}
            </Panel>
            <FailedSave error={confirm.error} />
            <div className="mt-form-foot">
              {counts.wrong > 0 && right > 0 && <Checkbox checked={leaveOut} onChange={(e) => setLeaveOut(e.target.checked)}>Leave out {counts.wrong === 1 ? 'the wrong row' : `the ${count(counts.wrong, 'wrong row')}`}</Checkbox>}
              <Button type="primary" loading={confirm.isPending} disabled={blocked !== null} onClick={() => { void send(); }}>{confirm.isPending ? 'Writing and assessing' : `Write ${count(right, 'member')}`}</Button>
              <Button onClick={onBack}>Back to the columns</Button>
              {onAbandon}
              {blocked && <span className="mt-sub" role="status">{blocked}</span>}
            </div>
          </>
        );
      }}
    </QueryState>
  );
}
