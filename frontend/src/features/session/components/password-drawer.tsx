import { App } from 'antd';
import { passwordChangeSchema } from '@mantlet/common';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { TextField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useChangePassword } from '../api/session.js';

export function PasswordDrawer({ open, onClose }: { open: boolean; onClose: () => void }) {
  const { message } = App.useApp();
  const change = useChangePassword();
  const form = useContractForm(passwordChangeSchema, { defaultValues: { current: '', next: '' } });
  useServerIssues(form, change.error);
  const close = () => { form.reset(); change.reset(); onClose(); };
  const save = form.handleSubmit((body) => change.mutate(body, { onSuccess: () => { void message.success('Password changed.'); close(); } }));
  return (
    <FormDrawer title="Change password" open={open} onClose={close} onSubmit={(e) => { void save(e); }} dirty={form.formState.isDirty} saving={change.isPending} error={change.error} saveText="Change password" size={420}>
      <TextField control={form.control} name="current" label="Present password" type="password" autoComplete="current-password" />
      <TextField control={form.control} name="next" label="New password" type="password" autoComplete="new-password" help="At least 12 characters." />
    </FormDrawer>
  );
}
