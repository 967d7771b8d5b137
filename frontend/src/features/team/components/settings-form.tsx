import { App, Button } from 'antd';
import type { ReactNode } from 'react';
import { EditNotices } from '../../../ui/form/edit-notices.js';
import type { EditForm } from '../../../ui/form/use-edit-form.js';

interface SettingsFormProps {
  edit: EditForm;
  /** why the fields cannot be changed by this person; null where they can */
  locked: string | null;
  children: ReactNode;
}

/** A settings form that stands open on the page, with its save below. Who may not change it reads the values and why. */
export function SettingsForm({ edit, locked, children }: SettingsFormProps) {
  const { dirty, saving, comparison } = edit;
  return (
    <div>
      {!locked && <EditNotices edit={edit} />}
      <form className="mt-form" noValidate onSubmit={edit.submit} hidden={comparison !== null}>
        {locked && <p className="mt-sub">{locked}</p>}
        {children}
        {!locked && (
          <div className="mt-form-foot">
            <Button type="primary" htmlType="submit" loading={saving} disabled={!dirty}>Save</Button>
            {dirty && <Button onClick={edit.discard}>Undo my changes</Button>}
            <span className="mt-sub" role="status">{dirty ? 'Not saved yet.' : 'Saved values.'}</span>
          </div>
        )}
      </form>
    </div>
  );
}

export const useSavedMessage = () => {
  const { message } = App.useApp();
  return () => { void message.success('Saved. Results that depend on it are worked out anew.'); };
};
