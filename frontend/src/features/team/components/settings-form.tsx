import { App, Button } from 'antd';
import type { FormEventHandler, ReactNode } from 'react';
import { FailedSave } from '../../../ui/form/failed-save.js';
import { useUnsavedChanges } from '../../../ui/form/use-unsaved-changes.js';

interface SettingsFormProps {
  onSubmit: FormEventHandler<HTMLFormElement>;
  dirty: boolean; saving: boolean; error: unknown;
  onReload: () => void; onUndo: () => void;
  /** why the fields cannot be changed by this person; null where they can */
  locked: string | null;
  children: ReactNode;
}

/** A settings form that stands open on the page, with its save below. Who may not change it reads the values and why. */
export function SettingsForm({ onSubmit, dirty, saving, error, onReload, onUndo, locked, children }: SettingsFormProps) {
  useUnsavedChanges(dirty && !saving);
  return (
    <form className="mt-form" noValidate onSubmit={onSubmit}>
      {locked && <p className="mt-sub">{locked}</p>}
      <FailedSave error={error} onReload={onReload} />
      {children}
      {!locked && (
        <div className="mt-form-foot">
          <Button type="primary" htmlType="submit" loading={saving} disabled={!dirty}>Save</Button>
          {dirty && <Button onClick={onUndo}>Undo my changes</Button>}
          <span className="mt-sub" role="status">{dirty ? 'Not saved yet.' : 'Saved values.'}</span>
        </div>
      )}
    </form>
  );
}

export const useSavedMessage = () => {
  const { message } = App.useApp();
  return () => { void message.success('Saved. Results that depend on it are worked out anew.'); };
};
