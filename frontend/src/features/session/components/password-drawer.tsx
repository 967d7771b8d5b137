import { App } from 'antd';
import { passwordChangeSchema } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { TextField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useChangePassword } from '../api/session.js';

export function PasswordDrawer({ open, onClose }: { open: boolean; onClose: () => void }) {
  const { message } = App.useApp();
  const change = useChangePassword();
  const form = useContractForm(passwordChangeSchema, { defaultValues: { current: '', next: '' } });
  useServerIssues(form, change.error);
  // what is wrong with one of the two fields stands beside it; saying it above as well would say it twice
  const besideField = change.error instanceof ApiError && change.error.issues.some((i) => i.path !== '');
  const close = () => { form.reset(); change.reset(); onClose(); };
  const save = form.handleSubmit((body) => change.mutate(body, { onSuccess: () => { void message.success('Password changed.'); close(); } }));
  return (
    <FormDrawer title="Change password" open={open} onClose={close} onSubmit={(e) => { void save(e); }} dirty={form.formState.isDirty} saving={change.isPending} error={besideField ? null : change.error} saveText="Change password" size={420}>
      <TextField control={form.control} name="current" label="Present password" type="password" autoComplete="current-password" />
      <TextField control={form.control} name="next" label="New password" type="password" autoComplete="new-password" help="At least 12 characters." />
    </FormDrawer>
  );
}
