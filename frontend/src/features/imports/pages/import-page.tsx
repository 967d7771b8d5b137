import { App, Button } from 'antd';
import { useState } from 'react';
import type { ReactNode } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { ImportDto, ImportResultDto } from '@mantlet/common';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { QueryState } from '../../../ui/states.js';
import { LinkButton } from '../../../ui/link-button.js';
import { RequireRight, useCurrentProject } from '../../projects/project-context.js';
import { firstPreview, useAbandon, useImport, usePreview } from '../api/imports.js';
import { ColumnsStep } from '../components/columns-step.js';
import { PreviewStep } from '../components/preview-step.js';
import { StepsLine } from '../components/steps-line.js';
import { UploadStep } from '../components/upload-step.js';
import { doneHeading, previewHeading, stepOf } from '../import-words.js';
import type { Step } from '../import-words.js';
import '../imports.css';

function Frame({ step, heading, sub, children }: { step: Step; heading: string; sub?: string; children: ReactNode }) {
  const project = useCurrentProject();
  return <Page title="Import members" projectName={project.name} heading={heading} sub={sub}><StepsLine now={step} />{children}</Page>;
}

function Abandon({ projectId, importId, onGone }: { projectId: string; importId: string; onGone: () => void }) {
  const { modal } = App.useApp();
  const abandon = useAbandon(projectId, importId);
  const ask = () => modal.confirm({ title: 'Give up this import?', icon: null, content: 'The file is dropped. Nothing of it was written to the project.', okText: 'Give it up', cancelText: 'Go on', onOk: () => abandon.mutateAsync().then(onGone, onGone) });
  return <Button type="link" onClick={ask}>Give up this import</Button>;
}

function Done({ projectId, result, again }: { projectId: string; result: ImportResultDto | null; again: () => void }) {
  return (
    <Frame step="done" heading={doneHeading(result)} sub="The members are in the schedule and assessed. What is open on them stands in the list.">
      <Panel title="What next">
        <div className="mt-actions">
          <LinkButton to={`/projects/${projectId}/members`} type="primary">See the members</LinkButton>
          <LinkButton to={`/projects/${projectId}/members?open=true`}>See what is open</LinkButton>
          <Button onClick={again}>Import another file</Button>
        </div>
      </Panel>
    </Frame>
  );
}

interface RunningProps { data: ImportDto; result: ImportResultDto | null; setResult: (r: ImportResultDto) => void; leave: () => void; read: (id: string) => void }
function Running({ data, result, setResult, leave, read }: RunningProps) {
  const project = useCurrentProject();
  const [back, setBack] = useState(false);
  const step = stepOf(data.state, back);
  const abandon = <Abandon projectId={project.id} importId={data.id} onGone={leave} />;
  switch (step) {
    case 'upload': return <Frame step="upload" heading="That import was given up" sub="Choose a file to begin another."><UploadStep projectId={project.id} onRead={read} /></Frame>;
    case 'columns':
      return (
        <Frame step="columns" heading={`Check what the columns of ${data.fileName} hold`} sub="This import is kept: you can leave this page and come back to its address.">
          <ColumnsStep projectId={project.id} data={data} onChecked={() => setBack(false)} onAbandon={abandon} />
        </Frame>
      );
    case 'preview': return <Preview data={data} onDone={setResult} onBack={() => setBack(true)} onAbandon={abandon} />;
    case 'done': return <Done projectId={project.id} result={result} again={leave} />;
  }
}

function Preview({ data, onDone, onBack, onAbandon }: { data: ImportDto; onDone: (r: ImportResultDto) => void; onBack: () => void; onAbandon: ReactNode }) {
  const project = useCurrentProject();
  const first = usePreview(project.id, data.id, firstPreview);
  const heading = first.data ? previewHeading(first.data) : 'Check the rows';
  return (
    <Frame step="preview" heading={heading} sub={`${data.fileName}. Nothing is written yet. This import is kept: you can leave this page and come back to its address.`}>
      <PreviewStep projectId={project.id} importId={data.id} onDone={onDone} onBack={onBack} onAbandon={onAbandon} />
    </Frame>
  );
}

function OneImport({ importId, leave, read }: { importId: string; leave: () => void; read: (id: string) => void }) {
  const project = useCurrentProject();
  const query = useImport(project.id, importId);
  const [result, setResult] = useState<ImportResultDto | null>(null);
  return <QueryState query={query} what="the import">{(data) => <Running data={data} result={result} setResult={setResult} leave={leave} read={read} />}</QueryState>;
}

/** The import stands in the address, so that it can be left and taken up again, by link or after a lost connection. */
function Import() {
  const project = useCurrentProject();
  const [params, setParams] = useSearchParams();
  const importId = params.get('import');
  const read = (id: string) => setParams({ import: id });
  if (importId) return <OneImport key={importId} importId={importId} leave={() => setParams({})} read={read} />;
  return <Frame step="upload" heading="Bring in the steel schedule" sub="Four short steps; the project changes only at the last."><UploadStep projectId={project.id} onRead={read} /></Frame>;
}

export default function ImportPage() {
  return <RequireRight right="import-members"><Import /></RequireRight>;
}
