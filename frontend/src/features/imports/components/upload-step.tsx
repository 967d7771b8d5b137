import { Alert, Spin, Upload } from 'antd';
import { useState } from 'react';
import { ApiError } from '../../../lib/api-client.js';
import { Panel } from '../../../ui/panel.js';
import { useUpload } from '../api/imports.js';
import { fileProblem } from '../import-words.js';

/** Chooses the file. Nothing is written to the project by reading it. */
export function UploadStep({ projectId, onRead }: { projectId: string; onRead: (importId: string) => void }) {
  const upload = useUpload(projectId);
  const [problem, setProblem] = useState<string | null>(null);
  const take = (file: File) => {
    const wrong = fileProblem(file);
    setProblem(wrong);
    upload.reset();
    if (!wrong) upload.mutate(file, { onSuccess: ({ id }) => onRead(id) });
    return false;
  };
  return (
    <Panel title="Choose the steel schedule" sub="CSV or XLSX, to 10 MB, one row a mark. Columns are found by their headers; you check them next. Nothing is written before you confirm.">
      {problem && <p className="mt-field-error" role="alert">{problem}</p>}
      {upload.error && <Alert type="error" role="alert" title="The file was not read" description={upload.error instanceof ApiError ? upload.error.message : 'Something went wrong in this page. Choose the file again.'} />}
      <Upload.Dragger accept=".csv,.txt,.xlsx" multiple={false} showUploadList={false} beforeUpload={take} disabled={upload.isPending} className="mt-drop">
        {upload.isPending
          ? <p role="status"><Spin size="small" /> Reading {upload.variables.name}…</p>
          : <><p className="mt-strong">Choose a file</p><p className="mt-sub">or drop it here</p></>}
      </Upload.Dragger>
      <details className="mt-details">
        <summary>What the file may hold</summary>
        <p className="mt-sub">Mark, level, zone, type, section, steel grade, length, number off, exposure, protection form and note. A structural engineer may also bring critical temperatures or utilisations with their reference. Section names are understood in their usual spellings, lengths in mm, m, cm, feet and inches.</p>
      </details>
    </Panel>
  );
}
