import { App, Button } from 'antd';
import { useQueryClient } from '@tanstack/react-query';
import { useFormState } from 'react-hook-form';
import { passwordChangeSchema } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { FailedSave } from '../../../ui/form/failed-save.js';
import { TextField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useUnsavedChanges } from '../../../ui/form/use-unsaved-changes.js';
import { Panel } from '../../../ui/panel.js';
import { ownSessionsQuery } from '../api/own-sessions.js';
import { useChangePassword } from '../api/session.js';

export function ChangePassword() {
  const { message } = App.useApp();
  const client = useQueryClient();
  const change = useChangePassword();
  const form = useContractForm(passwordChangeSchema, { defaultValues: { current: '', next: '' } });
  const { isDirty } = useFormState({ control: form.control });
  useServerIssues(form, change.error);
  useUnsavedChanges(isDirty && !change.isPending, 'Change password');
  // what is wrong with one of the two fields stands beside it; saying it above as well would say it twice
  const besideField = change.error instanceof ApiError && change.error.issues.some((issue) => issue.path !== '');
  const done = () => {
    form.reset();
    void message.success('Password changed. Your other sessions have ended.');
    void client.invalidateQueries({ queryKey: ownSessionsQuery().queryKey });
  };
  const submit = form.handleSubmit((body) => change.mutate(body, { onSuccess: done }));
  return (
    <Panel title="Password" sub="A new one ends your sessions elsewhere, and you are told of it by e-mail.">
      <form className="mt-form" noValidate onSubmit={(event) => { void submit(event); }}>
        <FailedSave error={besideField ? null : change.error} />
        <div className="mt-form-row">
          <TextField control={form.control} name="current" label="Present password" type="password" autoComplete="current-password" />
          <TextField control={form.control} name="next" label="New password" type="password" autoComplete="new-password" help="At least 12 characters." />
        </div>
        <div className="mt-form-foot"><Button type="primary" htmlType="submit" loading={change.isPending} disabled={!isDirty}>Change password</Button></div>
      </form>
    </Panel>
  );
}
