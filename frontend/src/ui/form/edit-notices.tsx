import { App, Button } from 'antd';
import type { ReactNode } from 'react';
import { ApiError } from '../../lib/api-client.js';
import { formatDateTime } from '../../lib/format.js';
import { fieldName, valueInWords } from '../../lib/record-words.js';
import { differencesOf } from '../../lib/three-way.js';
import { ComparisonTable } from './comparison-table.js';
import { FailedSave } from './failed-save.js';
import type { EditForm } from './use-edit-form.js';

function Line({ children, actions }: { children: ReactNode; actions: ReactNode }) {
  return <div className="mt-form-line" role="status"><span>{children}</span><span className="mt-actions">{actions}</span></div>;
}

/** What is typed, as text: a line a field, in the words of the form. */
export function typedAsText({ words, typed }: Pick<EditForm, 'words' | 'typed'>): string {
  return differencesOf({}, typed(), {}).map(({ path, mine }) => `${words.label?.(path) ?? fieldName(path)}: ${words.value?.(path, mine) ?? valueInWords(path, mine, Infinity)}`).join('\n');
}

function CopyTyped({ edit }: { edit: EditForm }) {
  const { message } = App.useApp();
  const copy = () => {
    navigator.clipboard.writeText(typedAsText(edit)).then(() => { void message.success('Copied.'); }, () => { void message.error('This browser does not let the page copy. Select the text in the fields instead.'); });
  };
  return <Button size="small" onClick={copy}>Copy what I typed</Button>;
}

/** What may go no further as it stands: the thing was deleted, or is no longer this person's to change. */
const stuck = (edit: EditForm): boolean => edit.error instanceof ApiError && (edit.gone || edit.error.isRefused || edit.error.status === 413);

/** Above a form: what was left here earlier, what others did meanwhile, and what became of the save. */
export function EditNotices({ edit }: { edit: EditForm }) {
  const { comparison, offered, movedOn, error } = edit;
  if (comparison) return <ComparisonTable key={JSON.stringify(comparison)} comparison={comparison} words={edit.words} saving={edit.saving} onChoose={edit.choose} onBack={edit.putAside} />;
  return (
    <>
      {offered && (
        <Line actions={<><Button size="small" onClick={edit.putBack}>Put them back</Button><Button size="small" onClick={edit.discard}>Discard them</Button></>}>
          You left changes here on {formatDateTime(offered.at)} that were not saved.
        </Line>
      )}
      {movedOn && !error && <Line actions={<Button size="small" onClick={edit.compare}>Compare now</Button>}>Somebody else saved this while you were editing. Nothing of yours is lost; you compare before you save.</Line>}
      <FailedSave
        error={error} gone={edit.gone} retry={() => edit.submit()} saving={edit.saving}
        actions={stuck(edit) && <><CopyTyped edit={edit} />{edit.gone && edit.anew && <Button size="small" onClick={edit.anew}>Make it anew</Button>}</>}
      />
    </>
  );
}
